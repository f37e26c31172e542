import { numberSetting, switchSetting } from './policy.ts'

/** Numbers that concern who signs an act, and how. */
export const freshSignIn = numberSetting({
  name: 'fresh-sign-in',
  label: 'A sign-in counts as fresh for',
  unit: 'min',
  default: 10,
  min: 0,
  max: 60,
  affects: 'Charting of final acts, such as a tube change: after that the password is asked for again.',
  source: { says: 'Record-keeping rules ask to sign final acts anew; no number given', standing: 'product proposal' },
})

export const secondPersonSigns = switchSetting({
  name: 'second-person-signs',
  label: 'The second person of an act of two signs on the same screen',
  unit: 'on or off',
  default: true,
  affects: 'Charting of acts of two people: the form says so, and an entry without it is marked. Never refused.',
  source: {
    says: 'Second-person fields for two-person acts; who must sign is a local rule',
    standing: 'product proposal',
  },
})

export const competenceMonths = numberSetting({
  name: 'competence-months',
  label: 'A sign-off of a skill holds for',
  unit: 'months',
  default: 12,
  min: 3,
  max: 36,
  affects: 'Staff competence: the day on which a new sign-off runs out.',
  source: { says: 'Yearly in many hospitals; no published number found', standing: 'product proposal' },
})

export const competenceNotice = numberSetting({
  name: 'competence-notice',
  label: 'A sign-off that runs out is listed ahead by',
  unit: 'days',
  default: 30,
  min: 7,
  max: 120,
  affects: 'Staff competence: the list of what runs out soon, and the reminder to whom it concerns.',
  source: { says: 'Time to arrange an assessment; no published number found', standing: 'product proposal' },
})

export const competenceShiftDays = numberSetting({
  name: 'competence-shift-days',
  label: 'Shifts without somebody in date are counted over the last',
  unit: 'days',
  default: 7,
  min: 3,
  max: 28,
  affects: 'Staff competence: gaps by shift, from who charted.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const signingSettings = [freshSignIn, secondPersonSigns, competenceMonths, competenceNotice, competenceShiftDays]
