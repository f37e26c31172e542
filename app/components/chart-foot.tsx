import type { ReactNode } from 'react'
import type { FormErrors } from '#app/charting/assess.ts'
import type { Typed } from '#app/charting/chart-form.ts'
import type { Zone } from '#app/time/zone.ts'
import { TextArea } from './text-field.tsx'
import { WhenField } from './when-field.tsx'

export interface ChartFootProps {
  readonly typed: Typed
  readonly errors: FormErrors
  readonly shownAt: number
  readonly zone: Zone
  readonly asks: boolean
  readonly daysBack: number
  /** When a late entry needs its reason; absent where a reason is asked for elsewhere. */
  readonly reasonAfterHours?: number | undefined
  /** Who else signs. */
  readonly children: ReactNode
}

/** When it was done, why it is written so late, and who signs. */
export function ChartFoot({
  typed,
  errors,
  shownAt,
  zone,
  asks,
  daysBack,
  reasonAfterHours,
  children,
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
      {children}
    </div>
  )
}
