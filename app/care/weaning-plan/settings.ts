import { numberSetting } from '../policy.ts'

export const weaningFio2AtMost = numberSetting({
  name: 'weaning-fio2-at-most',
  label: 'Weaning steps are planned with a share of oxygen of at most',
  unit: '%',
  default: 40,
  min: 28,
  max: 60,
  affects: 'Weaning plan: a criterion that a senior may decide against.',
  source: { says: 'Pryor 2016: FiO2 at most 0.4 before the cuff is let down', standing: 'published' },
})
