import type { LocalDay } from '../../time/zone.ts'
import type { Entry, PatientRecord } from '../kind.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { type TubePlanData, tubePlans } from './schema.ts'

/** A plan that stands, with its day. */
export interface OpenPlan {
  readonly entry: Entry<TubePlanData>
  readonly plannedOn: LocalDay
}

/**
 * The plan that stands for the tube in place: the latest, unless it was called off or a change was tried since. A change that
 * failed ends it as well, since the next try asks every question anew.
 */
export function openPlan(record: PatientRecord): OpenPlan | undefined {
  const entry = record.latest(tubePlans)
  const plannedOn = entry?.data.plannedOn
  if (!entry || plannedOn === undefined || entry.data.step !== 'plan' || !tubeInPlace(record)) return undefined
  const isTried = record.since(tubeChanges, entry.performedAt).some(({ data }) => data.reason !== 'on arrival')
  return isTried ? undefined : { entry, plannedOn }
}
