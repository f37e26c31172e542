import type { FocusEvent } from 'react'
import { showDate, showTime, showWeekdayDate } from '#app/time/display.ts'
import { addDays, localDay, startOfDay, type Zone } from '#app/time/zone.ts'
import { ChoiceField } from './choice-field.tsx'
import { SelectField, TextField } from './text-field.tsx'
import { typeInto } from './type-into.ts'

/** Answers of the field by the names they are submitted under. */
export interface WhenAnswers {
  readonly when?: string | undefined
  /** `2026-12-01`, with `when` = `other`. */
  readonly day?: string | undefined
  /** `14:06`, by the ward's wall clock. */
  readonly time?: string | undefined
  /** `first` or `second`, where clocks went back over that time. */
  readonly occurrence?: string | undefined
}

export interface WhenFieldProps {
  readonly now: Date
  readonly zone: Zone
  readonly answers?: WhenAnswers
  readonly errors?: Readonly<Partial<Record<keyof WhenAnswers, readonly string[] | undefined>>>
  /** The time given came twice that day. */
  readonly asksOccurrence?: boolean
  readonly label?: string
  /** How far back a day can be chosen. */
  readonly daysBack?: number
}

/** When the care was done: now, a little ago, or at another time. The wall clock is the ward's. */
export function WhenField({ now, zone, answers = {}, errors = {}, label = 'When', ...rest }: WhenFieldProps) {
  const { asksOccurrence = false, daysBack = 14 } = rest
  const options = {
    now: `Now, ${showTime(now, zone)}`,
    '10 min ago': '10 min ago',
    '30 min ago': '30 min ago',
    other: 'Other time',
  }
  return (
    <div className="group/when grid gap-4">
      <ChoiceField
        id="when"
        name="when"
        label={label}
        options={options}
        chosen={[answers.when ?? 'now']}
        errors={errors.when}
      />
      <div className="hidden flex-wrap gap-4 group-has-[[value=other]:checked]/when:flex">
        <div className="w-60">
          <SelectField
            id="day"
            name="day"
            label="Day"
            options={recentDays(now, zone, daysBack)}
            defaultValue={answers.day ?? localDay(now, zone)}
            errors={errors.day}
          />
        </div>
        <div className="w-60">
          <TextField
            id="time"
            name="time"
            label="Time"
            hint="24-hour clock, such as 14:06"
            inputMode="numeric"
            autoComplete="off"
            maxLength={5}
            short
            defaultValue={answers.time}
            errors={errors.time}
            onBlur={writeColon}
          />
        </div>
        {asksOccurrence && (
          <ChoiceField
            id="occurrence"
            name="occurrence"
            label="Clocks went back that night. Which of the two?"
            options={{ first: 'First, before they went back', second: 'Second, after' }}
            {...(answers.occurrence ? { chosen: [answers.occurrence] } : {})}
            errors={errors.occurrence}
          />
        )}
      </div>
    </div>
  )
}

function recentDays(now: Date, zone: Zone, back: number): Record<string, string> {
  const today = localDay(now, zone)
  const days = Array.from({ length: back + 1 }, (_, n) => addDays(today, -n))
  return Object.fromEntries(
    days.map((day, n) => {
      const date = showWeekdayDate(startOfDay(day, zone), zone)
      return [day, n === 0 ? `Today, ${showDate(now, zone)}` : n === 1 ? `Yesterday, ${date.slice(4)}` : date]
    }),
  )
}

/** "1406" means 14:06: a numeric keyboard has no colon. */
function writeColon({ target }: FocusEvent<HTMLInputElement>): void {
  if (!/^\d{3,4}$/.test(target.value)) return
  typeInto(target, `${target.value.slice(0, -2).padStart(2, '0')}:${target.value.slice(-2)}`)
}
