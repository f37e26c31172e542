import type { Act } from './acts.ts'
import * as acts from './acts.ts'

const { inner } = acts

/** Times of a round, what it is, and the days on which it is done, from the first to the last. */
type Round = readonly [times: string, act: Act, from: number, to: number]

/*
 * Two shifts, from 07:00 and from 19:00. Day 0 is Monday, 05-Oct-2026; the first tube goes in at 10:00 and the last comes out on
 * day 28 at 10:00. What is not of a quiet day stands in the story, and leaves rounds out that it takes the place of.
 */
export const rounds: readonly Round[] = [
  // Each shift begins with the kit, and with the list of red flags.
  ['07:15', acts.wholeKit, 1, 28],
  ['19:15', acts.wholeKit, 0, 27],
  ['08:00', acts.calmNoFlags, 1, 28],
  ['20:00', acts.calmNoFlags, 0, 27],
  // Every four hours.
  ['12:00 16:00', acts.calm, 0, 27],
  ['00:00 04:00', acts.calm, 1, 28],
  ['12:05 16:05 20:05', acts.noSuction, 0, 27],
  ['00:05 04:05 08:05', acts.noSuction, 1, 28],
  ['12:06 16:06', acts.mouth, 0, 27],
  ['00:06 04:06', acts.mouth, 1, 28],
  ['20:06', acts.teeth, 0, 27],
  ['08:06', acts.teeth, 1, 28],
  // Every eight hours, while an air cuff is up: until the trial of day 16.
  ['08:20', acts.pressure, 1, 16],
  ['16:20', acts.pressure, 0, 15],
  ['00:20', acts.pressure, 1, 16],
  // Opening, skin and ties in each shift; dressing and ties are changed by day. Sutures until day 8, an injury from day 9 to 14.
  ['09:00', acts.suturedRedressed, 1, 8],
  ['21:00', acts.suturedSeen, 0, 7],
  ['21:00', acts.skinSeen, 8, 8],
  ['09:00', acts.injuryRedressed, 9, 14],
  ['21:00', acts.injurySeen, 9, 14],
  ['09:00', acts.redressed, 15, 28],
  ['21:00', acts.skinSeen, 15, 27],
  ['09:30', acts.hmeChanged, 1, 28],
  ['21:30', acts.hmeLeft, 0, 27],
  // The first tube has a disposable inner cannula: new twice a day, and looked at every four hours for two days, then every six.
  ['12:10 16:10', inner.seen8, 0, 1],
  ['20:10', inner.new8, 0, 9],
  ['08:10', inner.new8, 1, 10],
  ['00:10 04:10', inner.seen8, 1, 2],
  ['12:10', inner.seen8, 2, 2],
  ['14:10', inner.seen8, 3, 9],
  ['02:10', inner.seen8, 3, 10],
  // The second, of day 10, has a pair that is cleaned once a day.
  ['14:10 16:10 20:10', inner.seen75, 10, 10],
  ['08:10', inner.clean75, 11, 25],
  ['16:10 20:10', inner.seen75, 11, 11],
  ['12:10', inner.seen75, 11, 12],
  ['00:10 04:10', inner.seen75, 11, 12],
  ['14:10 20:10', inner.seen75, 12, 24],
  ['02:10', inner.seen75, 13, 25],
  // The third, of day 25, as well.
  ['16:10 20:10', inner.seen7, 25, 26],
  ['12:10', inner.seen7, 25, 27],
  ['08:10', inner.clean7, 26, 28],
  ['00:10 04:10', inner.seen7, 26, 27],
  ['14:10 20:10', inner.seen7, 27, 27],
  ['02:10', inner.seen7, 28, 28],
]
