import type { CataloguedItem } from '../care/catalogued-item.ts'
import { fieldsOf } from '../care/field.ts'
import type { FormProblem, KnownNames } from '../care/form-problem.ts'
import { lateReasonAfter } from '../care/general-settings.ts'
import type { AnyCareKind, CareContext } from '../care/kind.ts'
import { hours, since } from '../time/duration.ts'
import { type ChartSpine, intentOf, ownFields, readChart, readSpine } from './chart-form.ts'
import { itemProblems } from './item-problems.ts'
import { type Calendar, type PerformedAt, performedAt } from './performed-at.ts'

/** A form that may be charted: what the record needs of it. */
export interface Chartable {
  readonly id: string
  readonly performedAt: Date
  readonly reason: string | undefined
  readonly witnessId: string | undefined
  readonly care: Readonly<Record<string, unknown>>
}

/** Mistakes by the name of their field; '' is the form as a whole. */
export type FormErrors = Readonly<Record<string, readonly string[]>>

/** A form held against the record. `asks`: the time given came twice, and the form has to say which it was. */
export type Assessed =
  | { readonly ok: true; readonly chart: Chartable; readonly context: CareContext | null }
  | { readonly ok: false; readonly errors: FormErrors; readonly asks: boolean }

/** What a form is held against. */
export interface Situation {
  readonly calendar: Calendar
  readonly known: KnownNames
  /** Who may stand as the second person. */
  readonly witnessIds: ReadonlySet<string>
  /** What was wrong with the form's files, by field. */
  readonly problems?: readonly FormProblem[]
  /** A correction always needs a reason; an act does when it is written down late. */
  readonly reason: 'always' | 'when late'
  /** The item of the catalogue that the form names; null when it names none, or none that the catalogue has. */
  readonly item: CataloguedItem | null
  /** The record, policy and ward as rules see them when the act was done; null where no policy was reviewed. */
  contextAt(at: Date): CareContext | null
}

/** Holds a form against kind, calendar and record. Clinical judgement is never refused: that is for warnings. */
export function assessed(kind: AnyCareKind, sent: FormData, situation: Situation): Assessed {
  const { form, unknown } = ownFields(kind, sent)
  const submission = readChart(kind, form)
  const spine = readSpine(form)
  const when = spine && performedAt(spine, situation.calendar)
  const problems = [
    ...(situation.problems ?? []),
    ...formProblems(sent, unknown),
    ...(spine ? spineProblems(spine, when, situation) : []),
  ]
  const context = when?.ok ? situation.contextAt(when.at) : null
  const errors = {
    ...(submission.status === 'success' ? {} : messagesOf(submission.error)),
    ...byField([
      ...problems,
      ...(submission.status === 'success'
        ? [
            ...itemProblems(kind, submission.value.care, situation.item),
            ...kindProblems(kind, submission.value.care, context, situation),
          ]
        : []),
    ]),
  }
  if (submission.status === 'success' && spine && when?.ok && Object.keys(errors).length === 0) {
    const care = withCatalogue(kind, submission.value.care, context, situation.item)
    return { ok: true, chart: chartOf(spine, when.at, care), context }
  }
  return { ok: false, errors, asks: when !== undefined && !when.ok && when.field === 'occurrence' }
}

function chartOf({ id, reason, witness }: ChartSpine, at: Date, care: Chartable['care']): Chartable {
  return { id, performedAt: at, reason: reason || undefined, witnessId: witness, care }
}

function withCatalogue(
  kind: AnyCareKind,
  care: Chartable['care'],
  context: CareContext | null,
  item: CataloguedItem | null,
): Chartable['care'] {
  if (!item) return withoutCodes(kind, care)
  return context ? { ...care, ...kind.catalogued?.(care, context, item) } : care
}

/** Codes stay with the item they were read from: a scan that was taken out leaves none. */
function withoutCodes(kind: AnyCareKind, care: Chartable['care']): Chartable['care'] {
  const codes = fieldsOf(kind.schema).flatMap(({ name, meta }) => (meta.control === 'codes' ? [name] : []))
  return Object.fromEntries(Object.entries(care).filter(([name]) => !codes.includes(name)))
}

function formProblems(sent: FormData, unknown: readonly string[]): readonly FormProblem[] {
  const names = intentOf(sent) === undefined ? [...unknown, 'intent'] : unknown
  if (names.length === 0) return []
  // Names are shown as far as they can be read: they may be anything.
  const shown = names.slice(0, 3).map(name => name.replace(/[^\p{L}\p{N}._-]/gu, '?').slice(0, 40) || '?')
  return [{ field: '', message: `The form has fields that do not belong to it: ${shown.join(', ')}. Open it again.` }]
}

function spineProblems(spine: ChartSpine, when: PerformedAt | undefined, situation: Situation): readonly FormProblem[] {
  const witness =
    spine.witness === undefined || situation.witnessIds.has(spine.witness)
      ? []
      : [{ field: 'witness', message: 'Choose the second person from the list' }]
  const reason = when?.ok ? reasonProblems(spine, when.at, situation) : []
  return [...(when && !when.ok ? [{ field: when.field, message: when.message }] : []), ...reason, ...witness]
}

function reasonProblems({ reason }: ChartSpine, at: Date, situation: Situation): readonly FormProblem[] {
  if (reason) return []
  if (situation.reason === 'always') return [{ field: 'reason', message: 'Enter why the entry is corrected' }]
  const { now } = situation.calendar
  const most = situation.contextAt(now)?.values.of(lateReasonAfter) ?? lateReasonAfter.default
  if (since(at, now) <= hours(most)) return []
  return [{ field: 'reason', message: `Enter why this is written more than ${most} h late` }]
}

function kindProblems(
  kind: AnyCareKind,
  care: Chartable['care'],
  context: CareContext | null,
  { known, calendar }: Situation,
): readonly FormProblem[] {
  if (!kind.problems) return []
  if (context === null) {
    return [{ field: '', message: 'This ward has no reviewed policy, so plans cannot be held against it.' }]
  }
  return kind
    .problems(care, { ...context, now: calendar.now }, known)
    .map(({ field, message }) => ({ field: `care.${field}`, message }))
}

function messagesOf(errors: Readonly<Record<string, string[] | null>> | null): FormErrors {
  return Object.fromEntries(Object.entries(errors ?? {}).map(([name, messages]) => [name, messages ?? []]))
}

function byField(problems: readonly FormProblem[]): FormErrors {
  const fields: Record<string, string[]> = {}
  for (const { field, message } of problems) fields[field] = [...(fields[field] ?? []), message]
  return fields
}
