import { numberSetting } from '../policy.ts'
import { spo2Fall, spo2Floor } from '../suction/settings.ts'
import {
  heartHighForChildren,
  heartLowForChildren,
  rateHighForChildren,
  rateLowForChildren,
  systolicHighForChildren,
  systolicLowForChildren,
} from './for-children.ts'

const NEWS2 = 'NEWS2, Royal College of Physicians: scores 3 alone'

export const observationInterval = numberSetting({
  name: 'observations-interval',
  label: 'Observations every',
  unit: 'h',
  default: 4,
  min: 1,
  max: 12,
  personal: true,
  affects: 'Observations: when the next set is due.',
  source: {
    says: 'By the early-warning policy of the hospital; every 4 hours where it is silent',
    standing: 'from memory',
  },
})

export const spo2FallBy = numberSetting({
  name: 'observations-spo2-fall',
  label: 'A fall of SpO2 since the set before asks for a look at the patient from',
  unit: '%',
  default: 3,
  min: 2,
  max: 6,
  affects: 'Observations: amber warning, even within the prescribed target.',
  source: { says: 'BTS oxygen guideline 2017: assess when SpO2 falls by 3% or more', standing: 'published' },
})

export const rateLow = numberSetting({
  name: 'observations-respiratory-rate-low',
  label: 'Respiratory rate is an extreme at or below',
  unit: 'a min',
  default: 8,
  min: 6,
  max: 12,
  children: rateLowForChildren,
  affects: 'Observations: amber warning, urgent review.',
  source: { says: `${NEWS2}: 8 or less`, standing: 'published' },
})

export const rateHigh = numberSetting({
  name: 'observations-respiratory-rate-high',
  label: 'Respiratory rate is an extreme at or above',
  unit: 'a min',
  default: 25,
  min: 20,
  max: 40,
  personal: true,
  children: rateHighForChildren,
  affects: 'Observations: amber warning, urgent review.',
  source: { says: `${NEWS2}: 25 or more`, standing: 'published' },
})

export const heartLow = numberSetting({
  name: 'observations-heart-rate-low',
  label: 'Heart rate is an extreme at or below',
  unit: 'a min',
  default: 40,
  min: 30,
  max: 60,
  personal: true,
  children: heartLowForChildren,
  affects: 'Observations: amber warning, urgent review.',
  source: { says: `${NEWS2}: 40 or less`, standing: 'published' },
})

export const heartHigh = numberSetting({
  name: 'observations-heart-rate-high',
  label: 'Heart rate is an extreme at or above',
  unit: 'a min',
  default: 131,
  min: 100,
  max: 160,
  personal: true,
  children: heartHighForChildren,
  affects: 'Observations: amber warning, urgent review.',
  source: { says: `${NEWS2}: 131 or more`, standing: 'published' },
})

export const systolicLow = numberSetting({
  name: 'observations-systolic-low',
  label: 'Systolic blood pressure is an extreme at or below',
  unit: 'mmHg',
  default: 90,
  min: 70,
  max: 110,
  personal: true,
  children: systolicLowForChildren,
  affects: 'Observations: amber warning, urgent review.',
  source: { says: `${NEWS2}: 90 or less`, standing: 'published' },
})

export const systolicHigh = numberSetting({
  name: 'observations-systolic-high',
  label: 'Systolic blood pressure is an extreme at or above',
  unit: 'mmHg',
  default: 220,
  min: 180,
  max: 240,
  children: systolicHighForChildren,
  affects: 'Observations: amber warning, urgent review.',
  source: { says: `${NEWS2}: 220 or more`, standing: 'published' },
})

export const spo2LowScale2 = numberSetting({
  name: 'observations-spo2-low-scale-2',
  label: 'SpO2 is an emergency, with a target of 88 to 92%, at or below',
  unit: '%',
  default: 83,
  min: 80,
  max: 87,
  affects:
    'Observations: red warning of those at risk of keeping carbon dioxide, besides the distance from their target.',
  source: { says: 'NEWS2, SpO2 scale 2: 83% or less scores 3', standing: 'published' },
})

export const observationSettings = [
  observationInterval,
  spo2FallBy,
  rateLow,
  rateHigh,
  heartLow,
  heartHigh,
  systolicLow,
  systolicHigh,
  spo2LowScale2,
  spo2Fall,
  spo2Floor,
]
