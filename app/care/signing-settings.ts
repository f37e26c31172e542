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

export const signingSettings = [freshSignIn, secondPersonSigns]
