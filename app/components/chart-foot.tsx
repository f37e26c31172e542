import type { FormErrors } from '#app/charting/assess.ts'
import type { Typed } from '#app/charting/chart-form.ts'
import type { Zone } from '#app/time/zone.ts'
import { SelectField, TextArea } from './text-field.tsx'
import { WhenField } from './when-field.tsx'

export interface ChartFootProps {
  readonly typed: Typed
  readonly errors: FormErrors
  readonly shownAt: number
  readonly zone: Zone
  readonly asks: boolean
  readonly daysBack: number
  readonly witnesses: Readonly<Record<string, string>>
  /** When a late entry needs its reason; absent where a reason is asked for elsewhere. */
  readonly reasonAfterHours?: number | undefined
}

/** When it was done, why it is written so late, and the second person. */
export function ChartFoot({
  typed,
  errors,
  shownAt,
  zone,
  asks,
  daysBack,
  witnesses,
  reasonAfterHours,
}: ChartFootProps) {
  const first = (name: string) => typed[name]?.[0]
  const answers = { when: first('when'), day: first('day'), time: first('time'), occurrence: first('occurrence') }
  return (
    <div className="group/foot grid gap-5 border-t border-hair pt-5">
      <WhenField
        now={new Date(shownAt)}
        zone={zone}
        answers={answers}
        errors={errors}
        asksOccurrence={asks || answers.occurrence !== undefined}
        daysBack={daysBack}
      />
      {reasonAfterHours !== undefined && (
        <div className={errors.reason ? '' : 'hidden group-has-[[name=when][value=other]:checked]/foot:block'}>
          <TextArea
            id="reason"
            name="reason"
            label="Why it is written late"
            hint={`Needed when it was done more than ${reasonAfterHours} h ago`}
            optional
            maxLength={500}
            defaultValue={first('reason')}
            errors={errors.reason}
          />
        </div>
      )}
      {Object.keys(witnesses).length > 0 && (
        <details open={errors.witness !== undefined || first('witness') !== undefined}>
          <summary className="inline-flex min-h-11 items-center font-semibold text-brand underline underline-offset-3">
            Second person
          </summary>
          <div className="mt-2">
            <SelectField
              id="witness"
              name="witness"
              label="Who checked or helped"
              optional
              options={witnesses}
              nothing="Nobody"
              defaultValue={first('witness')}
              errors={errors.witness}
            />
          </div>
        </details>
      )}
    </div>
  )
}
