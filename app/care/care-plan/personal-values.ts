import type { Entry, PatientRecord } from '../kind.ts'
import type { PersonalValue } from '../policy.ts'
import { type CarePlanData, carePlans } from './schema.ts'

/** The own values in force for a patient: the latest step for each setting, unless that went back to ward policy. */
export function personalValues(record: PatientRecord): readonly PersonalValue[] {
  const latest = new Map<string, Entry<CarePlanData>>()
  for (const entry of record.of(carePlans)) {
    if (!latest.has(entry.data.setting)) latest.set(entry.data.setting, entry)
  }
  return [...latest.values()].flatMap(personalValue)
}

function personalValue({ data, performedAt, recordedByName }: Entry<CarePlanData>): readonly PersonalValue[] {
  const { step, setting, value, reason, reviewOn } = data
  if (step === 'back to ward policy' || value === undefined || reviewOn === undefined) return []
  return [{ setting, value, reason, reviewOn, since: performedAt, by: recordedByName }]
}
