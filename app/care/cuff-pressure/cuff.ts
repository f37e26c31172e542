import { type CuffBand, type CuffClass, cuffClass } from '../../clinical/cuff-band.ts'
import { cuffStates, isUp } from '../cuff-state/schema.ts'
import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import type { Values } from '../policy.ts'
import { recordUpTo } from '../record.ts'
import { type TubeEntry, tubeInPlace } from '../tube-change/tube.ts'
import { waterCuffs } from '../water-cuff/schema.ts'
import { weaningTrials } from '../weaning-trial/schema.ts'
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

/** The cuff of the tube in place. It counts as up until it is charted as let down, by whatever was charted of it last. */
export function cuffState(record: PatientRecord): CuffState {
  const tube = tubeInPlace(record)
  if (!tube) return 'no tube'
  if (tube.data.cuff === 'none') return 'no cuff'
  if (tube.data.cuff === 'foam') return 'foam'
  const isDown = lastSaid(tube, record) === 'deflated'
  if (tube.data.cuff === 'water') return isDown ? 'deflated' : 'water'
  return isDown ? 'deflated' : 'inflated'
}

/** The same at a moment of the past. */
export function cuffStateAt(record: PatientRecord, at: Date): CuffState {
  return cuffState(recordUpTo(record, at))
}

/** What was charted of the cuff last: by a check, as let down or inflated, with a trial, or as water put in. */
function lastSaid(tube: TubeEntry, record: PatientRecord): 'inflated' | 'deflated' | undefined {
  const onTube = ({ performedAt }: Entry) => performedAt >= tube.performedAt
  const said = <Data>(
    entry: Entry<Data> | undefined,
    state: (data: Data) => 'inflated' | 'deflated' | undefined,
  ): readonly Said[] => (entry ? [{ at: entry.performedAt, state: state(entry.data) }] : [])
  return [
    ...said(
      record.latest(cuffChecks, (data, entry) => onTube(entry) && cuffLeft(data) !== undefined),
      cuffLeft,
    ),
    ...said(
      record.latest(cuffStates, (_, entry) => onTube(entry)),
      data => (isUp(data) ? 'inflated' : 'deflated'),
    ),
    ...said(
      record.latest(weaningTrials, ({ cuffNow }, entry) => onTube(entry) && (cuffNow === 'up' || cuffNow === 'down')),
      ({ cuffNow }) => (cuffNow === 'up' ? 'inflated' : 'deflated'),
    ),
    ...said(
      record.latest(waterCuffs, (_, entry) => onTube(entry)),
      ({ instilledMl }) => (instilledMl > 0 ? 'inflated' : 'deflated'),
    ),
  ].reduce<Said | undefined>((last, one) => (last && last.at >= one.at ? last : one), undefined)?.state
}

interface Said {
  readonly at: Date
  readonly state: 'inflated' | 'deflated' | undefined
}

/** The latest time at which the cuff of the tube in place was let go up again, not just read as up. */
export function inflatedAt(record: PatientRecord): Date | undefined {
  const tube = tubeInPlace(record)
  const moments = [
    record.latest(cuffChecks, data => data.cuffNow === 'inflated'),
    record.latest(cuffStates, ({ act }) => act === 'up'),
    record.latest(weaningTrials, ({ step, cuffNow }) => step === 'end' && cuffNow === 'up'),
  ].flatMap(entry => (entry && tube && entry.performedAt >= tube.performedAt ? [entry.performedAt.getTime()] : []))
  return moments.length === 0 ? undefined : new Date(Math.max(...moments))
}

/** How a check left the cuff: as charted, else up when there is pressure in it, else not said. */
export function cuffLeft(data: CuffData): 'inflated' | 'deflated' | undefined {
  if (data.cuffNow) return data.cuffNow
  const left = leftCmH2O(data)
  return left !== undefined && left > 0 ? 'inflated' : undefined
}

/** Whether the band applies to a pressure (cmH2O) of this check: that of an air cuff which is not deliberately down. */
function isBanded(cmH2O: number, data: CuffData, record: PatientRecord): boolean {
  const state = cuffState(record)
  if (data.cuffNow === 'deflated') return false
  return state === 'inflated' || (state === 'deflated' && cmH2O > 0)
}

/** The class of the found value, unrounded; undefined when not measured or when the band does not apply. */
export function foundClass(data: CuffData, context: CareContext): CuffClass | undefined {
  return classOf(foundCmH2O(data), data, context)
}

/** The class of the value the cuff was left at. */
export function leftClass(data: CuffData, context: CareContext): CuffClass | undefined {
  return classOf(leftCmH2O(data), data, context)
}

function classOf(cmH2O: number | undefined, data: CuffData, { record, values }: CareContext): CuffClass | undefined {
  return cmH2O === undefined || !isBanded(cmH2O, data, record) ? undefined : cuffClass(cmH2O, cuffBand(values))
}

/** A reading that sets the clock back: taken with a gauge, and left within the band. */
export function endsInBand(data: CuffData, values: Values): boolean {
  const left = leftCmH2O(data)
  return isGauged(data) && left !== undefined && cuffClass(left, cuffBand(values)) === 'in range'
}

/** Read on a gauge: volume and leak techniques set a cuff, they do not measure it. */
export function isGauged({ method }: CuffData): boolean {
  return method === 'manometer' || method === 'controller'
}
