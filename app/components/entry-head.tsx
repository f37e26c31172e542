import type { ReactNode } from 'react'
import type { FormErrors } from '#app/charting/assess.ts'
import type { Typed } from '#app/charting/chart-form.ts'
import { LinkButton } from './button.tsx'
import { Notice } from './notice.tsx'
import { PatientBanner, type PatientBannerView } from './patient-banner.tsx'
import { TextArea } from './text-field.tsx'

interface EntryHeadProps {
  readonly head: { readonly banner: PatientBannerView; readonly patientId: string; readonly discharged: string | null }
  readonly title: string
  readonly children: ReactNode
}

/** A page about one entry, under the patient it belongs to. */
export function EntryHead({ head, title, children }: EntryHeadProps) {
  return (
    <>
      <PatientBanner
        patient={head.banner}
        actions={
          <>
            <LinkButton href={`/patients/${head.patientId}`}>All entries</LinkButton>
            <LinkButton variant="danger" href={`/patients/${head.patientId}/emergency`}>
              Airway emergency steps
            </LinkButton>
          </>
        }
      >
        {head.discharged && <p className="mt-2 font-semibold">{head.discharged}</p>}
      </PatientBanner>
      <div className="mx-auto max-w-5xl pt-5">
        <h1 className="mb-4 px-4 text-2xl md:px-6">{title}</h1>
        {children}
      </div>
    </>
  )
}

interface ReplacedProps {
  readonly says: string
  readonly href: string
}

/** Another entry has taken this one's place: that one is what counts, and what can be corrected. */
export function Replaced({ says, href }: ReplacedProps) {
  return (
    <div className="px-4 md:px-6">
      <Notice
        tone="blue"
        action="Look at the latest version."
        answer={<LinkButton href={href}>Open the latest</LinkButton>}
      >
        {says}
      </Notice>
    </div>
  )
}

interface ReadBackProps {
  readonly entry: {
    readonly sentence: string
    readonly facts: readonly { readonly label: string; readonly value: string }[]
  }
}

/** The entry as it stands, before it is corrected or retracted. */
export function ReadBack({ entry }: ReadBackProps) {
  const [done, , by] = entry.facts
  return (
    <div className="grid gap-3">
      <blockquote className="rounded-card border border-line bg-surface p-4">
        <p className="text-lg">{entry.sentence}</p>
        <p className="mt-1 text-ink2">
          {done?.value}. {by?.value}.
        </p>
      </blockquote>
      <p className="text-ink2">
        Charted on the wrong patient? Retract it here, then chart it anew on the right patient’s page. Both stay
        readable.
      </p>
    </div>
  )
}

interface CorrectReasonProps extends ReadBackProps {
  readonly typed: Typed
  readonly errors: FormErrors
}

/** What is corrected, and why. */
export function CorrectReason({ entry, typed, errors }: CorrectReasonProps) {
  return (
    <div className="grid gap-4 border-b border-hair pb-5">
      <ReadBack entry={entry} />
      <TextArea
        id="reason"
        name="reason"
        label="Why it is corrected"
        hint="The earlier words stay readable beside the new ones"
        rows={2}
        maxLength={500}
        required
        defaultValue={typed.reason?.[0]}
        errors={errors.reason}
      />
    </div>
  )
}
