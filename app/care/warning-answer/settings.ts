import { numberSetting } from '../policy.ts'

/** Numbers that concern how long a warning may wait for an answer. */
export const redSeenWithin = numberSetting({
  name: 'red-warning-seen-within',
  label: 'A red warning is to be seen within',
  unit: 'min',
  default: 1,
  min: 0,
  max: 15,
  affects: 'Board: a red warning that nobody has seen by then says so, and stands first.',
  source: { says: 'Escalation of red warnings after one minute; no published number', standing: 'product proposal' },
})

export const amberSeenWithin = numberSetting({
  name: 'amber-warning-seen-within',
  label: 'An amber warning is to be seen within',
  unit: 'min',
  default: 15,
  min: 5,
  max: 120,
  affects: 'Board: an amber warning that nobody has seen by then rises above late care.',
  source: { says: 'Charge nurse told within 15 minutes; no published number', standing: 'product proposal' },
})

export const answerHolds = numberSetting({
  name: 'warning-answer-holds',
  label: 'An answer to a warning that no single act raised holds for',
  unit: 'h',
  default: 24,
  min: 4,
  max: 168,
  affects: 'Warnings such as a passed change-by date: after that they ask to be seen again.',
  source: { says: 'Once a day, as on a round', standing: 'product proposal' },
})

export const warningAnswerSettings = [redSeenWithin, amberSeenWithin, answerHolds]
