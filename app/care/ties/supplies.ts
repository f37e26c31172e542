import type { CareContext } from '../kind.ts'
import { oneOf, type PlannedUse, timesADay, type Used } from '../supply.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { lastTieLook } from './looks.ts'
import type { TieData } from './schema.ts'
import { tieChangeInterval } from './settings.ts'

/** A fresh holder, where it was changed. */
export function tieUse({ changed }: TieData): readonly Used[] {
  return changed === 'yes' ? [oneOf('tube-holder')] : []
}

/** A holder each interval, while there is a tube that is tied. */
export function plannedTies(context: CareContext): readonly PlannedUse[] {
  const isTied = tubeInPlace(context.record) !== undefined && lastTieLook(context)?.fingers !== 'no ties'
  return isTied ? [{ item: { supply: 'tube-holder' }, perDay: timesADay(context.values.of(tieChangeInterval)) }] : []
}
