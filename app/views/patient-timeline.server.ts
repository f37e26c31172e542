import type { CareContext, StoredEntry } from '#app/care/kind.ts'
import { findKind } from '#app/care/kinds.ts'
import { readEntry } from '#app/care/record.ts'
import { dueTasks } from '#app/rules/due-tasks.ts'
import { entryWords, lateWords, photographsOf } from '#app/rules/entry-words.ts'
import { type TubeCardOrNone, tubeCard } from '#app/rules/tube-card.ts'
import { type CareView, careView, isOutOfRange } from '#app/rules/views.ts'
import { type WhyDue, whyDue } from '#app/rules/why.ts'
import { type WhyByName, whyStanding } from '#app/rules/why-warnings.ts'
import { showDateTime, showTime } from '#app/time/display.ts'
import { type Duration, earlier, hours } from '#app/time/duration.ts'
import { type LocalDay, localDay } from '#app/time/zone.ts'
import { cursorText, readCursor, type Superseding, timeline } from '#database/timeline.server.ts'
import { signingOf } from './entry-signing.server.ts'
import type { PatientCare } from './patient-context.server.ts'

/** Spans of the hour strip by name: hours back, and hours ahead. */
export const spans = {
  '12 h': { back: 8, ahead: 4 },
  '24 h': { back: 16, ahead: 8 },
  '7 days': { back: 144, ahead: 24 },
} as const
export type SpanName = keyof typeof spans

export interface EntryLine {
  readonly id: string
  readonly day: LocalDay
  readonly time: string
  readonly title: string
  readonly sentence: string
  readonly author: string
  readonly role: string
  readonly late: string | null
  readonly status: 'final' | 'corrected' | 'retracted'
  readonly statusSays: string | null
  readonly outOfRange: boolean
  /** Ids of its photographs, while it counts. */
  readonly photographs: readonly string[]
  /** Whether it waits for a countersignature, and who gave it. */
  readonly countersign: { readonly says: string; readonly waits: boolean } | null
  /** The second person, and whether they signed. */
  readonly second: string | null
}

export interface PatientTimeline {
  readonly patientId: string
  readonly zone: string
  readonly care: CareView
  readonly why: Readonly<Record<string, WhyDue>>
  readonly whyWarned: WhyByName
  readonly tube: TubeCardOrNone
  readonly entries: readonly EntryLine[]
  readonly next: string | null
  /** Words when the stay is over, or when the ward has no reviewed policy: nothing is computed then. */
  readonly nothingDue: string | null
}

export interface ServedTimeline {
  readonly data: PatientTimeline
  readonly etag: string
  readonly at: number
}

const PAGE = 30
const SLOT_MS = 5 * 60_000

/** What the timeline shows is asked for in its address: `span`, `kind`, `before`. */
export function timelineQuery(url: URL) {
  const span = url.searchParams.get('span')
  const kind = url.searchParams.get('kind')
  return {
    span: (span !== null && Object.hasOwn(spans, span) ? span : '24 h') as SpanName,
    kind: kind !== null && findKind(kind) ? kind : undefined,
    before: readCursor(url.searchParams.get('before')),
  }
}

/** The tag that changes when something of the patient does, and every five minutes. */
export function timelineTag({ stay, patient }: PatientCare['record'], url: URL, now: Date): string {
  const asked = timelineQuery(url)
  const view = `${asked.span}.${asked.kind ?? ''}.${asked.before?.id ?? ''}`.replaceAll(' ', '')
  // A discharge or a move charts nothing, and ends or changes what is due.
  const place = `${stay.bedId.slice(-8)}.${stay.moves.length}${stay.dischargedAt === null ? '' : '.left'}`
  return `"${stay.id.slice(0, 8)}.${place}.${stay.entryCount}.${stay.countersignCount}.${patient.version}.${Math.floor(now.getTime() / SLOT_MS)}.${view}"`
}

/** One patient's page: due care with its reasons, the tube, marks for the strip, and a page of entries. */
export async function patientTimeline(patient: PatientCare, url: URL, now: Date): Promise<ServedTimeline> {
  const { span, kind, before } = timelineQuery(url)
  const { record } = patient
  const page = await timeline(record.stay.id, { limit: PAGE, kind, before })
  const zone = patient.ward.zone
  const signing = await signingOf(page.entries.map(({ entry }) => entry))
  const entries = page.entries.map(({ entry, supersededBy }) => ({
    ...entryLine(entry, supersededBy, patient),
    countersign: supersededBy ? null : signing.countersign(entry, zone),
    second: signing.second(entry),
  }))
  return {
    etag: timelineTag(record, url, now),
    at: now.getTime(),
    data: {
      patientId: record.patient.id,
      zone,
      ...careOf(patient, hours(spans[span].back + 1)),
      entries,
      next: page.next && cursorText(page.next),
      nothingDue: patient.nothingDue,
    },
  }
}

function careOf({ context, nothingDue }: PatientCare, back: Duration) {
  if (!context)
    return {
      care: { tasks: [], marks: [], running: [], warnings: [] },
      why: {},
      whyWarned: {},
      tube: { none: 'Not computed.' },
    }
  const care = careView(context, earlier(context.now, back))
  return {
    care: nothingDue === null ? care : { ...care, tasks: [], running: [], warnings: [] },
    why: Object.fromEntries(dueTasks(context).map(task => [task.rule.name, whyDue(task, context)])),
    whyWarned: whyStanding(context),
    tube: tubeCard(context),
  }
}

function entryLine(entry: StoredEntry, by: Superseding | null, { context, ward }: PatientCare) {
  const words = entryWords(entry)
  const status: EntryLine['status'] =
    entry.status === 'retracted' || by?.status === 'retracted' ? 'retracted' : by ? 'corrected' : 'final'
  return {
    id: entry.id,
    day: localDay(entry.performedAt, ward.zone),
    time: showTime(entry.performedAt, ward.zone),
    title: words.title,
    sentence: words.sentence,
    author: entry.recordedByName,
    role: entry.recordedRole,
    late: (context && lateWords(entry, context.values)) ?? null,
    status,
    statusSays: statusWords(entry, by, ward.zone),
    outOfRange: isMarked(entry, context),
    photographs: status === 'final' ? photographsOf(entry) : [],
  }
}

function isMarked(stored: StoredEntry, context: CareContext | null): boolean {
  const kind = findKind(stored.kind)
  const entry = kind && readEntry(kind, stored)[0]
  return kind !== undefined && entry !== undefined && context !== null && isOutOfRange(kind, entry, context)
}

function statusWords(entry: StoredEntry, by: Superseding | null, zone: string): string | null {
  if (by) {
    const what = by.status === 'retracted' ? 'Retracted' : 'Corrected'
    return `${what} on ${showDateTime(by.recordedAt, zone)} by ${by.recordedByName}: ${by.reason ?? ''}`
  }
  if (entry.status === 'retracted') return `Entered in error: ${entry.reason ?? ''}`
  return entry.supersedesId ? `Corrects an earlier entry: ${entry.reason ?? ''}` : entry.reason
}
