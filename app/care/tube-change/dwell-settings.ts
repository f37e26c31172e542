import type { ForChildren } from '../children.ts'
import { numberSetting } from '../policy.ts'

/** Reference R-306. */
const weekly: ForChildren<number> = {
  default: 7,
  min: 3,
  source: {
    says: 'AARC paediatric tracheostomy guideline 2021: at least every 1 to 2 weeks and as needed',
    standing: 'published',
  },
}

export const dwellDual = numberSetting({
  name: 'dwell-limit-dual-cannula',
  label: 'Longest use of a dual-cannula tube',
  unit: 'days',
  default: 28,
  min: 7,
  max: 90,
  personal: true,
  children: weekly,
  affects: 'Tube change: change-by date. The strictest of policy and device label counts.',
  source: {
    says: 'National Tracheostomy Safety Project, changing a tracheostomy tube: 28 days; other texts 29 and 30 days',
    standing: 'published',
  },
})

export const dwellSingle = numberSetting({
  name: 'dwell-limit-single-cannula',
  label: 'Longest use of a single-cannula tube',
  unit: 'days',
  default: 14,
  min: 3,
  max: 30,
  personal: true,
  children: weekly,
  affects: 'Tube change: change-by date of tubes without an inner cannula.',
  source: {
    says: 'Intensive Care Society, 7 to 14 days, as quoted by the French expert panel 2018',
    standing: 'published, read second-hand',
  },
})

export const dwellSingleHeavy = numberSetting({
  name: 'dwell-limit-single-cannula-heavy-secretions',
  label: 'Longest use of a single-cannula tube with heavy secretions',
  unit: 'days',
  default: 7,
  min: 3,
  max: 30,
  affects: 'Tube change: change-by date of tubes without an inner cannula once secretions were heavy.',
  source: {
    says: 'Intensive Care Society, 7 to 14 days, as quoted by the French expert panel 2018',
    standing: 'published, read second-hand',
  },
})

export const heavyEpisodes = numberSetting({
  name: 'heavy-secretions-after',
  label: 'Secretions count as heavy for a tube after suction with copious secretions this often',
  unit: 'times',
  default: 3,
  min: 1,
  max: 20,
  affects: 'Tube change: which limit a single-cannula tube has. It does not go back while this tube is in.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const dwellNotice = numberSetting({
  name: 'dwell-notice',
  label: 'Notice before the change-by date',
  unit: 'days',
  default: 7,
  min: 1,
  max: 21,
  affects: 'Tube change: when it is shown as due soon.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const dwellStrongNotice = numberSetting({
  name: 'dwell-strong-notice',
  label: 'Strong notice before the change-by date',
  unit: 'days',
  default: 2,
  min: 1,
  max: 7,
  affects: 'Tube change: amber warning to plan the change.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const dwellSettings = [dwellDual, dwellSingle, dwellSingleHeavy, heavyEpisodes, dwellNotice, dwellStrongNotice]
