import { type FocusEvent, useRef, useState } from 'react'
import { convertPressure, type PressureUnit, pressureUnits } from '#app/clinical/units.ts'
import type { Why } from '#app/rules/why.ts'
import { describedBy, type FieldProps, HintAndErrors, INPUT, isInvalid, LabelWords } from './field-parts.tsx'
import { bandWords, Gauge } from './gauge.tsx'
import { Keypad } from './keypad.tsx'
import { Tag } from './tag.tsx'
import { typeInto } from './type-into.ts'
import { WhyDetails } from './why.tsx'

/** The band that a number is read against, in its own unit. */
export interface Band {
  readonly lower: number
  readonly upper: number
  readonly max: number
  readonly unit: string
  readonly why?: Why | undefined
}

export interface QuantityFieldProps extends FieldProps {
  /** As the number is given; empty while it is not known yet which. */
  readonly unit: string
  readonly step: number
  readonly large?: boolean
  /** It may be below zero, and needs a keyboard with a minus. */
  readonly signed?: boolean
  readonly band?: Band | undefined
  readonly defaultValue?: string | undefined
}

/** A number with its unit beside it; a large one has keys, and stands against its band while it is typed. */
export function QuantityField(props: QuantityFieldProps) {
  const { unit, step, large = false, signed = false, band, defaultValue, disabled, ...field } = props
  const input = useRef<HTMLInputElement>(null)
  const [text, setText] = useState(defaultValue ?? '')
  const value = band && inUnit(numberIn(text), unit, band.unit)
  const isOut = band !== undefined && value !== undefined && (value < band.lower || value > band.upper)
  return (
    <div className={large ? 'flex flex-wrap justify-between gap-x-8 gap-y-4' : ''}>
      <div className={`grid content-start gap-1.5 ${large ? 'min-w-0 flex-1 basis-72' : ''}`}>
        <label htmlFor={field.id}>
          <LabelWords field={field} />
        </label>
        <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1">
          <input
            ref={input}
            id={field.id}
            name={field.name}
            inputMode={signed ? 'text' : 'decimal'}
            autoComplete="off"
            defaultValue={defaultValue}
            disabled={disabled}
            onChange={event => setText(event.target.value)}
            onBlur={writePoint}
            aria-describedby={describedBy(field, `${field.id}-unit`)}
            aria-invalid={isInvalid(field)}
            className={`${INPUT} ${large ? 'h-20 max-w-44 text-4xl font-bold' : 'max-w-28 text-lg font-semibold'} ${isOut ? 'text-late' : ''}`}
          />
          <span id={`${field.id}-unit`} className={`text-ink2 ${large ? 'text-xl' : ''}`}>
            {unit}
          </span>
          {band && value !== undefined && (
            <output htmlFor={field.id}>
              <Tag tone={isOut ? 'late' : 'ok'}>{bandSays(value, unit, band)}</Tag>
            </output>
          )}
        </div>
        {band && (
          <div className="mt-1 max-w-105">
            <Gauge {...band} value={value} title={field.label} />
            {band.why && <WhyDetails why={band.why} about={`The band of: ${field.label}`} />}
          </div>
        )}
        <HintAndErrors field={field} />
      </div>
      {large && <Keypad input={input} decimals={step % 1 !== 0} label={field.label} />}
    </div>
  )
}

function numberIn(text: string): number | undefined {
  const trimmed = text.trim().replace(',', '.')
  const value = Number(trimmed)
  return trimmed === '' || Number.isNaN(value) ? undefined : value
}

const isPressure = (unit: string): unit is PressureUnit => pressureUnits.some(known => known === unit)

/** The number in the unit of the band; undefined when they cannot be compared. */
function inUnit(value: number | undefined, from: string, to: string): number | undefined {
  if (value === undefined || from === to) return value
  return isPressure(from) && isPressure(to) ? Math.round(convertPressure(value, from, to) * 10) / 10 : undefined
}

function bandSays(value: number, unit: string, band: Band): string {
  const words = bandWords(value, band.lower, band.upper)
  return unit === band.unit ? words : `${value} ${band.unit}, ${words}`
}

/** "7,5" means what it says in half the world, and is read as no number at all. */
function writePoint({ target }: FocusEvent<HTMLInputElement>): void {
  if (!/^\s*-?\d+,\d+\s*$/.test(target.value)) return
  typeInto(target, target.value.replace(',', '.'))
}
