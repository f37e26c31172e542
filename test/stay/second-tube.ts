import type { Moment } from './moment.ts'

const injury = 'amber pressure-injury, raised 09:00, seen 10:00, acted on 11:00'

/*
 * The second tube went in on day 10, the 15th of October, at 10:30, with a label of 14 days: to be changed by the 29th. From day 14 at
 * 11:50 the second version of the policy is in force: inner cannula looked at every 6 h, cuff up to 25 cmH2O.
 */
export const secondTube: readonly Moment[] = [
  {
    ...{ day: 12, time: '10:55', what: 'in a trial the cuff is not measured, and observations come every 15 min' },
    // Cuff down at 10:00. Observed 10:15 and 10:30: due 10:45, a quarter of 15 min either side, to 10:48:45. Inner cannula 08:10, at
    // 45 h 40 min of this tube: due 12:10, opens 11:10.
    board: ['Observations: overdue, 6 min late'],
    running: ['Cuff trial 55 min'],
    suspended: ['Cuff pressure check'],
    warnings: [injury],
    why: {
      'cuff-pressure-check': { says: 'Cuff is down.' },
      observations: { says: 'A cuff deflation trial runs.', last: 'Last on 17-Oct-2026 10:30 by Dana Day.' },
    },
  },
  {
    ...{ day: 12, time: '11:15', what: 'a trial that failed: inflated, and measured within 15 min' },
    // 28 breaths at 11:00: 18 before the trial and half as many again are 27, and 25 is an extreme. Stopped and inflated at 11:05: cuff by
    // 11:20. Observations are 4-hourly again, from 11:00. Suction 08:05, mouth 08:06, inner cannula 08:10: 4 h on, to 60 min later.
    board: [
      'Cuff pressure check: due, due by 11:20',
      'Suction need: due, due by 13:05',
      'Oral care: due, due by 13:06',
      'Inner cannula inspection: due, due by 13:10',
    ],
    running: [],
    suspended: [],
    unseen: ['observations-extreme'],
    warnings: [injury, 'amber observations-extreme, raised 11:00, rises 11:15'],
    why: {
      'cuff-pressure-check': {
        says: 'The cuff was inflated.',
        values: { 'Cuff pressure check after inflation, tube change, arrival, turn or transfer within': '15 min' },
      },
    },
  },
  {
    ...{ day: 13, time: '21:35', what: 'a late entry never moves a clock back' },
    // Looked at 14:10. At 18:00 a look of 10:00 is written down: still due 22:10, window 21:10 to 23:10.
    board: ['Inner cannula inspection: due, due by 23:10'],
    unseen: [],
    warnings: [injury],
    why: { 'inner-cannula-inspection': { last: 'Last on 18-Oct-2026 14:10 by Dana Day.' } },
  },
  {
    ...{ day: 14, time: '12:10', what: 'a new version judges what stands, not what was done' },
    // 28 cmH2O at 08:20, in the band of 20 to 30. In force from 11:50: up to 25, so to be measured again within 30 min of that. The
    // act raised no warning as it was done; the warning that stands now asks at once. Inner cannula 08:10, 6 h: opens 13:10.
    board: ['Cuff pressure check: due, due by 12:20'],
    unseen: ['cuff-high'],
    warnings: ['amber cuff-high, raised by no act, rises 12:10', injury],
    why: {
      'cuff-pressure-check': {
        says: 'The last reading was left out of the band.',
        policy: 'Tracheostomy care, version 2, reviewed by Cleo Charge, charge nurse on 19-Oct-2026.',
        values: { 'Cuff pressure, upper limit': '25 cmH2O' },
      },
      'inner-cannula-inspection': { values: { 'Inner cannula looked at every': '6 h' } },
    },
  },
  {
    ...{ day: 15, time: '17:50', what: 'a corrected entry changes what is due' },
    // Charted as 14:10, due 20:10; corrected to 12:40: due 18:40, window 17:40 to 19:40. The injury had healed at 09:00. A trial is
    // planned for day 16.
    board: ['Inner cannula inspection: due, due by 19:40', 'Planned trial: due soon, due tomorrow'],
    warnings: [],
    why: { 'inner-cannula-inspection': { last: 'Last on 20-Oct-2026 12:40 by Dana Day.' } },
  },
  {
    ...{ day: 15, time: '18:05', what: 'an entry that was taken back counts for nothing' },
    // Back to the look of 08:10: due 14:10, window to 15:10; seriously overdue only after 18:10.
    board: ['Inner cannula inspection: overdue, 2 h 55 min late', 'Planned trial: due soon, due tomorrow'],
    warnings: [],
    why: { 'inner-cannula-inspection': { last: 'Last on 20-Oct-2026 08:10 by Dana Day.' } },
  },
  {
    ...{ day: 17, time: '10:30', what: 'a trial of 24 h is passed; a change is announced 7 days ahead' },
    // The 22nd: 7 days to the 29th. The cuff stays down. Observed 10:00, trial over at 10:05: next at 14:00.
    board: ['Tube change: due soon, by 29-Oct-2026'],
    running: [],
    suspended: ['Cuff pressure check'],
    unseen: [],
    warnings: ['blue tube-near-limit, raised by no act'],
    why: {
      'tube-change': { last: 'By date: 29-Oct-2026.', says: 'Longest use on the label: 14 days.' },
    },
  },
  {
    ...{ day: 20, time: '02:30', what: 'a night with an hour more counts hours, not the clock' },
    // Looked at 20:10 summer time, 19:10 UTC, every 6 h: due 01:10 UTC, window to 02:10 UTC, which the clock shows as 02:10. Round of
    // midnight, 23:00 UTC: 03:00, 03:05, 03:06 UTC, each from 60 min before to 60 min after. Daily care opens from 03:00 UTC on.
    board: [
      'Inner cannula inspection: overdue, 20 min late',
      'Observations: due, due by 04:00',
      'Suction need: due, due by 04:05',
      'Oral care: due, due by 04:06',
      'Tube change: due soon, by 29-Oct-2026',
    ],
    warnings: ['blue tube-near-limit, raised by no act'],
    why: { 'inner-cannula-inspection': { last: 'Last on 24-Oct-2026 20:10 by Noel Night.' } },
  },
  {
    ...{ day: 22, time: '17:30', what: 'two days ahead the announcement is amber' },
    // The 27th.
    board: ['Tube change: due soon, by 29-Oct-2026'],
    unseen: ['tube-near-limit'],
    warnings: ['amber tube-near-limit, raised by no act, rises 17:30'],
  },
  {
    ...{ day: 24, time: '17:30', what: 'the limit day, with the change planned for the day after' },
    // The 29th. Seen at 17:00, which holds for a day. The plan of 17:10 has everything but the fasting, which is arranged.
    board: ['Tube change: due, due today', 'Planned tube change: due soon, due tomorrow'],
    unseen: [],
    warnings: ['amber tube-near-limit, raised by no act, seen 17:00', 'blue tube-plan-not-ready, raised by no act'],
  },
  {
    ...{ day: 25, time: '10:30', what: 'the day after it the tube is past its limit' },
    // The 30th, day 15 of 14: another warning, which nobody has seen. Seriously overdue from the 31st. On its day a plan that still waits
    // for the fasting is amber.
    board: ['Tube change: overdue, 1 day late', 'Planned tube change: due, due today'],
    unseen: ['tube-past-limit', 'tube-plan-not-ready'],
    warnings: [
      'amber tube-past-limit, raised by no act, rises 10:30',
      'amber tube-plan-not-ready, raised by no act, rises 10:30',
    ],
  },
]
