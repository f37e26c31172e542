import { type CuffBand, type CuffClass, cuffClass } from '../../clinical/cuff-band.ts'
import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import type { Values } from '../policy.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { type CuffData, cuffChecks, foundCmH2O, leftCmH2O } from './schema.ts'
import { cuffLower, cuffUpper, cuffVeryHigh, cuffVeryLow } from './settings.ts'

export type CuffEntry = Entry<CuffData>

/** The state of the cuff as charted: what the tube has, and whether an air cuff is up. */
export type CuffState = 'no tube' | 'no cuff' | 'foam' | 'water' | 'inflated' | 'deflated'

/** The band in force for this patient, in cmH2O. */
export function cuffBand(values: Values): CuffBand {
  return {
    lower: values.of(cuffLower),
    upper: values.of(cuffUpper),
    veryLow: values.of(cuffVeryLow),
    veryHigh: values.of(cuffVeryHigh),
  }
}

/** The cuff of the tube in place. An air cuff counts as inflated until it is charted as let down. */
export function cuffState(record: PatientRecord): CuffState {
  const tube = tubeInPlace(record)
  if (!tube) return 'no tube'
  if (tube.data.cuff === 'none') return 'no cuff'
  if (tube.data.cuff !== 'air') return tube.data.cuff
  const change = record.latest(
    cuffChecks,
    (data, entry) => data.cuffNow !== undefined && entry.performedAt >= tube.performedAt,
  )
  return change?.data.cuffNow ?? 'inflated'
}

/** Whether a reading may be held against the band: only that of an air cuff that is not deliberately down. */
export function isBanded(data: CuffData, record: PatientRecord): boolean {
  const state = cuffState(record)
  return (state === 'inflated' || (state === 'deflated' && data.cuffNow === 'inflated')) && data.cuffNow !== 'deflated'
}

/** The class of the found value, unrounded; undefined when not measured or when the band does not apply. */
export function foundClass(data: CuffData, context: CareContext): CuffClass | undefined {
  const found = foundCmH2O(data)
  return found === undefined || !isBanded(data, context.record) ? undefined : cuffClass(found, cuffBand(context.values))
}

/** The class of the value the cuff was left at. */
export function leftClass(data: CuffData, context: CareContext): CuffClass | undefined {
  const left = leftCmH2O(data)
  return left === undefined || !isBanded(data, context.record) ? undefined : cuffClass(left, cuffBand(context.values))
}

/** A reading that sets the clock back: taken with a gauge, and left within the band. */
export function endsInBand(data: CuffData, values: Values): boolean {
  const left = leftCmH2O(data)
  const gauged = data.method === 'manometer' || data.method === 'controller'
  return gauged && left !== undefined && cuffClass(left, cuffBand(values)) === 'in range'
}
