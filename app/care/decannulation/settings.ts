import { numberSetting } from '../policy.ts'

export const afterRemovalWatch = numberSetting({
  name: 'after-removal-watch',
  label: 'After a tube was taken out for good its spare stays at the bedside for',
  unit: 'h',
  default: 48,
  min: 24,
  max: 168,
  affects: 'Tube removal: the reminder that stands afterwards.',
  source: {
    says: 'Stelfox 2008: failure is an artificial airway back within 48 hours, others say 96; the spare is a proposal',
    standing: 'product proposal',
  },
})

export const decannulationSettings = [afterRemovalWatch]
