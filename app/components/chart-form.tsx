import { type FormEvent, type ReactNode, useEffect, useRef, useState } from 'react'
import { Form } from 'react-router'
import { fieldsOf } from '#app/care/field.ts'
import type { NameLists } from '#app/care/field-meta.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import { photographFields } from '#app/care/photographs.ts'
import type { FormErrors } from '#app/charting/assess.ts'
import type { ChartAnswer, FormSigner } from '#app/charting/chart-answer.ts'
import type { Typed } from '#app/charting/chart-form.ts'
import type { Calendar } from '#app/charting/performed-at.ts'
import type { ExplainedGauge } from '#app/rules/why-warnings.ts'
import { CareFields } from './care-fields.tsx'
import { ChartBar } from './chart-bar.tsx'
import { ChartErrors, fieldId } from './chart-errors.tsx'
import { ChartFoot } from './chart-foot.tsx'
import { useChartLive } from './chart-live.ts'
import { OwnSignature, SecondPerson } from './chart-signing.tsx'
import { drawnOf } from './drawn-fields.ts'
import { fillForm } from './fill-form.ts'
import { Notice } from './notice.tsx'
import { Warnings } from './warnings.tsx'

export interface ChartFormProps {
  readonly kind: AnyCareKind
  readonly view: {
    readonly id: string
    readonly signer: FormSigner
    readonly signing: {
      readonly password: boolean
      readonly email: string
      readonly second: 'offered' | 'asked' | 'expected'
      readonly lacks: string | null
    }
    readonly calendar: Calendar
    readonly typed: Typed
    readonly gauges: readonly ExplainedGauge[]
    readonly notOffered: Readonly<Record<string, readonly string[]>>
    readonly lists: NameLists
    readonly units: Readonly<Record<string, string>>
    readonly witnesses: Readonly<Record<string, string>>
    readonly daysBack: number
  }
  readonly answer: ChartAnswer | undefined
  readonly words: string
  readonly cancelHref: string
  /** When a late entry needs its reason; absent for a correction, which always has one. */
  readonly reasonAfterHours?: number
  /** Above the questions; is handed what fills the form with answers. */
  readonly children?: (fill: (answers: Typed) => void) => ReactNode
}

/** The form of any kind of care: its questions, when it was done, what it asks people to notice, and the sentence it becomes. */
export function ChartForm({ kind, view, answer, words, cancelHref, reasonAfterHours, children }: ChartFormProps) {
  const form = useRef<HTMLFormElement>(null)
  const kept = answer && 'typed' in answer ? answer : view
  const { typed, id, signer } = kept
  const { errors, noteChange } = useErrors(answer)
  const openedAt = momentOf(typed.at?.[0]) ?? view.calendar.now.getTime()
  const live = useChartLive({ kind, signer, calendar: view.calendar, openedAt }, form)
  // A correction begins with its reason, and an answer with what it says.
  useKeyboardFocus(form, answer === undefined && reasonAfterHours !== undefined && kind)
  const reviewed = answer?.is === 'reviewed' ? answer : undefined
  const warnings = (live.sentence ? live.warnings : reviewed?.warnings) ?? []
  return (
    <Form
      ref={form}
      method="post"
      {...(photographFields(kind).length > 0 ? { encType: 'multipart/form-data' } : {})}
      noValidate
      onInput={event => {
        noteChange(event)
        live.onInput(event)
      }}
      onSubmit={live.onSubmit}
    >
      <input type="hidden" name="id" value={id} />
      <input type="hidden" name="openedBy" value={signer.id} />
      <input type="hidden" name="at" value={new Date(live.shownAt).toISOString()} />
      <div className="grid gap-5 px-4 md:px-6">
        <ChartErrors kind={kind} answer={answer} />
        {view.signing.lacks && (
          <Notice tone="amber" action="Have a colleague with this skill beside you.">
            {`${view.signing.lacks} What was done is charted all the same, and the entry says so.`}
          </Notice>
        )}
        {children?.(answers => form.current && fillForm(form.current, answers))}
        <CareFields
          fields={drawnOf(kind, { typed, errors, notOffered: view.notOffered })}
          gauges={view.gauges}
          lists={view.lists}
          units={view.units}
          notices={
            <div id="notices" aria-live="polite" className="empty:-mt-5">
              <Warnings warnings={warnings} />
            </div>
          }
        />
        <ChartFoot
          {...{ typed, errors, reasonAfterHours }}
          shownAt={live.shownAt}
          zone={view.calendar.zone}
          asks={answer?.is === 'refused' && answer.asks}
          daysBack={view.daysBack}
        >
          <SecondPerson {...{ typed, errors, answer }} witnesses={view.witnesses} ask={view.signing.second} />
          {(view.signing.password || asksPassword(answer)) && (
            <OwnSignature {...{ signer, typed, errors, answer }} email={view.signing.email} />
          )}
        </ChartFoot>
      </div>
      <ChartBar {...{ words, cancelHref, signer, warnings }} live={live.sentence} reviewed={reviewed?.sentence} />
    </Form>
  )
}

/** Mistakes by field, each until its field is changed. */
function useErrors(answer: ChartAnswer | undefined) {
  const [changed, setChanged] = useState<{ readonly since: unknown; readonly names: readonly string[] }>()
  const names = changed?.since === answer ? (changed?.names ?? []) : []
  const all: FormErrors = answer?.is === 'refused' ? answer.errors : {}
  const errors: FormErrors = Object.fromEntries(Object.entries(all).filter(([name]) => !names.includes(name)))
  const noteChange = ({ target }: FormEvent<HTMLFormElement>) => {
    const name = target instanceof Element ? target.getAttribute('name') : null
    if (name !== null && errors[name]) setChanged({ since: answer, names: [...names, name] })
  }
  return { errors, noteChange }
}

/** The large number is ready to be typed where there is a keyboard; a finger chooses for itself, and sees the page first. */
function useKeyboardFocus(form: { readonly current: HTMLFormElement | null }, kind: AnyCareKind | false): void {
  useEffect(() => {
    const [first] = kind ? fieldsOf(kind.schema) : []
    if (first?.meta.control !== 'quantity' || !first.meta.large) return
    if (!window.matchMedia('(hover: hover) and (pointer: fine)').matches) return
    form.current?.querySelector<HTMLInputElement>(`#${fieldId(`care.${first.name}`)}`)?.focus()
  }, [form, kind])
}

/** The password was not needed when the form opened, and is by now. */
const asksPassword = (answer: ChartAnswer | undefined): boolean =>
  answer?.is === 'refused' && answer.errors.signerPassword !== undefined

function momentOf(text: string | undefined): number | undefined {
  const ms = text === undefined ? Number.NaN : Date.parse(text)
  return Number.isNaN(ms) ? undefined : ms
}
