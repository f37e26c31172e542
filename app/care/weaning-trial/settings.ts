import { numberSetting } from '../policy.ts'

const STGEORGES = "St George's NHS, decannulation"
const STOPS = 'No published number agreed on; stop limits are counted from the values before the trial'

export const cuffTrialTarget = numberSetting({
  name: 'trial-target-cuff',
  label: 'A cuff deflation trial is passed after',
  unit: 'h',
  default: 24,
  min: 1,
  max: 72,
  personal: true,
  affects: 'Weaning trials: when a cuff deflation trial counts as passed.',
  source: { says: `${STGEORGES}: 24 hours`, standing: 'published' },
})

export const valveTrialTarget = numberSetting({
  name: 'trial-target-valve',
  label: 'A one-way valve trial is passed after',
  unit: 'h',
  default: 12,
  min: 0.5,
  max: 24,
  personal: true,
  affects: 'Weaning trials: when a one-way valve trial counts as passed.',
  source: {
    says: `${STGEORGES}: 12 hours by day; 4 hours at a stretch in a training text, 30 minutes for a first success in a trial registration`,
    standing: 'published',
  },
})

export const capTrialTarget = numberSetting({
  name: 'trial-target-cap',
  label: 'A cap trial is passed after',
  unit: 'h',
  default: 24,
  min: 4,
  max: 48,
  personal: true,
  affects: 'Weaning trials: when a cap trial counts as passed, and whether removal may be planned.',
  source: {
    says: `Hernandez, NEJM 2020: 24 hours; Royal Marsden Manual: 12 to 24; ${STGEORGES}: 4`,
    standing: 'published',
  },
})

export const trialObservationEarly = numberSetting({
  name: 'trial-observations-early',
  label: 'Observations at the beginning of a trial every',
  unit: 'min',
  default: 15,
  min: 5,
  max: 60,
  affects: 'Observations: when the next set is due while a trial has just begun.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const trialEarlyPeriod = numberSetting({
  name: 'trial-early-period',
  label: 'The beginning of a trial lasts',
  unit: 'min',
  default: 60,
  min: 15,
  max: 240,
  affects: 'Observations: how long they are due more often in a trial.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const trialObservationInterval = numberSetting({
  name: 'trial-observations-interval',
  label: 'Observations later in a trial every',
  unit: 'min',
  default: 60,
  min: 15,
  max: 240,
  affects: 'Observations: when the next set is due while a trial runs.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const stopRateAbove = numberSetting({
  name: 'trial-stop-respiratory-rate',
  label: 'A trial stops at a respiratory rate above',
  unit: 'a min',
  default: 30,
  min: 20,
  max: 40,
  personal: true,
  affects: 'Weaning trials: the warning to stop.',
  source: { says: STOPS, standing: 'product proposal' },
})

export const stopRateRise = numberSetting({
  name: 'trial-stop-respiratory-rate-rise',
  label: 'A trial stops when the respiratory rate has risen by',
  unit: '%',
  default: 50,
  min: 20,
  max: 100,
  affects: 'Weaning trials: the warning to stop.',
  source: { says: STOPS, standing: 'product proposal' },
})

export const stopSpo2Fall = numberSetting({
  name: 'trial-stop-spo2-fall',
  label: 'A trial stops when SpO2 has fallen by',
  unit: '%',
  default: 3,
  min: 2,
  max: 6,
  affects: 'Weaning trials: the warning to stop, besides SpO2 below the prescribed target.',
  source: { says: 'BTS oxygen guideline 2017: assess when SpO2 falls by 3% or more', standing: 'published' },
})

export const stopHeartRise = numberSetting({
  name: 'trial-stop-heart-rate-rise',
  label: 'A trial stops when the heart rate has risen by',
  unit: '%',
  default: 20,
  min: 10,
  max: 50,
  affects: 'Weaning trials: the warning to stop.',
  source: { says: STOPS, standing: 'product proposal' },
})

export const weaningTrialSettings = [
  cuffTrialTarget,
  valveTrialTarget,
  capTrialTarget,
  trialObservationEarly,
  trialEarlyPeriod,
  trialObservationInterval,
  stopRateAbove,
  stopRateRise,
  stopSpo2Fall,
  stopHeartRise,
]
