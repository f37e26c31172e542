import { listSetting, numberSetting } from '../policy.ts'

export const afterRemovalSchedule = listSetting({
  name: 'after-removal-schedule',
  label: 'After removal, observations are due at these minutes',
  unit: 'min',
  default: [15, 30, 45, 60, 90, 120, 180, 240, 300, 360],
  affects: 'Observations after removal: when the next set is due in the first hours.',
  source: {
    says: 'Close observation for 24 to 48 hours in teaching texts; every 15 min x 4, 30 min x 2, hourly x 4 is a proposal',
    standing: 'product proposal',
  },
})

export const afterRemovalInterval = numberSetting({
  name: 'after-removal-interval',
  label: 'After removal, observations later on every',
  unit: 'h',
  default: 4,
  min: 1,
  max: 8,
  affects: 'Observations after removal: when the next set is due once the first hours are over.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const afterRemovalPeriod = numberSetting({
  name: 'after-removal-period',
  label: 'After removal, observations go on for',
  unit: 'h',
  default: 48,
  min: 24,
  max: 168,
  affects: 'Observations after removal: when they end.',
  source: { says: '24 to 48 hours of close observation in teaching texts', standing: 'published, read second-hand' },
})

export const monitoredFor = numberSetting({
  name: 'after-removal-monitored',
  label: 'After removal, SpO2 is watched without a break for',
  unit: 'h',
  default: 24,
  min: 4,
  max: 72,
  affects: 'Observations after removal: the warning when it is not.',
  source: { says: 'Continuous SpO2 for the first 24 hours: hospital practice', standing: 'from memory' },
})

export const afterRemovalSettings = [afterRemovalSchedule, afterRemovalInterval, afterRemovalPeriod, monitoredFor]
