import { BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import type { Warning } from '../warning.ts'
import { actsOnTube } from './acts.ts'
import { isFarBelow, lowSaturation, targetWords } from './saturation.ts'
import type { SuctionData } from './schema.ts'

/** A catheter that would not pass: the tube may be blocked or out of place. */
export function willNotPass(data: SuctionData, { record }: CareContext): readonly Warning[] {
  return data.passed === 'no'
    ? [red('suction-will-not-pass', 'The suction catheter would not pass.', record.patient)]
    : []
}

/** Distress, or SpO2 that settled too low; or that fell far, with nothing charted of where it settled. */
export function notWell(data: SuctionData, context: CareContext): readonly Warning[] {
  const { patient } = context.record
  return [
    ...(data.tolerance === 'distress' ? [red('suction-distress', 'Distress at suction.', patient)] : []),
    ...(isUnrecovered(data, context)
      ? [red('suction-spo2-not-recovering', `SpO2 ${data.spo2After}% after suction${targetWords(context)}.`, patient)]
      : []),
    ...lowSaturation('suction-spo2-low', data, context),
  ]
}

function isUnrecovered({ spo2After }: SuctionData, context: CareContext): boolean {
  return spo2After !== undefined && isFarBelow(spo2After, context)
}

function red(name: string, cause: string, patient: CareContext['record']['patient']): Warning {
  return { name, level: 'red', action: breathingAction(patient), cause, source: BREATHING_SOURCE }
}

/** Secretions that look like feed, or that are newly green or thick. */
export function changedSecretions(data: SuctionData, { record, now }: CareContext): readonly Warning[] {
  if (data.colour === 'feed') {
    return [
      {
        name: 'suction-feed',
        level: 'amber',
        action: 'Ask a doctor and the speech-language therapist to see the patient this shift.',
        cause: 'Secretions look like feed: food may be reaching the airway.',
        source: 'Common practice: aspiration or a fistula',
      },
    ]
  }
  const before = actsOnTube(record).find(entry => entry.performedAt < now && entry.data.colour !== undefined)?.data
  const isNew = isInfected(data) && !(before && isInfected(before))
  if (!isNew) return []
  return [
    {
      name: 'suction-secretions-changed',
      level: 'amber',
      action: 'Ask a doctor to see the patient this shift. Review humidity.',
      cause: `Secretions are ${[data.colour === 'green' ? 'green' : '', isThick(data) ? `${data.consistency}` : ''].filter(Boolean).join(' and ')}${before ? ', which is new' : ''}.`,
      source: 'Airway Care Score, Critical Care 2008; common practice',
    },
  ]
}

function isInfected(data: SuctionData): boolean {
  return data.colour === 'green' || isThick(data)
}

function isThick({ consistency }: SuctionData): boolean {
  return consistency === 'thick' || consistency === 'tenacious'
}
