import type { CareContext } from '../kind.ts'
import { type PlannedUse, timesADay, type Used } from '../supply.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { cannulaType } from './acts.ts'
import type { InnerCannulaData } from './schema.ts'
import { disposableInterval } from './settings.ts'

/** A new cannula. Cleaning and swapping take nothing: the two of a pair go round. */
export function innerCannulaUse({ act, line, size }: InnerCannulaData): readonly Used[] {
  if (act !== 'replaced' || line === undefined || size === undefined) return []
  return [{ item: { device: 'inner cannula', line, size }, quantity: 1 }]
}

/** A disposable cannula each interval, of the tube in place. */
export function plannedInnerCannulas({ record, values }: CareContext): readonly PlannedUse[] {
  const tube = tubeInPlace(record)
  if (tube?.data.construction !== 'dual' || cannulaType(tube, record) !== 'disposable') return []
  const { line, size } = tube.data
  return [{ item: { device: 'inner cannula of a tube', line, size }, perDay: timesADay(values.of(disposableInterval)) }]
}
