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

export const failedRemovalWindow = numberSetting({
  name: 'failed-removal-window',
  label: 'A removal has failed when a tube is back within',
  unit: 'h',
  default: 48,
  min: 24,
  max: 168,
  affects: 'Tube removal: the warning when a tube goes back in.',
  source: {
    says: 'Stelfox 2008: an artificial airway back within 48 hours (45% of 225 clinicians) to 96 hours (20%)',
    standing: 'published',
  },
})

export const decannulationSettings = [afterRemovalWatch, failedRemovalWindow]
