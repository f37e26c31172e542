import { numberSetting } from '../policy.ts'

const GLASGOW = 'NHS Greater Glasgow and Clyde, management of the tracheostomy cuff'

export const cuffUpper = numberSetting({
  name: 'cuff-pressure-upper-limit',
  notBelow: 'cuff-pressure-lower-limit',
  label: 'Cuff pressure, upper limit',
  unit: 'cmH2O',
  default: 30,
  min: 20,
  max: 35,
  personal: true,
  affects: 'Cuff pressure: band, warnings and when a check counts as done.',
  source: {
    says: 'Seegobin and van Hasselt, BMJ 1984: 30 cmH2O should not be exceeded; UK practice often 25',
    standing: 'published',
  },
})

export const cuffLower = numberSetting({
  name: 'cuff-pressure-lower-limit',
  notAbove: 'cuff-pressure-upper-limit',
  label: 'Cuff pressure, lower limit',
  unit: 'cmH2O',
  default: 20,
  min: 15,
  max: 25,
  personal: true,
  affects: 'Cuff pressure: band, warnings and when a check counts as done.',
  source: { says: 'Lizy 2014 and common practice: 20 to 30 cmH2O', standing: 'published' },
})

export const cuffVeryLow = numberSetting({
  name: 'cuff-pressure-very-low',
  label: 'Cuff pressure counts as very low below',
  unit: 'cmH2O',
  default: 15,
  min: 5,
  max: 20,
  affects: 'Cuff pressure: level of the warning.',
  source: { says: `Lowest published lower limit (${GLASGOW})`, standing: 'product proposal' },
})

export const cuffVeryHigh = numberSetting({
  name: 'cuff-pressure-very-high',
  label: 'Cuff pressure counts as very high above',
  unit: 'cmH2O',
  default: 40,
  min: 30,
  max: 60,
  affects: 'Cuff pressure: level of the warning.',
  source: { says: 'Flow in the mucosa stops near 50 cmH2O', standing: 'product proposal' },
})

export const cuffInterval = numberSetting({
  name: 'cuff-pressure-interval',
  label: 'Cuff pressure check every',
  unit: 'h',
  default: 8,
  min: 4,
  max: 12,
  personal: true,
  affects: 'Cuff pressure: when the next check is due.',
  source: { says: 'One trial: every 8 hours no worse than every 4 hours', standing: 'published' },
})

export const cuffEventCheck = numberSetting({
  name: 'cuff-pressure-event-check',
  label: 'Cuff pressure check after inflation, tube change, arrival, turn or transfer within',
  unit: 'min',
  default: 15,
  min: 5,
  max: 60,
  affects: 'Cuff pressure: check after an event.',
  source: {
    says: 'Lizy 2014: 40.6% of readings above 30 cmH2O after a change of position; the minutes are a proposal',
    standing: 'product proposal',
  },
})

export const cuffRecheck = numberSetting({
  name: 'cuff-pressure-recheck',
  label: 'Cuff pressure recheck after one left out of the band, within',
  unit: 'min',
  default: 30,
  min: 10,
  max: 120,
  affects: 'Cuff pressure: recheck.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const cuffTopUpCount = numberSetting({
  name: 'cuff-top-ups',
  label: 'Air added this often asks for a review',
  unit: 'times',
  default: 2,
  min: 2,
  max: 6,
  affects: 'Cuff pressure: warning of a repeated leak.',
  source: { says: 'Red flag in several teaching texts, without a number', standing: 'product proposal' },
})

export const cuffTopUpMl = numberSetting({
  name: 'cuff-top-up-volume',
  label: 'Air added asks for a review above, in all',
  unit: 'mL',
  default: 3,
  min: 1,
  max: 10,
  affects: 'Cuff pressure: warning of a repeated leak.',
  source: { says: 'Red flag in several teaching texts, without a number', standing: 'product proposal' },
})

export const cuffTopUpWindow = numberSetting({
  name: 'cuff-top-up-window',
  label: 'Air added is counted over the last',
  unit: 'h',
  default: 12,
  min: 4,
  max: 24,
  affects: 'Cuff pressure: warning of a repeated leak.',
  source: { says: 'Red flag in several teaching texts, without a number', standing: 'product proposal' },
})

export const cuffSettings = [
  cuffLower,
  cuffUpper,
  cuffVeryLow,
  cuffVeryHigh,
  cuffInterval,
  cuffEventCheck,
  cuffRecheck,
  cuffTopUpCount,
  cuffTopUpMl,
  cuffTopUpWindow,
]
