import { decannulations } from './decannulation/schema.ts'
import type { CareContext } from './kind.ts'
import { tubeChanges } from './tube-change/schema.ts'
import type { TubeEntry } from './tube-change/tube.ts'

/**
 * When care of a tube began in this stay: admission, or the first tube since the last removal for good. A change of tube does not
 * begin it anew: care that is not about the tube itself goes on through it.
 */
export function tubeCareFrom({ record }: Pick<CareContext, 'record'>): Date {
  const { admittedAt } = record
  const removal = record.latest(decannulations)?.performedAt
  const first = record
    .of(tubeChanges)
    .filter(tube => tube.data.difficulty !== 'failed' && (removal === undefined || tube.performedAt > removal))
    .at(-1)
  if (!first || first.data.reason === 'on arrival' || first.performedAt < admittedAt) return admittedAt
  return first.performedAt
}

/** When care of the tube in place began: it went in, or the patient came with it. */
export function careOfTubeFrom(tube: TubeEntry, { record }: Pick<CareContext, 'record'>): Date {
  return new Date(Math.max(tube.performedAt.getTime(), record.admittedAt.getTime()))
}
