import { numberSetting } from '../policy.ts'

export const dressingInterval = numberSetting({
  name: 'dressing-change-interval',
  label: 'Stoma dressing changed every',
  unit: 'h',
  default: 24,
  min: 8,
  max: 48,
  personal: true,
  affects: 'Stoma and skin: when the next change of dressing is due.',
  source: {
    says: 'Royal Marsden Manual, ch. 12: at least every 24 hours, and when wet or soiled',
    standing: 'published',
  },
})

export const tiesMostFingers = numberSetting({
  name: 'ties-most-fingers',
  label: 'Most fingers that may fit under the ties',
  unit: 'fingers',
  default: 2,
  min: 1,
  max: 2,
  affects: 'Stoma and skin: warning of loose ties.',
  source: { says: 'Teaching texts differ: one finger, or one to two', standing: 'published' },
})

export const infectionSigns = numberSetting({
  name: 'stoma-infection-signs',
  label: 'Infection of the stoma is suspected from',
  unit: 'signs',
  default: 2,
  min: 1,
  max: 4,
  affects: 'Stoma and skin: signs counted are redness, warmth, pus, bad odour and fever.',
  source: { says: 'No validated score for a tracheostomy stoma', standing: 'product proposal' },
})

export const closingInterval = numberSetting({
  name: 'opening-review-interval',
  label: 'After removal for good the opening is looked at every',
  unit: 'h',
  default: 24,
  min: 8,
  max: 48,
  affects: 'Stoma and skin: when the next look is due, until the opening has closed.',
  source: { says: 'Dressing changed daily; an opening closes in 5 to 7 days', standing: 'published, read second-hand' },
})

export const stomaSettings = [dressingInterval, tiesMostFingers, infectionSigns, closingInterval]
