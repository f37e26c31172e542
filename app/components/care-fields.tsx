import { type FormEvent, Fragment, type ReactNode, useRef, useState } from 'react'
import { isShown } from '#app/care/field.ts'
import { type FieldMeta, isCarried, type NameLists } from '#app/care/field-meta.ts'
import type { ExplainedGauge } from '#app/rules/why-warnings.ts'
import { type Answers, useAnswers } from './answers.ts'
import { CareControl } from './care-controls.tsx'
import type { DrawnField } from './conform-fields.ts'
import { FieldErrors } from './field-parts.tsx'
import { useHydrated } from './hydrated.ts'

export interface CareFieldsProps {
  readonly fields: readonly DrawnField[]
  readonly gauges?: readonly ExplainedGauge[]
  /** Names that the record offers for the controls that choose one. */
  readonly lists?: Partial<NameLists>
  /** Units by the answer that decides them, where the answer is not the unit itself. */
  readonly units?: Readonly<Record<string, string>>
  /** What the answers ask people to notice: under the large number, or where there is none after the questions. */
  readonly notices?: ReactNode
}

/**
 * The form of any kind of care, from its fields alone. Without scripts every question is there; with them, a question that does
 * not arise is hidden and not submitted.
 */
export function CareFields({ fields, gauges = [], lists = {}, units = {}, notices }: CareFieldsProps) {
  const root = useRef<HTMLDivElement>(null)
  const answers = useAnswers(fields, root)
  const context = { all: fields, answers, gauges, lists, units }
  const asked = fields.filter(field => !isCarried(field.meta))
  const shown = asked.filter(field => !field.meta.more)
  const more = asked.filter(field => field.meta.more)
  const noticed = shown.find(({ meta }) => meta.control === 'quantity' && meta.large) ?? shown.at(-1)
  const isNeeded = more.some(field => field.errors?.length || field.answers.length > 0)
  return (
    <div ref={root} className="grid gap-5">
      {shown.map(field => (
        <Fragment key={field.formKey ?? field.name}>
          <Question field={field} {...context} />
          {field === noticed && notices}
        </Fragment>
      ))}
      {more.length > 0 && (
        <details open={isNeeded} className="border-t border-line pt-2">
          <summary className="inline-flex min-h-11 items-center font-semibold text-brand underline underline-offset-3">
            More details
          </summary>
          <div className="mt-3 grid gap-5">
            {more.map(field => (
              <Question key={field.formKey ?? field.name} field={field} {...context} />
            ))}
          </div>
        </details>
      )}
      {fields
        .filter(field => isCarried(field.meta))
        .map(field => (
          <CarriedAnswer key={field.formKey ?? field.name} field={field} />
        ))}
    </div>
  )
}

/** Filled in by a scan. The item can be taken out again; what the catalogue decides is not sent at all. */
function CarriedAnswer({ field: { id, meta, fullName, answers, errors } }: { readonly field: DrawnField }) {
  // Held here: what a scan writes into the page alone, the next drawing of the form would take back.
  const [held, setHeld] = useState(answers[0] ?? '')
  const hold = (event: FormEvent<HTMLInputElement>) => setHeld(event.currentTarget.value)
  if (meta.control === 'decided') return null
  if (meta.control === 'codes') return <input type="hidden" id={id} name={fullName} value={held} onInput={hold} />
  return (
    <div className="grid gap-1.5 has-[input:not(:checked)]:hidden has-[p]:grid">
      <label className="inline-flex min-h-12 items-center gap-3">
        <input
          type="checkbox"
          id={id}
          name={fullName}
          value={held}
          defaultChecked={held !== ''}
          onInput={hold}
          data-carried=""
          className="size-6 accent-brand"
        />
        {`${meta.label}, as in the catalogue`}
      </label>
      <FieldErrors id={id} errors={errors} />
    </div>
  )
}

interface QuestionProps extends Required<Omit<CareFieldsProps, 'fields' | 'notices'>> {
  readonly field: DrawnField
  readonly all: readonly DrawnField[]
  readonly answers: Answers
}

function Question({ field, all, answers, gauges, lists, units }: QuestionProps) {
  const { name, meta, required, id, fullName, errors } = field
  const hydrated = useHydrated()
  const isAsked = isShown(meta, answers)
  const unit = unitOf(meta, answers, units)
  const drawing = {
    field: {
      id,
      name: fullName,
      label: meta.label,
      hint: meta.hint,
      errors,
      optional: !required && !meta.neededThen,
      disabled: hydrated && !isAsked,
    },
    answers: field.answers,
    unit,
    band: gauges.find(gauge => gauge.field === name),
    list: listOf(meta, lists),
  }
  return (
    <div
      className={`grid gap-3 not-first:border-t not-first:border-hair not-first:pt-5 ${isAsked ? '' : 'scripted:hidden'}`}
    >
      {meta.section && <h2 className="text-lg">{meta.section}</h2>}
      {meta.when && <OnlyIf when={meta.when} all={all} />}
      <CareControl meta={meta} drawing={drawing} />
    </div>
  )
}

interface OnlyIfProps {
  readonly when: NonNullable<FieldMeta['when']>
  readonly all: readonly DrawnField[]
}

/** Where nothing hides the question, its condition is said in words. */
function OnlyIf({ when, all }: OnlyIfProps): ReactNode {
  const other = all.find(field => field.name === when.field)?.meta
  if (!other) return null
  const names = when.is.flatMap(value => ('options' in other ? (other.options[value] ?? []) : value))
  return (
    <p className="hidden text-sm text-ink2 unscripted:block">{`Only if "${other.label}" is: ${names.join(', ')}.`}</p>
  )
}

/** The unit beside a number: its own, or what another field says. */
function unitOf(meta: FieldMeta, answers: Answers, units: Readonly<Record<string, string>>): string {
  if (meta.control !== 'quantity') return ''
  const answer = meta.unitField === undefined ? undefined : answers[meta.unitField]?.[0]
  return meta.unit ?? (answer === undefined ? '' : (units[answer] ?? answer))
}

function listOf({ control }: FieldMeta, lists: Partial<NameLists>): Readonly<Record<string, string>> {
  return (control === 'task' || control === 'setting' || control === 'warning' ? lists[control] : undefined) ?? {}
}
