import { showDuration } from '../../time/display.ts'
import { type Duration, hours, later, since } from '../../time/duration.ts'
import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import type { Values } from '../policy.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import type { Warning } from '../warning.ts'
import { decannulations } from './schema.ts'
import { failedRemovalWindow } from './settings.ts'

/** A removal after which a tube went back in, and how long that took. */
export interface TubeBack {
  readonly removal: Entry
  readonly back: Entry
  readonly after: Duration
  /** Within the window of the policy, its end included: the removal has failed. */
  readonly isFailure: boolean
}

/** Every removal of the stay after which a tube went back in, latest first. */
export function tubesBack(record: PatientRecord, values: Values): readonly TubeBack[] {
  return record.of(decannulations).flatMap(removal => {
    const back = record
      .since(tubeChanges, removal.performedAt)
      .findLast(({ performedAt, data }) => performedAt > removal.performedAt && data.difficulty !== 'failed')
    if (!back) return []
    const after = since(removal.performedAt, back.performedAt)
    return [{ removal, back, after, isFailure: isFailure(after, values) }]
  })
}

function isFailure(after: Duration, values: Values): boolean {
  return after <= hours(values.of(failedRemovalWindow))
}

/** Of a tube that goes in now: that a removal has failed by it. */
export function tubeBackNow({ record, values, now }: CareContext): readonly Warning[] {
  const removal = record.latest(decannulations)
  if (!removal || record.since(tubeChanges, removal.performedAt).some(isIn(removal))) return []
  const after = since(removal.performedAt, now)
  return after > 0 && isFailure(after, values) ? [failed(after, values)] : []
}

const isIn = (removal: Entry) => (tube: Entry<{ readonly difficulty: string }>) =>
  tube.performedAt > removal.performedAt && tube.data.difficulty !== 'failed'

/** The same from what is charted, for as long again as the window. */
export function standingTubeBack({ record, values, now }: CareContext): readonly Warning[] {
  const [last] = tubesBack(record, values)
  if (!last?.isFailure || now > later(last.back.performedAt, hours(values.of(failedRemovalWindow)))) return []
  return [failed(last.after, values)]
}

function failed(after: Duration, values: Values): Warning {
  return {
    name: 'removal-failed',
    level: 'amber',
    action: 'Tell the tracheostomy team now, look for the cause, and report it as your hospital asks.',
    cause: `A tube went back in ${showDuration(after)} after it was taken out for good: within ${values.of(failedRemovalWindow)} hours that counts as a failed removal.`,
    source: failedRemovalWindow.source.says,
  }
}
