import { numberSetting } from '../policy.ts'

const UK = 'UK Intensive Care Society and NTSP, at least once in 8 hours, as quoted by a teaching site'

export const inspectionInterval = numberSetting({
  name: 'inner-cannula-inspection-interval',
  label: 'Inner cannula looked at every',
  unit: 'h',
  default: 8,
  min: 1,
  max: 24,
  personal: true,
  affects: 'Inner cannula inspection: when the next one is due.',
  source: {
    says: `${UK}; Royal Marsden Manual: by secretions, as often as 2-hourly`,
    standing: 'published, read second-hand',
  },
})

export const earlyInterval = numberSetting({
  name: 'inner-cannula-early-interval',
  label: 'Inner cannula of a newly inserted tube looked at every',
  unit: 'h',
  default: 4,
  min: 1,
  max: 24,
  affects: 'Inner cannula inspection: when the next one is due in the first days of a tube.',
  source: { says: 'No published number; hospital policies say 4 to 8 hours', standing: 'product proposal' },
})

export const earlyPeriod = numberSetting({
  name: 'inner-cannula-early-period',
  label: 'A tube counts as newly inserted for',
  unit: 'h',
  default: 48,
  min: 0,
  max: 168,
  affects: 'Inner cannula inspection: how long the shorter interval holds. 0 turns it off.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const disposableInterval = numberSetting({
  name: 'inner-cannula-disposable-interval',
  label: 'Disposable inner cannula changed every',
  unit: 'h',
  default: 12,
  min: 4,
  max: 24,
  personal: true,
  affects: 'Inner cannula change: when the next one is due.',
  source: {
    says: 'Twice a day or as needed in ward and home teaching; NHS Wales tutorial: every 8 hours',
    standing: 'common practice',
  },
})

export const reusableInterval = numberSetting({
  name: 'inner-cannula-reusable-interval',
  label: 'Reusable inner cannula cleaned every',
  unit: 'h',
  default: 24,
  min: 4,
  max: 24,
  personal: true,
  affects: 'Inner cannula clean: when the next one is due.',
  source: { says: 'At least once a day or as needed in ward and home teaching', standing: 'common practice' },
})

export const recheckWithin = numberSetting({
  name: 'inner-cannula-recheck',
  label: 'Inner cannula looked at again after a heavy coating or a block, within',
  unit: 'h',
  default: 2,
  min: 1,
  max: 8,
  affects: 'Inner cannula inspection: recheck after a heavy coating or a block.',
  source: {
    says: 'Royal Marsden Manual: as often as 2-hourly with copious secretions; as a recheck a proposal',
    standing: 'product proposal',
  },
})

export const repeatBlockWindow = numberSetting({
  name: 'inner-cannula-repeat-block-window',
  label: 'A second block asks for the specialist when it comes within',
  unit: 'h',
  default: 24,
  min: 6,
  max: 72,
  affects: 'Inner cannula: warning of a repeated block.',
  source: {
    says: 'Red flag in teaching texts (RCEM learning, NHS Wales), without a number',
    standing: 'product proposal',
  },
})

export const cleaningWithin = numberSetting({
  name: 'inner-cannula-cleaning-within',
  label: 'The other one of a reusable pair is clean and ready again within',
  unit: 'min',
  default: 60,
  min: 10,
  max: 240,
  affects: 'Inner cannula: when the note that there is no clean spare becomes a warning.',
  source: { says: 'Two in rotation, a clean one ready; the minutes are a proposal', standing: 'product proposal' },
})

export const innerCannulaSettings = [
  inspectionInterval,
  earlyInterval,
  earlyPeriod,
  disposableInterval,
  reusableInterval,
  recheckWithin,
  repeatBlockWindow,
  cleaningWithin,
]
