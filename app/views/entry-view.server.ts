import { can } from '#app/auth/permissions.ts'
import type { StoredEntry } from '#app/care/kind.ts'
import { findKind } from '#app/care/kinds.ts'
import { readEntry } from '#app/care/record.ts'
import { type Detail, entryDetails } from '#app/rules/entry-details.ts'
import { entryWords, lateWords, photographsOf } from '#app/rules/entry-words.ts'
import { authorWords, competenceWords, type SignatureFact, secondPersonWords } from '#app/rules/signature-words.ts'
import { policyWords } from '#app/rules/why.ts'
import type { ExplainedWarning } from '#app/rules/why-warnings.ts'
import { showDateTime, showOffset } from '#app/time/display.ts'
import { policies } from '#database/policies.server.ts'
import { warningsOf } from './charted-now.server.ts'
import { signingOf } from './entry-signing.server.ts'
import { mayDo, type OpenedEntry } from './opened-entry.server.ts'
import { contextOfAct, type PatientHead, patientHead } from './patient-care.server.ts'

/** One link of an entry's history, oldest first. */
export interface HistoryLine {
  readonly id: string
  readonly isShown: boolean
  readonly says: string
  readonly sentence: string
  readonly reason: string | null
}

/** Everything that is known of one entry. */
export interface EntryView {
  readonly id: string
  readonly head: PatientHead
  readonly title: string
  readonly sentence: string
  readonly standing: 'final' | 'corrected' | 'retracted'
  /** Who corrected or retracted it, when, and where that is. */
  readonly replacedBy: { readonly says: string; readonly href: string } | null
  readonly facts: readonly Detail[]
  /** Whether it waits for a countersignature, who gave it, and whether this person may. */
  readonly countersign: { readonly says: string; readonly waits: boolean; readonly mayDo: boolean } | null
  readonly details: readonly Detail[]
  /** The payload as stored, of an entry that cannot be read. */
  readonly raw: string | null
  readonly photographs: readonly string[]
  readonly warnings: readonly ExplainedWarning[]
  readonly policy: string | null
  readonly history: readonly HistoryLine[]
  readonly mayCorrect: boolean
  readonly mayRetract: boolean
}

/** One entry with its answers, its warnings and the policy of its moment, and every version of it. */
export async function entryView(opened: OpenedEntry): Promise<EntryView> {
  const { entry, chain, latest, care, now } = opened
  const known = await policies()
  const words = entryWords(entry)
  const kind = findKind(entry.kind)
  const data = kind && readEntry(kind, entry)[0]?.data
  const counts = entry.id === latest.id && entry.status === 'final'
  const context = contextOfAct(care, known, entry.performedAt, entry)
  const signing = await signingOf([entry])
  const signatures = signing.signatures(entry)
  const countersign = counts ? signing.countersign(entry, care.ward.zone) : null
  return {
    id: entry.id,
    head: patientHead(care, now),
    title: words.title,
    sentence: words.readable
      ? words.sentence
      : 'This entry cannot be read by the program. It is shown as it is stored.',
    standing: standingOf(opened),
    replacedBy: replacedBy(opened),
    facts: factsOf(opened, (context && lateWords(entry, context.values)) ?? null, signatures),
    countersign: countersign && { ...countersign, mayDo: countersign.waits && mayCountersign(opened) },
    details: kind && data ? entryDetails(kind, data as Readonly<Record<string, unknown>>) : [],
    raw: words.readable ? null : rawOf(entry),
    photographs: photographsOf(entry),
    warnings: warningsOf(care, known, entry),
    policy: context && policyWords(context.values.policy),
    history: chain.length > 1 ? chain.map(link => historyLine(link, entry.id, care.ward.zone)) : [],
    mayCorrect: counts && kind !== undefined && mayDo('correct', opened),
    mayRetract: counts && mayDo('retract', opened),
  }
}

/** A registered colleague of the ward who did not chart it. */
function mayCountersign({ entry, user, care }: OpenedEntry): boolean {
  return entry.recordedById !== user.id && can(user, 'countersign', care.ward.id)
}

function standingOf({ entry, latest }: OpenedEntry): EntryView['standing'] {
  if (latest.status === 'retracted') return 'retracted'
  return entry.id === latest.id ? 'final' : 'corrected'
}

function replacedBy({ entry, chain, care }: OpenedEntry): EntryView['replacedBy'] {
  const next = chain.find(link => link.supersedesId === entry.id)
  if (!next) return null
  const what = next.status === 'retracted' ? 'Retracted as entered in error' : 'Corrected'
  const at = showDateTime(next.recordedAt, care.ward.zone)
  return { says: `${what} by ${next.recordedByName} on ${at}: ${next.reason ?? ''}`, href: `/entries/${next.id}` }
}

function factsOf(
  { entry, care }: OpenedEntry,
  late: string | null,
  signatures: readonly SignatureFact[],
): readonly Detail[] {
  const signed = authorWords(signatures)
  const second = secondPersonWords(entry, signatures)
  const competence = competenceWords(findKind(entry.kind), signatures)
  const moment = (at: Date) => `${showDateTime(at, care.ward.zone)} (UTC ${showOffset(at, care.ward.zone)})`
  return [
    { label: 'Done', value: moment(entry.performedAt) },
    { label: 'Written down', value: `${moment(entry.recordedAt)}${late ? `, ${late}` : ''}` },
    { label: 'By', value: `${entry.recordedByName}, ${entry.recordedRole}${signed ? `, ${signed}` : ''}` },
    ...(competence ? [{ label: 'Competence then', value: competence }] : []),
    ...(second ? [{ label: 'Second person', value: second }] : []),
    ...(entry.reason ? [{ label: 'Reason', value: entry.reason }] : []),
    { label: 'Number in the chart', value: String(entry.number) },
  ]
}

function historyLine(link: StoredEntry, shownId: string, zone: string): HistoryLine {
  const what = link.status === 'retracted' ? 'Retracted' : link.supersedesId ? 'Corrected' : 'Charted'
  const { sentence } = entryWords(link)
  return {
    id: link.id,
    isShown: link.id === shownId,
    says: `${what} by ${link.recordedByName}, ${link.recordedRole}, on ${showDateTime(link.recordedAt, zone)}`,
    sentence: link.status === 'retracted' ? 'Entered in error.' : `${showDateTime(link.performedAt, zone)} ${sentence}`,
    reason: link.reason,
  }
}

function rawOf({ raw }: StoredEntry): string {
  return typeof raw === 'string' ? raw : JSON.stringify(raw, null, 2)
}
