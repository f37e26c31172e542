import { showTime } from '../../time/display.ts'
import { earlier, hours, later } from '../../time/duration.ts'
import type { CareContext } from '../kind.ts'
import { cameAgain } from '../standing.ts'
import type { Warning } from '../warning.ts'
import { actsOnTube, type InnerCannulaEntry, isNarrowed, isPartlyBlocked, wasSeen } from './acts.ts'
import { type InnerCannulaData, innerCannulaActs } from './schema.ts'
import { inspectionInterval, recheckWithin, repeatBlockWindow } from './settings.ts'

const SOURCE = 'Royal Marsden Manual, ch. 12: the interval follows the secretions'

/** A heavy coating or a block, as it is charted. */
export function narrowed(data: InnerCannulaData, { values }: CareContext): readonly Warning[] {
  if (!isNarrowed(data)) return []
  return [
    {
      name: 'inner-cannula-narrowed',
      level: 'amber',
      action: `Fit a clean inner cannula. Check again in ${hourWords(values.of(recheckWithin))}. Review humidity.`,
      cause: `The inner cannula was ${conditionWords(data)}.`,
      source: recheckWithin.source.says,
    },
  ]
}

/** The same for as long as no later look found it clearer; once a clean one is in, it says when to look again. */
export function stillNarrowed(context: CareContext): readonly Warning[] {
  const seen = actsOnTube(context.record).find(({ data }) => wasSeen(data))
  if (!seen) return []
  const again = later(seen.performedAt, hours(context.values.of(recheckWithin)))
  const isReplaced = seen.data.act !== 'inspected' && seen.data.act !== 'unable'
  return narrowed(seen.data, context).map(warning => ({
    ...warning,
    action: isReplaced
      ? `Check the inner cannula again by ${showTime(again, context.ward.zone)}. Review humidity.`
      : warning.action,
  }))
}

/** A second block within a day or so, counting the act that is being charted. */
export function repeatedBlock(data: InnerCannulaData, context: CareContext): readonly Warning[] {
  return data.condition === 'blocked' ? blocksWarning(1 + blocksBefore(context), context) : []
}

/** The same, from what is charted. */
export function standingBlocks(context: CareContext): readonly Warning[] {
  const blocked = context.record.of(innerCannulaActs).filter(({ data }) => data.condition === 'blocked')
  return blocksWarning(cameAgain(blocked, hours(context.values.of(repeatBlockWindow)), context).length, context)
}

function blocksBefore({ record, values, now }: CareContext): number {
  return record
    .since(innerCannulaActs, earlier(now, hours(values.of(repeatBlockWindow))))
    .filter(({ data, performedAt }) => data.condition === 'blocked' && performedAt <= now).length
}

function blocksWarning(blocks: number, { values }: CareContext): readonly Warning[] {
  if (blocks < 2) return []
  return [
    {
      name: 'inner-cannula-repeat-block',
      level: 'amber',
      action: 'Ask the tracheostomy specialist to review today. Review humidity and suction.',
      cause: `Blocked ${blocks} times within ${hourWords(values.of(repeatBlockWindow))}.`,
      source: repeatBlockWindow.source.says,
    },
  ]
}

/** Two partly blocked checks in a row suggest halving the interval, unless it was set for this patient since. */
export function shorterInterval(context: CareContext): readonly Warning[] {
  const { record, values } = context
  const [last, before] = actsOnTube(record).filter(({ data }) => wasSeen(data))
  const half = values.of(inspectionInterval) / 2
  if (!last || !before || half < (inspectionInterval.min ?? 1)) return []
  if (!bothPartlyBlocked(last, before) || isSetSince(last, context)) return []
  return [
    {
      name: 'inner-cannula-shorter-interval',
      level: 'blue',
      action: `Think about looking at the inner cannula every ${hourWords(half)}, in the care plan.`,
      cause: `Partly blocked at the last two checks; the interval now is ${hourWords(values.of(inspectionInterval))}.`,
      source: SOURCE,
    },
  ]
}

function bothPartlyBlocked(a: InnerCannulaEntry, b: InnerCannulaEntry): boolean {
  return isPartlyBlocked(a.data) && isPartlyBlocked(b.data)
}

function isSetSince(last: InnerCannulaEntry, { values }: CareContext): boolean {
  const own = values.personal(inspectionInterval)
  return own !== undefined && own.since >= last.performedAt
}

function conditionWords({ condition }: InnerCannulaData): string {
  return condition === 'blocked' ? 'blocked' : 'half blocked or more'
}

function hourWords(n: number): string {
  return n === 1 ? '1 hour' : `${n} hours`
}
