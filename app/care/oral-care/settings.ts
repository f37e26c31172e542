import { numberSetting } from '../policy.ts'

export const oralCareInterval = numberSetting({
  name: 'oral-care-interval',
  label: 'Mouth looked at and moistened every',
  unit: 'h',
  default: 4,
  min: 2,
  max: 12,
  personal: true,
  affects: 'Oral care: when the next round is due.',
  source: { says: 'Moistened and cleaned every 2 to 4 hours', standing: 'from memory' },
})

export const brushingInterval = numberSetting({
  name: 'tooth-brushing-interval',
  label: 'Teeth or dentures brushed every',
  unit: 'h',
  default: 12,
  min: 6,
  max: 24,
  personal: true,
  affects: 'Tooth brushing: when it is due.',
  source: {
    says: 'Randomised trial of ventilated patients: brushing twice a day lowered pneumonia by day 5',
    standing: 'published',
  },
})

export const oralCareSettings = [oralCareInterval, brushingInterval]
