import type { CareContext } from '../kind.ts'
import { oneOf, type PlannedUse, timesADay, type Used } from '../supply.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { type StomaData, stomaChecks } from './schema.ts'
import { dressingInterval } from './settings.ts'

/** A fresh dressing and a fresh holder, where they were changed. */
export function stomaUse({ dressing, holderChanged }: StomaData): readonly Used[] {
  return [
    ...(dressing === 'changed' ? [oneOf('stoma-dressing')] : []),
    ...(holderChanged === 'yes' ? [oneOf('tube-holder')] : []),
  ]
}

/** A dressing each interval, unless the opening is left without one. */
export function plannedDressings({ record, values }: CareContext): readonly PlannedUse[] {
  const isBare = record.latest(stomaChecks)?.data.dressing === 'none'
  if (isBare || !tubeInPlace(record)) return []
  return [{ item: { supply: 'stoma-dressing' }, perDay: timesADay(values.of(dressingInterval)) }]
}
