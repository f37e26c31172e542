import type { WeaningTrialData } from './schema.ts'

/** A valve trial begun as it should be: the case that other examples vary. */
export const valveStart: WeaningTrialData = {
  step: 'start',
  trial: 'valve',
  cuffNow: 'down',
  airflow: 'yes',
  suctionFirst: 'yes',
  supervised: 'yes',
  respiratoryRate: 18,
  spo2: 97,
  heartRate: 80,
}

/** The same trial stopped as planned. */
export const valveEnd: WeaningTrialData = {
  step: 'end',
  trial: 'valve',
  cuffNow: 'down',
  reasons: ['planned'],
  afterwards: 'settled',
}

export const weaningTrialExamples: readonly WeaningTrialData[] = [
  valveStart,
  valveEnd,
  { ...valveStart, trial: 'cuff' },
  { ...valveStart, trial: 'cap', cuffNow: 'none', note: 'Small uncuffed tube' },
  { step: 'end', trial: 'cap', cuffNow: 'none', reasons: ['stridor', 'saturation'], afterwards: 'settled' },
  { step: 'end', trial: 'cuff', cuffNow: 'up', reasons: ['wet voice'], afterwards: 'settled' },
  { step: 'found', trial: 'valve', cuffNow: 'up', note: 'Taken off at once' },
]
