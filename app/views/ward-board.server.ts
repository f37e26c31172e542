import type { WardFacts } from '#app/care/kind.ts'
import { type Policy, type PolicyOverTime, policyOverTime } from '#app/care/policy.ts'
import { env } from '#app/env.server.ts'
import type { Board, BoardPatient } from '#app/rules/board.ts'
import { type BoardCare, boardCare } from '#app/rules/board-care.ts'
import { careView } from '#app/rules/views.ts'
import { policyWords } from '#app/rules/why.ts'
import { ageOn } from '#app/time/display.ts'
import { earlier, hours } from '#app/time/duration.ts'
import { shiftAt } from '#app/time/shift.ts'
import { type LocalDay, localDay } from '#app/time/zone.ts'
import { countToCountersign } from '#database/countersignatures.server.ts'
import { recalls } from '#database/lot-recalls.server.ts'
import { policies } from '#database/policies.server.ts'
import { type StayRecord, wardRecords } from '#database/records.server.ts'
import { wardRev } from '#database/ward-revs.server.ts'
import { wardById } from '#database/wards.server.ts'
import { contextOf } from './care-of.server.ts'

/** A board as it is served: the data, the tag that changes with it, and the server's clock (ms). */
export interface ServedBoard {
  readonly data: Board
  readonly etag: string
  readonly at: number
}

/** A strip shows eight hours back; one more, so that it stays full while the page is open. */
const MARKS_BACK = hours(9)
/** Shifts, days of a tube and first-day rules move with time alone: after this long a board is computed again. */
const SLOT_MS = 5 * 60_000

const kept = new Map<string, ServedBoard>()
const MOST_BOARDS = 200

/** The tag of a ward's board: the ward's counter, and the five minutes that it was computed in. */
export function boardTag(wardId: string, rev: number, now: Date): string {
  return `"${wardId.slice(0, 8)}.${rev}.${slotOf(now)}"`
}

const slotOf = (now: Date): number => Math.floor(now.getTime() / SLOT_MS)

/**
 * The board of a ward, computed once for each state of the ward and five minutes; undefined when there is no such ward.
 * `rev` is the ward's counter if the caller has just read it. Statuses are the viewer's, from the windows and the clock.
 */
export async function wardBoard(wardId: string, now: Date, rev?: number): Promise<ServedBoard | undefined> {
  const counter = rev ?? (await wardRev(wardId))
  const etag = boardTag(wardId, counter, now)
  const known = kept.get(wardId)
  if (known?.etag === etag) return { ...known, at: now.getTime() }
  const board = await computedBoard(wardId, now, counter)
  if (!board) return undefined
  const served = { data: board, etag, at: now.getTime() }
  if (kept.size >= MOST_BOARDS) kept.clear()
  kept.set(wardId, served)
  return served
}

const texts = new WeakMap<Board, Buffer>()

/** The board and the clock as JSON in UTF-8, for data refreshes: `{"data": …, "at": …}`. Written once for each state of the ward. */
export function boardJson({ data, at }: ServedBoard): Uint8Array<ArrayBuffer> {
  const text = texts.get(data) ?? Buffer.from(JSON.stringify(data))
  texts.set(data, text)
  return Buffer.concat([Buffer.from('{"data":'), text, Buffer.from(`,"at":${at}}`)])
}

async function computedBoard(wardId: string, now: Date, rev: number): Promise<Board | undefined> {
  const [ward, known, records, recalled, toCountersign] = await Promise.all([
    wardById(wardId),
    policies(),
    wardRecords(wardId, rev),
    recalls(),
    countToCountersign(wardId),
  ])
  if (!ward) return undefined
  const { shiftTimes, pressureUnit } = ward
  const facts: WardFacts = { zone: env.hospitalTimeZone, shiftTimes, pressureUnit, recalls: recalled }
  const policyAt = policyOverTime(known, wardId)
  const policy = policyAt(now)
  const judging = policy && { policy, policyAt, ward: facts, now }
  return {
    wardId,
    wardName: ward.name,
    zone: facts.zone,
    shiftEndsAt: shiftAt(now, ward.shiftTimes, facts.zone).endsAt.getTime(),
    policy: policy ? policyWords(policy) : null,
    toCountersign,
    patients: records.stays.map(stay => boardPatient(stay, judging, localDay(now, facts.zone))),
  }
}

/** What every patient of a board is judged by. */
interface Judging {
  readonly policy: Policy
  readonly policyAt: PolicyOverTime
  readonly ward: WardFacts
  readonly now: Date
}

function boardPatient(record: StayRecord, judging: Judging | undefined, today: LocalDay): BoardPatient {
  const { patient, stay } = record
  return {
    patientId: patient.id,
    bed: stay.bedLabel,
    familyName: patient.familyName,
    givenName: patient.givenName,
    age: ageOn(patient.bornOn, today),
    recordNumber: patient.recordNumber,
    laryngectomy: patient.upperAirway === 'not open',
    care: judging ? careOf(record, judging) : NOTHING,
  }
}

const NOTHING = { tasks: [], marks: [], running: [], warnings: [] } as const

const cares = new WeakMap<StayRecord['entries'], { readonly of: string; readonly care: BoardCare }>()

/** One patient's care, computed once for each state of the patient and five minutes: what is charted for one is one's own. */
function careOf(record: StayRecord, judging: Judging): BoardCare {
  const { policy, ward, now } = judging
  const { patient, stay } = record
  const of = JSON.stringify([slotOf(now), policy.id, policy.children?.id, patient.version, stay.moves.length, ward])
  const known = cares.get(record.entries)
  if (known?.of === of) return known.care
  const care = boardCare(careView(contextOf(record, judging), earlier(now, MARKS_BACK)))
  cares.set(record.entries, { of, care })
  return care
}
