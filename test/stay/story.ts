import * as acts from './acts.ts'
import { type Act, like } from './acts.ts'
import * as events from './events.ts'

/** Who does it; the nurse of the shift unless it is said. */
export type Who = 'day nurse' | 'night nurse' | 'charge nurse' | 'specialist'

/** What is sent on a form at a time of a day, and what else there is to say of it. */
export interface Sending {
  readonly who?: Who
  /** When it was done, where it is written down later the same day. */
  readonly doneAt?: string
  /** The name by which a later row speaks of the entry. */
  readonly called?: string
  /** The entry that this corrects. */
  readonly corrects?: string
  /** The field at which the form is refused, with its words. */
  readonly refusedAt?: readonly [field: string, words: RegExp]
  /** It leads to what to do now, and not back to the patient. */
  readonly isUrgent?: true
}

/** A form that is sent on a day, at a time. */
export type Row = readonly [day: number, time: string, act: Act, more?: Sending]

const byCharge: Sending = { who: 'charge nurse' }
const bySpecialist: Sending = { who: 'specialist' }
const refused = (field: string, words: RegExp): Sending => ({ who: 'specialist', refusedAt: [field, words] })

/** Observations that a trial asks for: each quarter of an hour for the first hour, then each hour. */
const watched = (day: number, times: string): readonly Row[] => times.split(' ').map(time => [day, time, acts.calm])

/** Rounds of the routine that are not done, or done as the story has it. */
export const leftOut: readonly (readonly [day: number, time: string])[] = [
  [0, '16:10'],
  [4, '09:00'],
  [5, '14:10'],
  [13, '20:10'],
  [14, '08:20'],
  [15, '14:10'],
  [20, '02:10'],
]

/** Entries that are taken back, by their names. */
export const retractions: readonly (readonly [day: number, time: string, name: string])[] = [
  [15, '18:00', 'corrected look'],
]

