import { policyInForce } from '#app/care/policy.ts'
import { type TrendView, trendsOf } from '#app/rules/trends.ts'
import { type Duration, earlier, hours } from '#app/time/duration.ts'
import { policies } from '#database/policies.server.ts'
import { bedMovesOf } from '#database/stays.server.ts'
import type { PatientCare } from './patient-context.server.ts'

/** Spans of the trends by name: so far back, or to the admission. */
export const trendSpans = {
  '24 h': hours(24),
  '3 days': hours(72),
  '7 days': hours(168),
  'Whole stay': null,
} as const satisfies Readonly<Record<string, Duration | null>>
export type TrendSpan = keyof typeof trendSpans

export interface PatientTrends {
  readonly trends: readonly TrendView[]
  /** Milliseconds. */
  readonly from: number
  readonly to: number
  readonly now: number
  readonly zone: string
}

/** The span that the address asks for. */
export function trendSpanOf(url: URL): TrendSpan {
  const span = url.searchParams.get('span')
  return span !== null && Object.hasOwn(trendSpans, span) ? (span as TrendSpan) : '7 days'
}

/**
 * What a patient's record shows over a span, each act judged by the policy of its time on the ward of its time. Null where no policy
 * was reviewed. After a discharge the span ends with it.
 */
export async function patientTrends(care: PatientCare, span: TrendSpan, now: Date): Promise<PatientTrends | null> {
  const { context, ward, record } = care
  if (!context) return null
  const { admittedAt, dischargedAt, id } = record.stay
  const to = dischargedAt ?? now
  const [known, moves] = [await policies(), await bedMovesOf(id)]
  const from = spanStart(trendSpans[span], admittedAt, to)
  const wardAt = (moment: Date) => (moves.find(({ movedAt }) => movedAt <= moment) ?? moves.at(-1))?.wardId ?? ward.id
  const trends = trendsOf({
    record: context.record,
    ward,
    now: to,
    from,
    to,
    policyAt: moment => policyInForce(known, wardAt(moment), moment) ?? context.values.policy,
    policyChangesAt: [...known.map(({ startsAt }) => startsAt), ...moves.map(({ movedAt }) => movedAt)],
  })
  return { trends, from: from.getTime(), to: to.getTime(), now: now.getTime(), zone: ward.zone }
}

/** Not before the admission, and at least an hour. */
function spanStart(length: Duration | null, admittedAt: Date, to: Date): Date {
  const asked = length === null ? admittedAt : earlier(to, length)
  const first = Math.max(asked.getTime(), admittedAt.getTime())
  return new Date(Math.min(first, earlier(to, hours(1)).getTime()))
}
