import { cuffLetDown, graded, transferred, trialPlanned, valveRunning } from './chart-weaning.ts'
import { copiousSecretions, digitsSwapped, hardBreathing, streaksOfBlood, writtenLate } from './happenings.ts'
import { patient } from './patient.ts'
import type { BedStory } from './story.ts'

/** Birch ward: shifts of twelve hours, gauges in mmHg, and the sickest patients. */
export const birchStories: readonly BedStory[] = [
  {
    bed: 'B1',
    patient: patient('3044 8830', 'Achterbergh', 'Willem', 'male', '1957-09-29', {
      ventilated: true,
      oxygen: 'Ventilator, oxygen 40%',
    }),
    admittedHoursAgo: 117,
    tube: {
      name: 'corvane 8',
      inserted: { daysAgo: 6, stomaDaysAgo: 6 },
      technique: 'percutaneous',
      sutures: true,
    },
    secretions: 'moderate',
    stands: { inner: -3.8, cuff: -0.2, suction: -2.6, dressing: -14, stoma: 'done', aboveCuff: -0.8 },
  },
  {
    bed: 'B2',
    patient: patient('3044 1907', 'Bui', 'An', 'female', '1990-02-14', { oxygen: 'Oxygen 28% by tracheostomy mask' }),
    admittedHoursAgo: 112,
    tube: { name: 'corvane 7', inserted: { daysAgo: 8, stomaDaysAgo: 8 }, technique: 'surgical', sutures: true },
    secretions: 'thin',
    stands: { inner: 2.3, cuff: -4.1, suction: -1.2, dressing: -2.6, stoma: 'due', kit: 'due' },
  },
  {
    bed: 'B3',
    patient: patient('3038 2264', 'Ștefănoiu', 'Răzvan', 'male', '1976-12-01'),
    admittedHoursAgo: 105,
    movedFrom: { bed: 'A14', hoursAgo: 40.5 },
    tube: { name: 'corvane 8', inserted: { daysAgo: 10, stomaDaysAgo: 24 }, technique: 'percutaneous' },
    secretions: 'thin',
    stands: { inner: -5.1, innerRenewal: -1.7, cuff: -5.6, suction: -2.1, dressing: -16, stoma: 'done' },
    extra: [transferred(40.5, 'Birch ward', 'Nurse in charge, Birch ward'), trialPlanned(20.2, 'cuff', 1)],
  },
  {
    bed: 'B4',
    patient: patient('2999 8043', 'Macalister-Oduyale', 'Fionnuala', 'female', '1949-04-11', {
      spo2Low: 88,
      spo2High: 92,
    }),
    admittedHoursAgo: 99,
    tube: { name: 'corvane 9', inserted: { daysAgo: 17, stomaDaysAgo: 44 }, technique: 'surgical' },
    secretions: 'moderate',
    stands: { inner: -2.4, cuff: 6.2, cuffFound: 'high', suction: 2.4, dressing: -5, stoma: 'done' },
  },
  {
    bed: 'B5',
    patient: patient('3041 3358', 'Jørgensrud', 'Håkon', 'male', '1984-08-19', { oxygen: null }),
    admittedHoursAgo: 84,
    tube: { name: 'halden 4 fenestrated', inserted: { daysAgo: 13, stomaDaysAgo: 35 }, technique: 'percutaneous' },
    secretions: 'thin',
    stands: { inner: -2.2, innerRenewal: -7, suction: -3.4, dressing: -18, stoma: 'done' },
  },
  {
    bed: 'B6',
    patient: patient('2975 6690', 'Čapkovičová', 'Zdeňka', 'female', '1942-06-06', { allergies: 'Codeine (vomiting)' }),
    admittedHoursAgo: 95,
    tube: { name: 'corvane 9', inserted: { daysAgo: 27, stomaDaysAgo: 48 }, technique: 'surgical' },
    secretions: 'moderate',
    stands: { inner: 0.8, cuff: -6.8, cuffFound: 'low', suction: -1.8, dressing: -7, stoma: 'done' },
  },
  {
    bed: 'B7',
    patient: patient('3035 0718', 'Whitlocke', 'Ernest', 'male', '1953-11-30'),
    admittedHoursAgo: 90,
    tube: { name: 'marrow', inserted: { daysAgo: 8, stomaDaysAgo: 31 }, technique: 'surgical' },
    secretions: 'moderate',
    stands: { cuff: -1.9, suction: 0.6, dressing: 2.8, stoma: 'due', humidification: 'due' },
  },
  {
    bed: 'B8',
    patient: patient('3043 4125', 'Haddadine', 'Samira', 'female', '1978-05-22', { allergies: null }),
    admittedHoursAgo: 108,
    tube: { name: 'corvane 8', inserted: { daysAgo: 14, stomaDaysAgo: 28 }, technique: 'percutaneous' },
    secretions: 'thin',
    stands: { inner: -6.9, cuff: -2, suction: -0.5, dressing: -11, stoma: 'done', observations: -2.2 },
    extra: [
      cuffLetDown(4.6),
      valveRunning(1.2, [0.95, 0.7, 0.45, 0.2]),
      graded(28.5, { passes: 'two', colour: 'tan', interval: 'two to three' }),
      graded(5.1, {}, 118),
    ],
  },
  {
    bed: 'B9',
    patient: patient('3040 0951', 'Kahananaui', 'Leilani', 'female', '1966-03-08'),
    admittedHoursAgo: 103,
    tube: { name: 'corvane 7', inserted: { daysAgo: 16, stomaDaysAgo: 27 }, technique: 'percutaneous' },
    secretions: 'moderate',
    stands: { inner: -4.7, cuff: -1.4, suction: -1.5, dressing: -9, stoma: 'done', aboveCuff: -2.3 },
    extra: [
      streaksOfBlood(0.8),
      digitsSwapped(37.6),
      writtenLate(81.5, 31, 'Record was not available during the network fault'),
    ],
  },
  {
    bed: 'B10',
    patient: patient(
      '3042 9976',
      'Montgomerie-Villanueva de los Ríos',
      'Maximiliana Guadalupe',
      'female',
      '1945-10-10',
      { allergies: 'Penicillin; aspirin' },
    ),
    admittedHoursAgo: 71,
    tube: { name: 'halden 6 cuffed', inserted: { daysAgo: 20, stomaDaysAgo: 45 }, technique: 'surgical' },
    secretions: 'thick',
    stands: {
      inner: -1.3,
      innerRenewal: 1.2,
      cuff: -4.4,
      suction: -1.1,
      dressing: 1,
      stoma: 'missed',
      observations: -0.6,
    },
    extra: [copiousSecretions(1.6), hardBreathing(1.5)],
  },
]
