import type { ReactNode } from 'react'
import { type AskedMeta, type FieldMeta, isCarried } from '#app/care/field-meta.ts'
import { ChoiceField } from './choice-field.tsx'
import type { FieldProps } from './field-parts.tsx'
import { PhotographsField } from './photographs-field.tsx'
import { type Band, QuantityField } from './quantity-field.tsx'
import { SelectField, TextArea, TextField } from './text-field.tsx'

type Control = AskedMeta['control']
type MetaOf<C extends Control, M extends AskedMeta = AskedMeta> = M extends AskedMeta
  ? C extends M['control']
    ? M
    : never
  : never

/** What a control needs besides its metadata. */
export interface Drawing {
  readonly field: FieldProps
  readonly answers: readonly string[]
  readonly unit: string
  readonly band: Band | undefined
  /** Names to choose from, for the controls that choose a name. */
  readonly list: Readonly<Record<string, string>>
}

/** More than these are a list to open instead of chips. */
const CHIPS_AT_MOST = 12

/** One component for each control; a new control does not compile until it has one. */
const controls: { readonly [C in Control]: (meta: MetaOf<C>, drawing: Drawing) => ReactNode } = {
  quantity: ({ min, step, large = false }, { field, answers, unit, band }) => (
    <QuantityField
      {...field}
      unit={unit}
      step={step}
      large={large}
      signed={min < 0}
      band={band}
      defaultValue={answers[0]}
    />
  ),
  choice: ({ options }, { field, answers }) => <ChoiceField {...field} options={options} chosen={answers} />,
  choices: ({ options }, { field, answers }) => <ChoiceField {...field} options={options} chosen={answers} several />,
  text: ({ maxLength }, { field, answers }) => (
    <TextField {...field} maxLength={maxLength} defaultValue={answers[0]} autoComplete="off" />
  ),
  note: ({ maxLength }, { field, answers }) => <TextArea {...field} maxLength={maxLength} defaultValue={answers[0]} />,
  date: (_, { field, answers }) => <TextField {...field} type="date" defaultValue={answers[0]} />,
  photographs: ({ most }, { field, answers }) => <PhotographsField {...field} most={most} kept={answers} />,
  task: (_, drawing) => <NameField {...drawing} />,
  setting: (_, drawing) => <NameField {...drawing} />,
  warning: (_, drawing) => <NameField {...drawing} />,
}

export function CareControl({ meta, drawing }: { readonly meta: FieldMeta; readonly drawing: Drawing }) {
  if (isCarried(meta)) return null
  // The table pairs each control with its own metadata, which TypeScript cannot follow through the lookup.
  const draw = controls[meta.control] as (meta: FieldMeta, drawing: Drawing) => ReactNode
  return draw(meta, drawing)
}

function NameField({ field, answers, list }: Drawing) {
  if (Object.keys(list).length <= CHIPS_AT_MOST) return <ChoiceField {...field} options={list} chosen={answers} />
  return <SelectField {...field} options={list} defaultValue={answers[0]} nothing="Choose" />
}
