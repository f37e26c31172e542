import { numberSetting } from '../policy.ts'

export const waterCuffDifference = numberSetting({
  name: 'water-cuff-difference',
  label: 'Water removed from a cuff differs from the water put in by more than',
  unit: 'mL',
  default: 1,
  min: 0.2,
  max: 3,
  affects: 'Water cuff: warning that the cuff may leak or was overfilled.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const waterCuffSettings = [waterCuffDifference]
