import { type Duration, hours, since } from '../../time/duration.ts'
import type { CareContext } from '../kind.ts'
import { actsOnTube } from './acts.ts'
import { isEmptied } from './schema.ts'
import { aboveCuffRateLimit } from './settings.ts'

/** Secretions above the cuff in mL an hour, not rounded; undefined over no time at all. */
export function mlPerHour(volumeMl: number, over: Duration): number | undefined {
  return over > 0 ? (volumeMl * hours(1)) / over : undefined
}

/** The rate (mL/h) of the latest emptying since the one before it, and whether it is at most that of the policy. */
export interface AboveCuffRate {
  readonly mlPerHour: number
  readonly isLow: boolean
}

/** How fast secretions gather above the cuff of the tube in place; undefined until it was emptied twice with a volume. */
export function aboveCuffRate({ record, values }: CareContext): AboveCuffRate | undefined {
  const [last, before] = actsOnTube(record).filter(({ data }) => isEmptied(data))
  const rate = last && before && mlPerHour(last.data.volumeMl, since(before.performedAt, last.performedAt))
  return rate === undefined ? undefined : { mlPerHour: rate, isLow: rate <= values.of(aboveCuffRateLimit) }
}
