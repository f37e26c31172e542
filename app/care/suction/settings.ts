import { listSetting, numberSetting, switchSetting } from '../policy.ts'
import { bleedingSettings } from './bleeding-settings.ts'
import {
  catheterShareForChildren,
  vacuumLowForChildren,
  vacuumVeryHighForChildren,
  vacuumWarnForChildren,
} from './for-children.ts'

const AARC = 'AARC clinical practice guideline on suctioning, 2022'
const ACI = 'NSW Agency for Clinical Innovation, suctioning an adult, 2014'

export const needInterval = numberSetting({
  name: 'suction-need-interval',
  label: 'Need for suction looked at every',
  unit: 'h',
  default: 4,
  min: 1,
  max: 8,
  personal: true,
  affects: 'Suction need: when the next look is due. Suction itself is done as needed, never by the clock.',
  source: { says: `${AARC}: as needed, assessed regularly; the hours are a proposal`, standing: 'product proposal' },
})

export const copiousInterval = numberSetting({
  name: 'suction-need-interval-copious',
  label: 'Need for suction looked at after copious secretions every',
  unit: 'h',
  default: 2,
  min: 1,
  max: 8,
  affects: 'Suction need: when the next look is due after copious secretions.',
  source: {
    says: 'Airway Care Score, Critical Care 2008: every 1 to 2 hours at grade 2; the hours are a proposal',
    standing: 'product proposal',
  },
})

export const catheterShare = numberSetting({
  name: 'suction-catheter-share',
  label: 'A suction catheter takes at most this share of the inside diameter',
  unit: '%',
  default: 50,
  min: 40,
  max: 70,
  children: catheterShareForChildren,
  affects: 'Suction: largest catheter for the tube.',
  source: {
    says: `${ACI}: less than half; Vanner and Bick 2008: half keeps the pressure in the windpipe near that of the air`,
    standing: 'published',
  },
})

export const strictShare = switchSetting({
  name: 'suction-catheter-strictly-below',
  label: 'The catheter must stay below that share, not reach it',
  unit: 'on or off',
  default: false,
  affects: 'Suction: largest catheter for the tube. On, an 8 mm tube takes 10 Fr; off, 12 Fr.',
  source: { says: 'AARC 2010 prints less than 50%, NTSP no greater than half', standing: 'published' },
})

export const stockedSizes = listSetting({
  name: 'suction-catheter-sizes',
  label: 'Suction catheters in stock',
  unit: 'Fr',
  default: [5, 6, 8, 10, 12, 14, 16, 18],
  affects: 'Suction: largest catheter for the tube, rounded down to a size in stock.',
  source: { says: 'Sizes in common use', standing: 'common practice' },
})

export const vacuumLow = numberSetting({
  name: 'suction-vacuum-low',
  label: 'Suction vacuum, usual lower end',
  unit: 'mmHg',
  default: 80,
  min: 50,
  max: 120,
  children: vacuumLowForChildren,
  affects: 'Suction: the range named in the warning.',
  source: { says: `${ACI}: 80 to 150 mmHg`, standing: 'published' },
})

export const vacuumWarn = numberSetting({
  name: 'suction-vacuum-warn',
  label: 'Suction vacuum counts as high above',
  unit: 'mmHg',
  default: 150,
  min: 80,
  max: 200,
  personal: true,
  children: vacuumWarnForChildren,
  affects: 'Suction: amber warning.',
  source: { says: `${ACI}: 80 to 150 mmHg (20 kPa)`, standing: 'published' },
})

export const vacuumVeryHigh = numberSetting({
  name: 'suction-vacuum-very-high',
  label: 'Suction vacuum counts as very high above',
  unit: 'mmHg',
  default: 200,
  min: 150,
  max: 300,
  children: vacuumVeryHighForChildren,
  affects: 'Suction: amber warning that asks to read the gauge again.',
  source: { says: `${AARC}: below 200 mmHg, as low as effective`, standing: 'published' },
})

export const vacuumUnitDoubt = numberSetting({
  name: 'suction-vacuum-unit-doubt',
  label: 'A vacuum below this in mmHg, or above it in kPa, is taken for the other unit',
  unit: 'mmHg or kPa',
  default: 40,
  min: 27,
  max: 60,
  affects: 'Suction: warning to read the unit again.',
  source: {
    says: 'Lowest published vacuum 60 mmHg, highest 27 kPa (200 mmHg); the number lies between',
    standing: 'product proposal',
  },
})

export const passWarn = numberSetting({
  name: 'suction-pass-warn',
  label: 'One pass of the catheter is long above',
  unit: 's',
  default: 10,
  min: 5,
  max: 15,
  affects: 'Suction: note to keep passes short.',
  source: { says: 'UK practice: at most 10 seconds', standing: 'from memory' },
})

export const passLimit = numberSetting({
  name: 'suction-pass-limit',
  label: 'One pass of the catheter is too long above',
  unit: 's',
  default: 15,
  min: 10,
  max: 30,
  affects: 'Suction: amber warning.',
  source: { says: `${AARC}: at most 15 seconds`, standing: 'published' },
})

export const mostPasses = numberSetting({
  name: 'suction-most-passes',
  label: 'Passes in one episode, at most',
  unit: 'passes',
  default: 3,
  min: 1,
  max: 6,
  affects: 'Suction: note after more passes.',
  source: { says: 'Common teaching: at most 3', standing: 'from memory' },
})

export const spo2Fall = numberSetting({
  name: 'suction-spo2-below-target',
  label: 'SpO2 that stays below the prescribed target by this much is an emergency',
  unit: '%',
  default: 3,
  min: 1,
  max: 6,
  affects: 'Suction: red warning when SpO2 does not recover.',
  source: { says: 'BTS oxygen guideline 2017: a fall of 3% or more asks for assessment', standing: 'published' },
})

export const spo2Floor = numberSetting({
  name: 'suction-spo2-without-target',
  label: 'SpO2 that stays at or below this is an emergency when no target is prescribed',
  unit: '%',
  default: 91,
  min: 83,
  max: 94,
  affects: 'Suction: red warning when SpO2 does not recover.',
  source: { says: 'NEWS2, SpO2 scale 1: 91% or less scores 3', standing: 'published' },
})

export const suctionSettings = [
  needInterval,
  copiousInterval,
  catheterShare,
  strictShare,
  stockedSizes,
  vacuumLow,
  vacuumWarn,
  vacuumVeryHigh,
  vacuumUnitDoubt,
  passWarn,
  passLimit,
  mostPasses,
  spo2Fall,
  spo2Floor,
  ...bleedingSettings,
]
