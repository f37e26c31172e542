import { adverseEvents, leavesTubeOut } from '../adverse-event/schema.ts'
import { decannulations } from '../decannulation/schema.ts'
import type { Entry, PatientRecord } from '../kind.ts'
import { type TubeData, tubeChanges } from './schema.ts'

/** Why no tube is in, and since when: it came out and is not back, or it was removed for good. */
export interface TubeAbsence {
  readonly why: 'came out' | 'removed for good'
  readonly since: Date
}

/** The absence of the tube that was in; undefined while one is in, and where none was ever charted. */
export function tubeAbsence(record: PatientRecord): TubeAbsence | undefined {
  const removed = tubeOutSince(record)
  if (removed) return { why: 'removed for good', since: removed }
  const out = record.latest(adverseEvents, leavesTubeOut)
  return out && !isBackIn(out, record) ? { why: 'came out', since: out.performedAt } : undefined
}

/** When the tube was taken out for good, if no tube has gone in since. */
export function tubeOutSince(record: PatientRecord): Date | undefined {
  const removal = record.latest(decannulations)
  const tube = latestIn(record)
  return removal && !(tube && tube.performedAt > removal.performedAt) ? removal.performedAt : undefined
}

/**
 * Whether a tube went in, or was charted as back, after it had come out. At the same minute it did: both forms of one accident are
 * charted with one time.
 */
export function isBackIn(out: Entry, record: PatientRecord): boolean {
  return (
    record.since(tubeChanges, out.performedAt).some(({ data }) => isIn(data)) ||
    record.since(adverseEvents, out.performedAt).some(({ data }) => data.tubeNow === 'in')
  )
}

/** The tube that went in last and was not taken out for good: in place, or the one that came out. */
export function lastTube(record: PatientRecord): Entry<TubeData> | undefined {
  return tubeOutSince(record) ? undefined : latestIn(record)
}

function latestIn(record: PatientRecord): Entry<TubeData> | undefined {
  return record.latest(tubeChanges, isIn)
}

const isIn = ({ difficulty }: TubeData): boolean => difficulty !== 'failed'
