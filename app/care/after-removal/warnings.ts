import { hours, later } from '../../time/duration.ts'
import { afterRemovalWatch } from '../decannulation/settings.ts'
import { BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { rateHigh, rateLow } from '../observations/settings.ts'
import { standsSince } from '../standing.ts'
import { isFarBelow, targetWords } from '../suction/saturation.ts'
import { tubeOutSince } from '../tube-change/tube-absence.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { type AfterRemovalData, afterRemovals } from './schema.ts'
import { monitoredFor } from './settings.ts'

/** What a set after removal asks people to notice: breathing first, then what does not lie ready. */
export function afterRemovalWarnings(data: AfterRemovalData, context: CareContext): readonly Warning[] {
  return [
    ...emergency(data, context),
    ...review(data, context),
    ...notReady(data, context),
    ...notMonitored(data, context),
    ...wetVoice(data),
  ]
}

function emergency(data: AfterRemovalData, context: CareContext): readonly Warning[] {
  const { patient } = context.record
  const seen = [
    ...(data.stridor === 'yes' ? ['stridor'] : []),
    ...(data.effort === 'distress' ? ['breathing in distress'] : data.effort === 'none' ? ['no breathing'] : []),
    ...(isFarBelow(data.spo2, context) ? [`SpO2 ${data.spo2}%${targetWords(context)}`] : []),
  ]
  if (seen.length === 0) return []
  const words = seen.join(', ')
  return [
    {
      name: 'after-removal-breathing',
      level: 'red',
      action:
        patient.upperAirway === 'not open'
          ? breathingAction(patient)
          : `Call for help now. Give oxygen to the face and the opening. Bring the spare tube and dilators. ${LOCAL_PLAN}`,
      cause: `${words.charAt(0).toUpperCase()}${words.slice(1)} after the tube was taken out.`,
      source: BREATHING_SOURCE,
    },
  ]
}

function review(data: AfterRemovalData, context: CareContext): readonly Warning[] {
  const { respiratoryRate: rate, spo2, effort } = data
  const { record, values } = context
  const { spo2Low } = record.patient
  const found = [
    ...(effort !== 'none' && (rate <= values.of(rateLow) || rate >= values.of(rateHigh))
      ? [`respiratory rate ${rate} a min`]
      : []),
    ...(effort === 'increased' ? ['breathing harder than usual'] : []),
    ...(spo2Low !== null && spo2 < spo2Low && !isFarBelow(spo2, context)
      ? [`SpO2 ${spo2}%${targetWords(context)}`]
      : []),
  ]
  if (found.length === 0) return []
  const words = found.join(', ')
  return [
    {
      name: 'after-removal-review',
      level: 'amber',
      action: 'Stay with the patient, ask a doctor to come now, and measure again within 15 minutes.',
      cause: `${words.charAt(0).toUpperCase()}${words.slice(1)} after the tube was taken out.`,
      source: 'NEWS2, Royal College of Physicians; BTS oxygen guideline 2017; failure within 48 hours, Stelfox 2008',
    },
  ]
}

function notReady({ spareThere }: AfterRemovalData, context: CareContext): readonly Warning[] {
  if (spareThere === 'yes' || !isWithin(context.values.of(afterRemovalWatch), context)) return []
  return [
    {
      name: 'after-removal-no-spare',
      level: 'amber',
      action: 'Get the spare tubes and dilators now. Stay nearby until they arrive.',
      cause: `They stay at the bedside for ${context.values.of(afterRemovalWatch)} hours after removal.`,
      source: afterRemovalWatch.source.says,
    },
  ]
}

function notMonitored({ monitored }: AfterRemovalData, context: CareContext): readonly Warning[] {
  if (monitored === 'yes' || !isWithin(context.values.of(monitoredFor), context)) return []
  return [
    {
      name: 'after-removal-not-monitored',
      level: 'amber',
      action: 'Connect the SpO2 monitor now, with its alarms on.',
      cause: `SpO2 is watched without a break for ${context.values.of(monitoredFor)} hours after removal.`,
      source: monitoredFor.source.says,
    },
  ]
}

/** Within so many hours of the removal; the set itself may be the first sign of one. */
function isWithin(count: number, { record, now }: CareContext): boolean {
  const out = tubeOutSince(record)
  return out !== undefined && now <= later(out, hours(count))
}

function wetVoice({ voice }: AfterRemovalData): readonly Warning[] {
  if (voice !== 'wet' && voice !== 'none') return []
  return [
    {
      name: 'after-removal-voice',
      level: 'amber',
      action: 'Ask the speech-language therapist or a doctor to see the patient this shift.',
      cause:
        voice === 'wet' ? 'The voice is wet: secretions lie on the larynx.' : 'No voice: the airway may be narrow.',
      source: 'Product proposal',
    },
  ]
}

/** Of the latest set, until the next one; nothing once a tube is in again. */
export function standingAfterRemoval(context: CareContext): readonly Warning[] {
  const out = tubeOutSince(context.record)
  if (!out) return []
  const sets = context.record.since(afterRemovals, out)
  return standsSince(sets, { isSettledBy: () => true, warns: afterRemovalWarnings }, context)
}
