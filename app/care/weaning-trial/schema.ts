import type { z } from 'zod'
import { spo2Range } from '../../clinical/observations.ts'
import { careFields, choice, choices, note, quantity, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

export const trialNames = { cuff: 'Cuff deflation', valve: 'One-way valve', cap: 'Cap' } as const
export type TrialName = keyof typeof trialNames

export const trialSteps = { start: 'Start', found: 'Found running', end: 'Stop' } as const

export const cuffLooks = { down: 'Fully down', up: 'Up', none: 'No cuff', foam: 'Foam cuff' } as const

/** Why a trial stopped: as planned, at the wish of the patient, or for a sign that it was not borne. */
export const stopReasons = {
  planned: 'As planned',
  rate: 'Respiratory rate',
  saturation: 'SpO2',
  'heart rate': 'Heart rate',
  distress: 'Distress',
  'wet voice': 'Wet voice or signs of aspiration',
  stridor: 'Stridor',
  'no voice': 'No voice, or air caught behind the valve',
  tired: 'Tired',
  asked: 'Patient asked',
  other: 'Other, see note',
} as const
export type StopReason = keyof typeof stopReasons

const start = { when: { field: 'step', is: ['start'] } }
const end = { when: { field: 'step', is: ['end'] } }

/** One step of a trial: it starts, is found running, or stops. What is between is observations. */
export const weaningTrialSchema = careFields({
  step: choice({ label: 'Step', options: trialSteps }),
  trial: choice({ label: 'Trial', options: trialNames }),
  cuffNow: choice({ label: 'Cuff now', hint: 'At a stop: as it is left', options: cuffLooks }),
  airflow: choice({
    label: 'Airflow past the tube',
    hint: 'Finger on the tube for one breath, cuff down',
    options: { yes: 'Felt', no: 'Not felt', 'not checked': 'Not checked' },
    ...start,
    neededThen: true,
  }).optional(),
  suctionFirst: choice({
    label: 'Suction of mouth and above the cuff first',
    options: yesNo,
    ...start,
    neededThen: true,
  }).optional(),
  supervised: choice({
    label: 'Somebody skilled stays with the patient',
    options: yesNo,
    ...start,
    neededThen: true,
  }).optional(),
  respiratoryRate: quantity({
    label: 'Respiratory rate before',
    section: 'Before the trial: its stop limits are counted from here',
    unit: 'a min',
    min: 4,
    max: 70,
    ...start,
    neededThen: true,
  }).optional(),
  spo2: quantity({ label: 'SpO2 before', unit: '%', ...spo2Range, ...start, neededThen: true }).optional(),
  heartRate: quantity({
    label: 'Heart rate before',
    unit: 'a min',
    min: 20,
    max: 250,
    ...start,
    neededThen: true,
  }).optional(),
  reasons: choices({ label: 'Reasons to stop', options: stopReasons, ...end, neededThen: true }).optional(),
  afterwards: choice({
    label: 'Breathing afterwards',
    options: { settled: 'Settled', 'not settled': 'Not settled' },
    ...end,
    neededThen: true,
  }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Steps of weaning trials: ask a record with this, or `trialsOf` for whole trials. */
export const weaningTrials = charted({ slug: 'weaning-trial', schema: weaningTrialSchema })

export type WeaningTrialData = z.output<typeof weaningTrialSchema>
