import { hasFallen, isBelowTarget } from '../../clinical/observations.ts'
import { BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { isFarBelow, targetWords } from '../suction/saturation.ts'
import type { Warning } from '../warning.ts'
import { type ObservationData, observationSets } from './schema.ts'
import { spo2FallBy, spo2LowScale2 } from './settings.ts'

/** SpO2 against the prescribed target and the set before: far below is red; below target, or fallen within it, amber. */
export function saturationWarnings({ spo2 }: ObservationData, context: CareContext): readonly Warning[] {
  const { patient } = context.record
  if (isFarBelow(spo2, context) || isLowOnScale2(spo2, context)) {
    return [
      {
        name: 'observations-spo2-far-below',
        level: 'red',
        action: breathingAction(patient),
        cause: `SpO2 ${spo2}%${targetWords(context)}.`,
        source: BREATHING_SOURCE,
      },
    ]
  }
  if (patient.spo2Low !== null && isBelowTarget(spo2, patient.spo2Low)) {
    return [amber('observations-spo2-below-target', `SpO2 ${spo2}%${targetWords(context)}.`)]
  }
  return fallen(spo2, context)
}

/** A target up to 92% is that of somebody at risk of keeping carbon dioxide, for whom NEWS2 has a scale of its own. */
function isLowOnScale2(spo2: number, { record: { patient }, values }: CareContext): boolean {
  return patient.spo2High !== null && patient.spo2High <= SCALE_2_UP_TO && spo2 <= values.of(spo2LowScale2)
}

const SCALE_2_UP_TO = 92 // %, NEWS2 SpO2 scale 2: target 88 to 92

function fallen(spo2: number, { record, values, now }: CareContext): readonly Warning[] {
  const before = record.latest(observationSets, (_, entry) => entry.performedAt < now)?.data.spo2
  if (before === undefined || !hasFallen(before, spo2, values.of(spo2FallBy))) return []
  return [amber('observations-spo2-fallen', `SpO2 fell from ${before}% to ${spo2}% since the set before.`)]
}

function amber(name: string, cause: string): Warning {
  return {
    name,
    level: 'amber',
    action:
      'Look at the patient now: check tube, inner cannula and oxygen, and suction if it is needed. Measure again.',
    cause,
    source: spo2FallBy.source.says,
  }
}