export const story: readonly Row[] = [
  // Day 0: a first tube, percutaneous, and its first care.
  [0, '10:00', events.firstTube, bySpecialist],
  [0, '10:10', acts.pressure],
  [0, '10:20', acts.wholeKit],
  [0, '10:30', acts.calmNoFlags],
  [0, '10:40', acts.noSuction],
  [0, '10:45', acts.teeth],
  [0, '11:00', acts.suturedSeen],
  [0, '11:15', acts.hmeChanged],
  [0, '18:10', acts.inner.seen8],
  // Day 4: the dressing waits for a procedure.
  [4, '09:00', events.dressingDeferred],
  [4, '13:30', acts.suturedRedressed],
  // Days 5 and 6: a blocked inner cannula, twice within a day.
  [5, '13:20', events.wouldNotPass, { isUrgent: true }],
  [5, '13:26', events.seen('suction-will-not-pass'), byCharge],
  [5, '13:30', acts.inner.blocked8],
  [5, '13:35', events.passedAgain],
  [5, '13:40', acts.wholeKit],
  [5, '15:50', acts.inner.seen8],
  [6, '10:20', acts.inner.blocked8],
  [6, '10:45', events.seen('inner-cannula-repeat-block'), byCharge],
  [6, '11:30', events.actedOn('inner-cannula-repeat-block', 'Seen by the specialist, nebulisers begun'), bySpecialist],
  [6, '12:00', events.settled('inner-cannula-repeat-block', 'Reviewed; the interval is looked at daily'), bySpecialist],
  [6, '12:20', acts.inner.seen8],
  // Day 8: the cuff leaks and takes air twice within twelve hours; the sutures come out, a day late.
  [8, '06:00', events.toppedUp(16, 1.5, 'no')],
  [8, '14:00', events.toppedUp(15, 2, 'yes'), { isUrgent: true }],
  [8, '14:08', events.seen('cuff-leak-displacement'), byCharge],
  [8, '14:30', events.noLeak],
  [8, '15:00', events.suturesOut, bySpecialist],
  // Day 9: a pressure injury, which the round finds from 09:00 on.
  [9, '10:00', events.seen('pressure-injury'), byCharge],
  [9, '11:00', events.actedOn('pressure-injury', 'Foam under the flange, wound care told'), byCharge],
  // Day 10: the first change.
  [10, '10:30', events.secondTube, bySpecialist],
  [10, '10:42', acts.pressure],
  [10, '10:50', acts.wholeKit],
  // Day 12: a trial with the cuff down, which fails. No cap may be planned with the cuff up.
  [12, '10:00', acts.cuffTrial],
  ...watched(12, '10:15 10:30'),
  [12, '11:00', events.fast],
  [12, '11:05', events.stoppedForRate],
  [12, '11:18', acts.pressure],
  [12, '11:30', acts.calm],
  [12, '12:30', events.planned('cap', '2026-10-18', 'up'), refused('care.cuffThen', /fully down/)],
  // Day 13: a look that is written down eight hours late.
  [13, '18:00', acts.inner.seen75, { doneAt: '10:00', called: 'late look' }],
  [13, '21:45', acts.inner.seen75],
  // Day 14: a pressure that is in the band in force, and out of the next one.
  [14, '08:20', like(acts.pressure, { found: 28 }), { called: 'pressure of 28' }],
  [14, '12:18', like(acts.pressure, { found: 28, leftAt: 24, airMl: -1 })],
  // Day 15: an entry is corrected, then taken back.
  [15, '14:10', acts.inner.seen75, { called: 'look' }],
  [15, '15:00', acts.inner.seen75, { doneAt: '12:40', corrects: 'look', called: 'corrected look' }],
  [15, '16:30', events.planned('cuff', '2026-10-21', 'down'), bySpecialist],
  [15, '18:10', acts.inner.seen75],
  // Days 16 and 17: the cuff stays down for a day and longer.
  [16, '10:00', acts.cuffTrial],
  ...watched(16, '10:15 10:30 10:45 11:00 13:00 14:00 15:00 17:00 18:00 19:00 21:00 22:00 23:00'),
  ...watched(17, '01:00 02:00 03:00 05:00 06:00 07:00 09:00 10:00'),
  [17, '10:05', acts.cuffTrialEnd],
  [17, '11:00', events.planned('valve', '2026-10-24', 'down'), bySpecialist],
  // Days 18 and 19: no cap before a valve was borne, and then it is.
  [
    18,
    '11:00',
    events.planned('cap', '2026-10-24', 'down'),
    refused('care.seniorName', /no one-way valve trial was passed/),
  ],
  [19, '08:02', events.valveTrial],
  ...watched(19, '08:15 08:30 08:45 09:00 10:00 11:00 13:00 14:00 15:00 17:00 18:00 19:00'),
  [19, '20:10', events.valveTrialEnd],
  // Day 20: clocks go back in the night.
  [20, '02:35', acts.inner.seen75],
  // Days 22 to 25: the label of the second tube runs out, and it is changed a day late.
  [24, '17:00', events.seen('tube-near-limit'), byCharge],
  [24, '17:10', events.changePlanned('2026-10-30'), bySpecialist],
  [25, '11:00', events.thirdTube, bySpecialist],
  [25, '11:10', acts.wholeKit],
  [25, '14:00', events.planned('cap', '2026-10-31', 'none'), bySpecialist],
  // Days 26 and 27: a cap for a day. Nobody plans the removal before it was borne.
  [
    26,
    '09:10',
    events.planned('removal', '2026-11-02', 'none'),
    refused('care.seniorName', /no cap trial was passed; readiness/),
  ],
  [26, '10:00', events.capTrial],
  ...watched(26, '10:15 10:30 10:45 11:00 13:00 14:00 15:00 17:00 18:00 19:00 21:00 22:00 23:00'),
  ...watched(27, '01:00 02:00 03:00 05:00 06:00 07:00 09:00 10:00'),
  [27, '10:05', events.capTrialEnd],
  [27, '11:00', events.strongCough],
  [27, '11:10', events.ready, bySpecialist],
  [27, '11:30', events.planned('removal', '2026-11-02', 'none'), bySpecialist],
  // Day 28: the tube comes out; two days of observations, of which the last set is missed.
  [28, '10:00', events.removed, bySpecialist],
  ...after(28, '10:16 10:30 10:45 11:00 11:30 12:00 13:00 14:00 15:00 16:00 20:00'),
  ...after(29, '00:00 04:00 08:00 12:00 16:00 20:00'),
  ...after(30, '00:00 04:00'),
  [29, '09:00', events.openingCloses],
  [30, '10:30', events.openingClosed],
]

function after(day: number, times: string): readonly Row[] {
  return times.split(' ').map(time => [day, time, events.wellAfter])
}
