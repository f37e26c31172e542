import type { Entry, PatientRecord } from '../kind.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { suctions } from '../suction/schema.ts'
import type { AdverseEventData } from './schema.ts'

/** Whether a bleed was left as not settled, and no later look found no blood. */
export function isStillBleeding({ data, performedAt: at }: Entry<AdverseEventData>, record: PatientRecord): boolean {
  return data.outcome === 'not settled' && !hasStopped(at, record)
}

function hasStopped(at: Date, record: PatientRecord): boolean {
  return (
    record.since(suctions, at).some(({ data, performedAt }) => performedAt > at && data.blood === 'none') ||
    record.since(stomaChecks, at).some(({ data, performedAt }) => performedAt > at && data.bleeding === 'none')
  )
}
