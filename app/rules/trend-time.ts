import { carePlans } from '../care/care-plan/schema.ts'
import type { CareContext, Entry, PatientRecord, WardFacts } from '../care/kind.ts'
import type { Policy } from '../care/policy.ts'
import { recordBefore, recordUpTo } from '../care/record.ts'
import type { RecordInTime } from '../care/trend.ts'
import { addDays, isLocalDay, type LocalDay, startOfDay } from '../time/zone.ts'
import { careContext } from './context.ts'

/** What trends are made from: a record, the policy of any moment, and the span that is asked for. */
export interface TrendsAsked {
  readonly record: PatientRecord
  readonly ward: WardFacts
  readonly now: Date
  readonly from: Date
  readonly to: Date
  readonly policyAt: (moment: Date) => Policy
  /** When another version came into force, or the patient to a ward with another policy. */
  readonly policyChangesAt: readonly Date[]
}

/** What rules decided from at a moment: the record up to then, the policy and own values of then. */
export function contextAt({ record, ward, policyAt }: TrendsAsked, at: Date): CareContext {
  return careContext({ record: recordUpTo(record, at), policy: policyAt(at), ward, now: at })
}

/** The same at the moment before an act. */
export function contextBeforeAct({ record, ward, policyAt }: TrendsAsked, act: Entry): CareContext {
  const { performedAt: now } = act
  return careContext({ record: recordBefore(record, act), policy: policyAt(now), ward, now })
}

/** The record with the past of its rules. */
export function recordInTime(asked: TrendsAsked): RecordInTime {
  return { record: asked.record, now: asked.now, at: moment => contextAt(asked, moment) }
}

/** Moments of the span at which a number in force may become another: its start, versions, own values and birthdays. Oldest first. */
export function changesWithin(asked: TrendsAsked): readonly Date[] {
  const { record, ward, from, to, policyChangesAt } = asked
  const plans = record.since(carePlans, from).map(({ performedAt }) => performedAt)
  const ages = ageTurns(record.patient.bornOn, to).map(day => startOfDay(day, ward.zone))
  const within = [...policyChangesAt, ...plans, ...ages].filter(at => at > from && at <= to)
  const times = [from, ...within].map(at => at.getTime())
  return [...new Set(times)].sort((a, b) => a - b).map(ms => new Date(ms))
}

/** Days up to a moment on which an age by which children are judged may change: the 28th, and birthdays. */
function ageTurns(bornOn: LocalDay, until: Date): readonly LocalDay[] {
  const born = Number(bornOn.slice(0, 4))
  const years = Math.max(0, until.getUTCFullYear() - born)
  const birthdays = Array.from({ length: years }, (_, index) => `${born + index + 1}${bornOn.slice(4)}`)
  return [addDays(bornOn, 28), ...birthdays.map(day => (isLocalDay(day) ? day : `${day.slice(0, 4)}-03-01`))]
}
