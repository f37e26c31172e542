import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import { suctions } from '../suction/schema.ts'
import { type TubeEntry, tubeInPlace } from '../tube-change/tube.ts'
import { type AboveCuffData, aboveCuffSuctions, isEmptied } from './schema.ts'
import { aboveCuffInterval } from './settings.ts'

export type AboveCuffEntry = Entry<AboveCuffData>

/** Volumes drawn through the port of the tube in place, latest first; none after a tube was taken out for good. */
export function actsOnTube(record: PatientRecord): readonly AboveCuffEntry[] {
  const tube = tubeInPlace(record)
  return tube ? record.since(aboveCuffSuctions, tube.performedAt) : []
}

/** The latest emptying, with its volume or as a route of suction: nobody charts it twice. */
export function lastEmptying(record: PatientRecord): Entry | undefined {
  const tube = tubeInPlace(record)
  const own = actsOnTube(record).find(({ data }) => isEmptied(data))
  const asRoute = tube && portSuctions(tube, record)[0]
  if (!own || !asRoute) return own ?? asRoute
  return asRoute.performedAt > own.performedAt ? asRoute : own
}

/** Whether the tube in place is known to have a port: suction went through it, or the care plan asks for it. */
export function hasPort({ record, values }: CareContext): boolean {
  const tube = tubeInPlace(record)
  if (!tube || tube.data.cuff === 'none') return false
  return (
    values.personal(aboveCuffInterval) !== undefined ||
    actsOnTube(record).length > 0 ||
    portSuctions(tube, record).length > 0
  )
}

function portSuctions(tube: TubeEntry, record: PatientRecord): readonly Entry[] {
  return record.since(suctions, tube.performedAt).filter(({ data }) => data.route === 'above cuff')
}
