import type { CareContext, PatientRecord } from '../kind.ts'
import { type PlannedUse, timesADay, type Used } from '../supply.ts'
import { careOfTubeFrom } from '../tube-care.ts'
import { usedTube } from '../tube-change/supplies.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { cannulaType } from './acts.ts'
import type { InnerCannulaData } from './schema.ts'
import { disposableInterval } from './settings.ts'

/** A new cannula. Cleaning and swapping take nothing: the two of a pair go round. */
export function innerCannulaUse(data: InnerCannulaData, before: PatientRecord | null): readonly Used[] {
  const { act, item: id, line, size } = data
  if (act !== 'replaced' || line === undefined || size === undefined) return []
  const tube = before && tubeInPlace(before)
  const ofTube = tube ? usedTube(tube.data) : undefined
  return [{ item: { device: 'inner cannula', id, line, size, ofTube }, quantity: 1 }]
}

/** A disposable cannula each interval, of the tube in place. */
export function plannedInnerCannulas(context: CareContext): readonly PlannedUse[] {
  const { record, values } = context
  const tube = tubeInPlace(record)
  if (tube?.data.construction !== 'dual' || cannulaType(tube, record) !== 'disposable') return []
  const { line, size } = tube.data
  const perDay = timesADay(values.of(disposableInterval))
  const item = { device: 'inner cannula', line, size, ofTube: usedTube(tube.data) } as const
  return [{ item, perDay, since: careOfTubeFrom(tube, context) }]
}
