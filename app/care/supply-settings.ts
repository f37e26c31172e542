import { numberSetting } from './policy.ts'

const ARITHMETIC = 'The arithmetic is that of home supply lists'

export const supplyWastage = numberSetting({
  name: 'supply-wastage',
  label: 'Added to every need for what is dropped or opened in vain',
  unit: '%',
  default: 20,
  min: 0,
  max: 100,
  affects: 'Supplies: need over a horizon, reorder point.',
  source: { says: `${ARITHMETIC}; no published share`, standing: 'product proposal' },
})

export const supplyLeadDays = numberSetting({
  name: 'supply-lead-days',
  label: 'Days from an order to its arrival',
  unit: 'days',
  default: 3,
  min: 0,
  max: 60,
  affects: 'Supplies: reorder point.',
  source: { says: `${ARITHMETIC}; the days are those of the own store`, standing: 'product proposal' },
})

export const supplySafetyDays = numberSetting({
  name: 'supply-safety-days',
  label: 'Days that the stock still lasts when an order arrives',
  unit: 'days',
  default: 7,
  min: 0,
  max: 60,
  affects: 'Supplies: reorder point.',
  source: { says: `${ARITHMETIC}; a week in hand, no published number`, standing: 'product proposal' },
})

export const supplyHorizon = numberSetting({
  name: 'supply-horizon',
  label: 'Days that an order is made for',
  unit: 'days',
  default: 28,
  min: 1,
  max: 90,
  affects: 'Supplies: need over the horizon, order list.',
  source: { says: `${ARITHMETIC}, by the month; 28 days is a proposal`, standing: 'product proposal' },
})

export const supplyRateDays = numberSetting({
  name: 'supply-rate-days',
  label: 'Use is counted over the last',
  unit: 'days',
  default: 14,
  min: 3,
  max: 60,
  affects: 'Supplies: use a day of each patient, days left.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const supplyLeastDays = numberSetting({
  name: 'supply-least-days',
  label: 'Use is taken from the interval in force until there are',
  unit: 'days',
  default: 3,
  min: 1,
  max: 14,
  affects: 'Supplies: with fewer days of data the planned use stands in for the counted one.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const supplySettings = [
  supplyWastage,
  supplyLeadDays,
  supplySafetyDays,
  supplyHorizon,
  supplyRateDays,
  supplyLeastDays,
]
