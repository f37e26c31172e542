import { graded, gradedOver, readyInPart, trialBorne, trialPlanned } from './chart-weaning.ts'
import { closingOpening, kitIncomplete, noted, withoutSpare } from './happenings.ts'
import { patient } from './patient.ts'
import type { BedStory } from './story.ts'

/** Cedar ward: its own policy keeps cuffs at 25 cmH2O at most; people here are on their way out of their tubes. */
export const cedarStories: readonly BedStory[] = [
  {
    bed: 'C1',
    patient: patient('3036 5547', 'Lindqvist-Obuyara', 'Torsten', 'male', '1971-01-05'),
    admittedHoursAgo: 113,
    tube: { name: 'corvane 8', inserted: { daysAgo: 28, stomaDaysAgo: 39 }, technique: 'percutaneous' },
    change: { hoursAgo: 27.4, name: 'corvane 8', reason: 'routine' },
    secretions: 'thin',
    stands: { inner: -1.9, cuff: -4.9, suction: -2.3, dressing: -4.6, stoma: 'done' },
  },
  {
    bed: 'C2',
    patient: patient('2954 3371', 'Ravensworthy', 'Agnes', 'female', '1940-07-16', {
      upperAirway: 'not open',
      oxygen: 'Heat and moisture exchanger over the stoma',
    }),
    admittedHoursAgo: 92,
    secretions: 'thin',
    stands: { stoma: 'done' },
  },
  {
    bed: 'C3',
    patient: patient('3039 0280', 'Tamboulari', 'Oumar', 'male', '1992-09-09', { oxygen: null }),
    admittedHoursAgo: 109,
    tube: { name: 'halden 6', inserted: { daysAgo: 14, stomaDaysAgo: 32 }, technique: 'percutaneous' },
    removedHoursAgo: 20.3,
    secretions: 'thin',
    stands: { inner: -3, innerRenewal: -9, suction: -2, dressing: -8, stoma: 'done' },
    extra: [
      trialBorne('valve', [74.6, 61.8]),
      closingOpening(11.7, 'Dry, about half closed.'),
      closingOpening(3.2, 'Dry. Voice clear with a finger on it.'),
    ],
  },
  {
    bed: 'C4',
    patient: patient('2968 7705', 'Żurawiecka', 'Bronisława', 'female', '1938-12-24', { allergies: 'Latex' }),
    admittedHoursAgo: 96,
    tube: { name: 'corvane 7', inserted: { daysAgo: 10, stomaDaysAgo: 23 }, technique: 'surgical' },
    secretions: 'moderate',
    stands: { inner: 1.7, cuff: -1.6, suction: 4.6, dressing: -6.5, stoma: 'due' },
  },
  {
    bed: 'C5',
    patient: patient('3042 1839', 'Castellanne', 'Rufus', 'male', '1959-02-28'),
    admittedHoursAgo: 86,
    tube: { name: 'halden 6', inserted: { daysAgo: 19, stomaDaysAgo: 40 }, technique: 'percutaneous' },
    secretions: 'thin',
    stands: { inner: -5, innerRenewal: -2.5, suction: 0.3, dressing: -13, stoma: 'done' },
    extra: [
      trialBorne('valve', [82.4, 81.6], { reasons: ['tired', 'asked'] }),
      trialBorne('valve', [78.1, 72.3]),
      trialBorne('valve', [68.7, 55.9]),
      trialBorne('cap', [52.2, 49.4], { reasons: ['distress'] }),
      trialBorne('cap', [40.3, 14.6]),
      readyInPart(4.8),
      gradedOver([
        [83.5, { cough: 'moderate', passes: 'two', colour: 'yellow', viscosity: 'thick', interval: 'two to three' }],
        [59.3, { cough: 'moderate', passes: 'two', colour: 'tan', viscosity: 'frothy', interval: 'two to three' }],
        [34.8, { passes: 'one', colour: 'tan' }],
      ]),
      graded(10.2, { colour: 'tan' }, 132),
    ],
  },
  {
    bed: 'C6',
    patient: patient('3040 7714', 'Ishikawara', 'Kenta', 'male', '1981-06-13'),
    admittedHoursAgo: 77,
    tube: { name: 'corvane 8', inserted: { daysAgo: 12, stomaDaysAgo: 21 }, technique: 'percutaneous' },
    secretions: 'moderate',
    stands: { inner: -2, cuff: 1.2, suction: -3, dressing: -15.5, stoma: 'done', kit: 'due' },
    extra: [
      noted(19.5, 'Sister visited and was shown suction. Next lesson on Friday.'),
      withoutSpare(3.1),
      kitIncomplete(0.4, { missing: ['inner cannula'], owner: 'Ward porter, from stores' }),
    ],
  },
  {
    bed: 'C7',
    patient: patient('3044 6092', 'Böðvarsdóttir', 'Þórunn', 'female', '1974-11-11', { allergies: 'Tape (redness)' }),
    admittedHoursAgo: 119,
    tube: { name: 'corvane 8', inserted: { daysAgo: 9, stomaDaysAgo: 9 }, technique: 'surgical' },
    change: { hoursAgo: 46.6, name: 'corvane 7', reason: 'first change' },
    secretions: 'moderate',
    stands: { inner: -1.3, cuff: -3.5, cuffFound: 'high', suction: -1.7, dressing: -10, stoma: 'done', aboveCuff: 0.4 },
  },
  {
    bed: 'C8',
    patient: patient('3034 9156', 'Mohrenfels', 'Liesel', 'female', '1956-08-31'),
    admittedHoursAgo: 100,
    tube: { name: 'linnet', inserted: { daysAgo: 13, stomaDaysAgo: 36 }, technique: 'percutaneous' },
    secretions: 'thin',
    stands: { cuff: -0.4, suction: -2.9, dressing: 3.1, stoma: 'done', observations: 1.8 },
    extra: [trialPlanned(6.3, 'cuff', 1)],
  },
  {
    bed: 'C9',
    patient: patient('3045 1177', 'Gallardovic', 'Ysidro', 'male', '1968-04-04', {
      oxygen: 'Oxygen 28% by tracheostomy mask',
    }),
    admittedHoursAgo: 83,
    tube: { name: 'corvane 9', inserted: { hoursAgo: 72.5 }, technique: 'percutaneous', sutures: true },
    secretions: 'moderate',
    stands: { inner: -0.5, cuff: -7.1, suction: -0.9, dressing: -1.5, stoma: 'due' },
  },
  {
    bed: 'C10',
    patient: patient('3033 4428', 'Underhayes', 'Clement', 'male', '1964-05-20', { oxygen: null }),
    admittedHoursAgo: 119.5,
    tube: { name: 'halden 6', inserted: { daysAgo: 15, stomaDaysAgo: 38 }, technique: 'percutaneous' },
    removedHoursAgo: 76.4,
    discharged: { hoursAgo: 26.2, reason: 'home', note: 'Opening nearly closed. Clinic in two weeks.' },
    secretions: 'thin',
    stands: { inner: -4, innerRenewal: -10, suction: -2.5, dressing: -9, stoma: 'done' },
    extra: [
      closingOpening(64.5, 'Dry. Presses on it to speak.'),
      closingOpening(41.8, 'Two thirds closed.'),
      closingOpening(28.1, 'Nearly closed. Ready for home.'),
    ],
  },
]
