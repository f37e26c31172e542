import { cuffLeftHigh, digitsSwapped, heavyCoating, ownValue, putOff, writtenLate, wrongPatient } from './happenings.ts'
import { patient } from './patient.ts'
import type { BedStory } from './story.ts'

/** Alder ward: shifts of eight hours, gauges in cmH2O. It holds every kind of tube, so that one board shows them all. */
export const alderStories: readonly BedStory[] = [
  {
    bed: 'A1',
    patient: patient('3041 8877', 'Tollervane', 'Marguerite', 'female', '1951-02-09', {
      allergies: 'Penicillin (rash)',
    }),
    admittedHoursAgo: 118,
    tube: { name: 'corvane 8', inserted: { daysAgo: 12, stomaDaysAgo: 26 }, technique: 'percutaneous' },
    secretions: 'thin',
    stands: { inner: -5.4, cuff: -3.1, suction: -1.9, dressing: -15, stoma: 'done' },
  },
  {
    bed: 'A2',
    patient: patient('3041 9024', 'Oyelarande', 'Babatunde', 'male', '1963-07-30'),
    admittedHoursAgo: 93,
    tube: { name: 'corvane 9', inserted: { daysAgo: 9, stomaDaysAgo: 19 }, technique: 'percutaneous' },
    secretions: 'moderate',
    stands: { inner: 5.9, cuff: -0.6, suction: 0.4, dressing: -6, stoma: 'due', aboveCuff: -1.6 },
  },
  {
    bed: 'A3',
    patient: patient('2987 1143', 'Kvist-Andréasson', 'Solveig', 'female', '1947-11-21', {
      allergies: 'Latex; sticking plaster (blisters)',
    }),
    admittedHoursAgo: 101,
    tube: { name: 'corvane 7', inserted: { daysAgo: 26, stomaDaysAgo: 41 }, technique: 'surgical' },
    secretions: 'thin',
    stands: { inner: -3, cuff: -2.2, suction: -2.8, dressing: -3.1, stoma: 'done' },
    extra: [digitsSwapped(15.3)],
  },
  {
    bed: 'A4',
    patient: patient('2990 5561', 'Wrzesiński', 'Zdzisław', 'male', '1939-05-04', { spo2Low: 88, spo2High: 92 }),
    admittedHoursAgo: 107,
    tube: { name: 'corvane 8', inserted: { daysAgo: 29, stomaDaysAgo: 52 }, technique: 'percutaneous' },
    secretions: 'moderate',
    stands: { inner: -1.6, cuff: 1.4, suction: -2.2, dressing: -9, stoma: 'done' },
    extra: [wrongPatient(21.4)],
  },
  {
    bed: 'A5',
    patient: patient('3044 2210', 'Takemori', 'Haruko', 'female', '1972-09-15', { oxygen: null }),
    admittedHoursAgo: 79,
    tube: { name: 'halden 6', inserted: { daysAgo: 11, stomaDaysAgo: 33 }, technique: 'surgical' },
    secretions: 'thin',
    stands: { inner: -4.5, innerRenewal: -3.2, suction: -0.7, dressing: -12, stoma: 'done', oralCare: 1.6 },
  },
  {
    bed: 'A6',
    patient: patient('3039 7402', 'Ó Ruadhagáin', 'Caoimhín', 'male', '1980-01-27'),
    admittedHoursAgo: 114,
    tube: { name: 'linnet', inserted: { daysAgo: 6, stomaDaysAgo: 18 }, technique: 'percutaneous' },
    secretions: 'moderate',
    stands: { cuff: -5, suction: 1.6, dressing: 0.5, stoma: 'due' },
    extra: [writtenLate(58.2, 26.5, 'Called to the ward next door at the end of the shift')],
  },
  {
    bed: 'A7',
    patient: patient('2876 0345', 'Featheringay-Castellanos', 'Bartholomew Ignatius', 'male', '1955-12-12', {
      allergies: 'Iodine contrast; morphine (itching); chlorhexidine',
    }),
    admittedHoursAgo: 116,
    tube: { name: 'tarn', inserted: { daysAgo: 9, stomaDaysAgo: 30 }, technique: 'surgical' },
    secretions: 'moderate',
    stands: { suction: -2.5, dressing: -8, stoma: 'done', humidification: 'due' },
  },
  {
    bed: 'A8',
    patient: patient('3040 6618', 'Demirağlı', 'Nurşen', 'female', '1958-03-03', {
      upperAirway: 'not open',
      oxygen: 'Humidified air at the stoma',
    }),
    admittedHoursAgo: 118.4,
    tube: { name: 'orrin', inserted: { daysAgo: 8, stomaDaysAgo: 8 }, technique: 'surgical' },
    change: { hoursAgo: 44.2, name: 'orrin', reason: 'first change' },
    secretions: 'moderate',
    stands: { suction: -1.4, dressing: -11, stoma: 'done' },
  },
  {
    bed: 'A9',
    patient: patient('3042 5093', 'Vanterpoole', 'Curtis', 'male', '1969-06-18', { allergies: null }),
    admittedHoursAgo: 66,
    tube: { name: 'corvane 8', inserted: { daysAgo: 5, stomaDaysAgo: 15 }, technique: 'percutaneous' },
    secretions: 'moderate',
    stands: { inner: -2.8, cuff: -3, suction: -3.1, dressing: -17, stoma: 'done' },
    extra: [cuffLeftHigh(0.9)],
  },
  {
    bed: 'A10',
    patient: patient('3045 0012', 'Szabó-Királyfi', 'Ilona', 'female', '1944-08-08', {
      oxygen: 'Oxygen 28% by tracheostomy mask',
    }),
    admittedHoursAgo: 26,
    tube: { name: 'corvane 7', inserted: { hoursAgo: 21 }, technique: 'surgical', sutures: true },
    secretions: 'thin',
    stands: { inner: -1.7, cuff: -2, suction: -3.2, stoma: 'done' },
  },
  {
    bed: 'A11',
    patient: patient('3037 3326', 'Ramanujapuram', 'Lakshmi', 'female', '1961-10-02'),
    admittedHoursAgo: 97,
    tube: { name: 'corvane 7', inserted: { daysAgo: 15, stomaDaysAgo: 37 }, technique: 'percutaneous' },
    secretions: 'thin',
    stands: { inner: -6.2, cuff: 0.2, cuffEvery: 4, suction: -1.6, dressing: 3.6, stoma: 'done' },
    extra: [
      ownValue(69.5, {
        setting: 'cuff-pressure-interval',
        value: 4,
        reason: 'The cuff loses pressure when she is turned',
        reviewInDays: 3,
      }),
    ],
  },
  {
    bed: 'A12',
    patient: patient('3043 7781', 'Ferreira da Conceição', 'Inês', 'female', '1988-04-25'),
    admittedHoursAgo: 74,
    tube: { name: 'corvane 7', inserted: { daysAgo: 7, stomaDaysAgo: 20 }, technique: 'surgical' },
    secretions: 'moderate',
    stands: { inner: 0.7, cuff: -4.4, suction: -2.7, dressing: -13, stoma: 'done' },
    extra: [putOff(0.6, { task: 'inner-cannula-inspection', minutes: '120', reason: 'off ward' })],
  },
  {
    bed: 'A13',
    patient: patient('2961 4459', 'Penhallicke', 'Dorothy', 'female', '1936-01-17', {
      allergies: 'Sulfonamides',
      oxygen: 'Oxygen 35% by tracheostomy mask',
    }),
    admittedHoursAgo: 110,
    tube: { name: 'corvane 8', inserted: { daysAgo: 18, stomaDaysAgo: 29 }, technique: 'percutaneous' },
    secretions: 'thick',
    stands: { inner: -2.5, cuff: -6.3, cuffFound: 'high', suction: -3.3, dressing: -10, stoma: 'done' },
    skin: {
      sinceHoursAgo: 30,
      found: {
        appearance: ['redness'],
        skin: 'pressure injury',
        stage: 'stage-2',
        findingSite: 'flange bottom',
        sizeMm: 8,
      },
    },
    extra: [heavyCoating(1.2)],
  },
]
