import { showPressure } from '../../clinical/units.ts'
import { vacuumMmHg } from '../../clinical/vacuum.ts'
import { minutes, since } from '../../time/duration.ts'
import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import { vacuumLow } from '../suction/settings.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { gapsSince, lastComplete } from './gaps.ts'
import { itemWords, kitItems } from './items.ts'
import { type KitData, kitChecks } from './schema.ts'
import { KIT_SOURCE, kitMissingWithin } from './settings.ts'

/** What a check of the kit asks people to notice. Silent when no tube is in. */
export function kitWarnings(data: KitData, context: CareContext): readonly Warning[] {
  return tubeInPlace(context.record) ? [...missing(data), ...weakSuction(data, context)] : []
}

function missing(data: KitData): readonly Warning[] {
  const items = data.missing ?? []
  if (items.length === 0) return []
  return [
    {
      name: 'bedside-kit-missing',
      level: 'amber',
      action: `Get ${items.map(item => itemWords[item]).join(', ')} now. Stay nearby until it arrives.`,
      cause: `Missing at the bedside: ${items.map(item => kitItems[item].toLowerCase()).join('; ')}.`,
      source: KIT_SOURCE,
    },
  ]
}

function weakSuction(
  { suctionTested: tested, suctionUnit: unit }: KitData,
  { values }: CareContext,
): readonly Warning[] {
  if (tested === undefined || unit === undefined) return []
  const least = values.of(vacuumLow)
  if (Math.round(vacuumMmHg(tested, unit)) >= least) return []
  return [
    {
      name: 'bedside-kit-suction-weak',
      level: 'amber',
      action:
        'Read the gauge and its unit again. If it is right, get working suction now and stay nearby until it arrives.',
      cause: `Suction tested at ${showPressure(tested, unit)}; ${least} mmHg is the least that is usual.`,
      source: vacuumLow.source.says,
    },
  ]
}

/** What is missing stands until a complete check; past its time the charge nurse is told. */
export function standingKitWarnings(context: CareContext): readonly Warning[] {
  const { record, values, now } = context
  if (!tubeInPlace(record)) return []
  const gaps = gapsSince(record, lastComplete(record))
  const first = gaps.at(-1)
  const isLate = first !== undefined && since(first.performedAt, now) > minutes(values.of(kitMissingWithin))
  const tell = `Tell the charge nurse: missing for more than ${values.of(kitMissingWithin)} minutes.`
  return [
    ...standsSince(gaps, { isSettledBy: () => true, warns: missing }, context).map(warning =>
      isLate ? { ...warning, action: `${tell} ${warning.action}` } : warning,
    ),
    ...standsSince(record.of(kitChecks), { isSettledBy: hasTestedSuction, warns: weakSuction }, context),
  ]
}

function hasTestedSuction({ suctionTested }: KitData): boolean {
  return suctionTested !== undefined
}
