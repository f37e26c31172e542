import { lastComplete } from '../bedside-kit/gaps.ts'
import { BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { recalledInPlace } from '../recall.ts'
import { standsSince } from '../standing.ts'
import { bleedWarnings } from '../suction/bleeding.ts'
import { lowSaturation } from '../suction/saturation.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { actsOnTube, isLeftOut, wasSeen } from './acts.ts'
import { absence, absentWarning, fitRules, noSpare } from './fit.ts'
import { narrowed, repeatedBlock, shorterInterval, standingBlocks, stillNarrowed } from './narrowing.ts'
import { pairState, standingPair } from './pair.ts'
import { type InnerCannulaData, innerCannulaActs } from './schema.ts'

/** What an act on the inner cannula asks people to notice as it is charted. */
export function innerCannulaWarnings(data: InnerCannulaData, context: CareContext): readonly Warning[] {
  return [
    ...notWell(data, context),
    ...blood(data, context),
    ...fitRules.flatMap(rule => rule.warns(data, context)),
    ...noSpare(data, context),
    ...narrowed(data, context),
    ...repeatedBlock(data, context),
  ]
}

function notWell(data: InnerCannulaData, context: CareContext): readonly Warning[] {
  if (data.tolerance !== 'distress') return lowSaturation('inner-cannula-spo2-low', data, context)
  return [
    {
      name: 'inner-cannula-distress',
      level: 'red',
      action: breathingAction(context.record.patient),
      cause: 'Distress at the inner cannula check.',
      source: BREATHING_SOURCE,
    },
  ]
}

function blood(data: InnerCannulaData, context: CareContext): readonly Warning[] {
  return bleedWarnings('inner-cannula-blood', data.blood, context)
}

/** What stands by the last acts on the inner cannula of the tube in place, each until an act that settles it. */
export function standingInnerCannulaWarnings(context: CareContext): readonly Warning[] {
  if (!tubeInPlace(context.record)) return []
  const acts = actsOnTube(context.record)
  return [
    ...standsSince(acts, { isSettledBy: () => true, warns: notWell }, context),
    ...standsSince(acts, { isSettledBy: wasSeen, warns: blood }, context),
    ...neverFitted(context),
    ...fitRules.flatMap(rule => standsSince(acts, rule, context)),
    ...spareMissing(context),
    ...standingPair(context),
    ...stillNarrowed(context),
    ...standingBlocks(context),
    ...shorterInterval(context),
    ...recalledCannula(context),
  ]
}

/** No spare at the last act stands until an act found one, or a check of the kit found everything there. */
function spareMissing(context: CareContext): readonly Warning[] {
  const { record } = context
  const whole = lastComplete(record)?.performedAt
  const from = tubeInPlace(record)?.performedAt
  // Of a pair whose other one is not ready, the warning of the pair says it.
  if (from === undefined || (pairState(record)?.other ?? 'ready') !== 'ready') return []
  const acts = record.since(innerCannulaActs, from).filter(({ performedAt }) => !whole || performedAt >= whole)
  return standsSince(acts, { isSettledBy: () => true, warns: noSpare }, context)
}

/** The cannula in place is the one that was put in last; of one that came with the tube the lot is not known. */
function recalledCannula({ record, ward }: CareContext): readonly Warning[] {
  const last = actsOnTube(record).find(
    ({ data }) => data.act === 'replaced' || data.act === 'swapped' || isLeftOut(data),
  )
  return last && !isLeftOut(last.data) ? recalledInPlace('inner cannula', last.data, ward) : []
}

/** A dual tube that went in without an inner cannula, where no act says that one was fitted or tried. */
function neverFitted({ record }: CareContext): readonly Warning[] {
  const tube = tubeInPlace(record)?.data
  if (tube?.construction !== 'dual' || tube.innerCannula !== 'none') return []
  return actsOnTube(record).some(({ data }) => absence.isSettledBy(data)) ? [] : [absentWarning(tube.connector)]
}
