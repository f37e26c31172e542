import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import type { Warning } from '../warning.ts'
import { actsOnTube } from './acts.ts'
import { bleedWatch } from './bleed-watch.ts'
import { bleedWarnings } from './bleeding.ts'
import { changedSecretions, notWell, willNotPass } from './findings.ts'
import { isThroughTube, type SuctionData } from './schema.ts'
import { techniqueWarnings } from './technique.ts'

/** What an episode of suction asks people to notice as it is charted. */
export function suctionWarnings(data: SuctionData, context: CareContext): readonly Warning[] {
  return [
    ...willNotPass(data, context),
    ...notWell(data, context),
    ...blood(data, context),
    ...techniqueWarnings(data, context),
    ...changedSecretions(data, context),
  ]
}

/** What stands until a later look shows otherwise: a catheter that would not pass, distress, SpO2 that stayed low, and blood. */
export function standingSuctionWarnings(context: CareContext): readonly Warning[] {
  const acts = actsOnTube(context.record)
  return [
    ...standsSince(acts, { isSettledBy: isThroughTube, warns: willNotPass }, context),
    ...standsSince(acts, { isSettledBy: saysHowPatientIs, warns: notWell }, context),
    ...standsSince(acts, { isSettledBy: data => data.blood !== undefined, warns: blood }, context),
    ...bleedWatch(context),
  ]
}

/** Looked and listened, or suctioned with a word on how it was borne. */
function saysHowPatientIs({ act, tolerance }: SuctionData): boolean {
  return act === 'need only' || tolerance !== undefined
}

/** Whether an act found what must be acted on now: drawn apart from what is usual. */
export function isOutOfRange(data: SuctionData, context: CareContext): boolean {
  return suctionWarnings(data, context).some(({ level }) => level === 'red')
}

function blood(data: SuctionData, context: CareContext): readonly Warning[] {
  return bleedWarnings('suction-blood', data.blood, context)
}
