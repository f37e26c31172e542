import { numberSetting } from '../policy.ts'

export const reviewNotice = numberSetting({
  name: 'care-plan-review-notice',
  label: 'Notice before the review date of an own value',
  unit: 'days',
  default: 2,
  min: 0,
  max: 14,
  affects: 'Care plan: from when a review is asked for. With 0 on the day itself.',
  source: { says: 'No published number', standing: 'product proposal' },
})
