import { numberSetting, switchSetting } from '../policy.ts'
import { dwellSettings } from './dwell-settings.ts'

const RMM = 'Royal Marsden Manual, ch. 12'

export const firstChangeSurgicalEarliest = numberSetting({
  name: 'first-change-surgical-earliest',
  label: 'First change after a surgical tracheostomy, earliest',
  unit: 'days',
  default: 4,
  min: 3,
  max: 14,
  children: {
    default: 3,
    source: { says: 'AARC paediatric tracheostomy guideline 2021: first change on day 3', standing: 'published' },
  },
  affects: 'Tube change: window of the first change and its warning.',
  source: {
    says: 'AAO-HNS 2013, day 3 to 7 (in a Critical Care Nurse review, 2013); French expert panel 2018, not before day 4',
    standing: 'published, read second-hand',
  },
})

export const firstChangeSurgicalTarget = numberSetting({
  name: 'first-change-surgical-target',
  label: 'First change after a surgical tracheostomy, target',
  unit: 'days',
  default: 7,
  min: 3,
  max: 21,
  personal: true,
  affects: 'Tube change: day on which the first change is due.',
  source: { says: 'AAO-HNS 2013, day 3 to 7', standing: 'published, read second-hand' },
})

export const firstChangePercutaneousEarliest = numberSetting({
  name: 'first-change-percutaneous-earliest',
  label: 'First change after a percutaneous tracheostomy, earliest',
  unit: 'days',
  default: 7,
  min: 5,
  max: 14,
  affects: 'Tube change: window of the first change and its warning.',
  source: { says: 'White 2010, 1 to 2 weeks; French expert panel 2018, 7 to 10 days', standing: 'published' },
})

export const firstChangePercutaneousTarget = numberSetting({
  name: 'first-change-percutaneous-target',
  label: 'First change after a percutaneous tracheostomy, target',
  unit: 'days',
  default: 10,
  min: 5,
  max: 21,
  personal: true,
  affects: 'Tube change: day on which the first change is due.',
  source: { says: 'AAO-HNS 2013, day 10 to 14; White 2010, 1 to 2 weeks', standing: 'published' },
})

export const firstChangeHardLimit = numberSetting({
  name: 'first-change-hard-limit',
  label: 'A first change before this is an emergency only',
  unit: 'h',
  default: 72,
  min: 24,
  max: 168,
  affects: 'Tube change: what the warning of an early first change says.',
  source: {
    says: `${RMM}, quoting the Intensive Care Society: not in the first 72 hours`,
    standing: 'published, read second-hand',
  },
})

export const routineFirstChange = switchSetting({
  name: 'routine-first-change',
  label: 'A first change is planned as routine',
  unit: 'on or off',
  default: true,
  affects: 'Tube change: off where tubes are changed for an indication only (French expert panel 2018, for ICU).',
  source: { says: 'French expert panel 2018', standing: 'published, read second-hand' },
})

export const suturesOutBy = numberSetting({
  name: 'sutures-out-by',
  label: 'Flange sutures out by',
  unit: 'days',
  default: 7,
  min: 3,
  max: 14,
  personal: true,
  affects: 'Suture removal: due on this day after insertion.',
  source: { says: "O'Toole 2017, skin bundle: flange sutures removed within 7 days", standing: 'published' },
})

export const tractEstablishedAfter = numberSetting({
  name: 'tract-established-after',
  label: 'Stoma tract counts as established after',
  unit: 'days',
  default: 14,
  min: 7,
  max: 30,
  affects: 'Tube card: tract state, together with two uncomplicated changes.',
  source: { says: 'Saskatoon Health Region policy 1184, 2013', standing: 'published' },
})

export const blindReinsertionBefore = numberSetting({
  name: 'no-blind-reinsertion-before',
  label: 'No blind re-insertion in a stoma younger than',
  unit: 'days',
  default: 7,
  min: 5,
  max: 14,
  affects: 'Tube card: the caution shown for a new stoma. Tube change: the warning of a tube that is out.',
  source: {
    says: 'Bontempo and Manning: under 7 days only under direct vision; another text says 5',
    standing: 'published',
  },
})

export const repeatTubeOutWindow = numberSetting({
  name: 'repeat-tube-out-window',
  label: 'A second displaced tube asks for the specialist when it comes within',
  unit: 'days',
  default: 7,
  min: 1,
  max: 30,
  affects: 'Tube change: warning of a tube that came out again.',
  source: { says: 'No published number', standing: 'product proposal' },
})

export const tubeChangeSettings = [
  ...dwellSettings,
  firstChangeSurgicalEarliest,
  firstChangeSurgicalTarget,
  firstChangePercutaneousEarliest,
  firstChangePercutaneousTarget,
  firstChangeHardLimit,
  routineFirstChange,
  suturesOutBy,
  tractEstablishedAfter,
  blindReinsertionBefore,
  repeatTubeOutWindow,
]
