import type { Entry, PatientRecord } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { isThroughTube, type SuctionData, suctions } from './schema.ts'

export type SuctionEntry = Entry<SuctionData>

/** Looks and episodes with the tube in place, latest first; none after a tube was taken out for good. */
export function actsOnTube(record: PatientRecord): readonly SuctionEntry[] {
  const tube = tubeInPlace(record)
  return tube ? record.since(suctions, tube.performedAt) : []
}

/**
 * Whether the need of the tube was looked at and met: a look alone, or a catheter through the tube that passed.
 * Mouth and port above the cuff say nothing of the tube.
 */
export function meetsNeed(data: SuctionData): boolean {
  return data.act === 'need only' || (isThroughTube(data) && data.passed !== 'no')
}
