import type { Moment } from './moment.ts'

/* The third tube came out for good on day 28, the 2nd of November, at 10:00: 48 h end on the 4th at 10:00. */
export const afterRemoval: readonly Moment[] = [
  {
    ...{ day: 28, time: '10:15', what: 'removal ends every clock of the tube, and observations begin' },
    // First set at 15 min, a quarter of that either side: 10:11:15 to 10:18:45. The opening is looked at within 24 h.
    board: ['Observations after removal: due, due by 10:18'],
    running: [],
    unseen: [],
    warnings: ['blue after-removal, raised by no act'],
    why: {
      'suction-need': { last: 'Its clock stands still.', says: 'Tube out for good since 02-Nov-2026.' },
      'tube-change': { says: 'Tube out for good since 02-Nov-2026.' },
      'inner-cannula-inspection': { says: 'Tube out for good since 02-Nov-2026.' },
      'observations-after-removal': {
        last: 'Not charted yet; counted from 02-Nov-2026 10:00.',
        values: { 'After removal, observations go on for': '48 h' },
      },
    },
  },
  {
    ...{ day: 30, time: '09:30', what: 'within 48 h the last set is asked for' },
    // Sets at 15, 30, 45, 60, 90, 120 min, then hourly to 6 h, then every 4 h: 20:00, 00:00, 04:00, 08:00 and so on, the last at 46 h,
    // on day 30 at 08:00, window to 09:00. The opening was looked at on day 29 at 09:00: due 09:00, window to 11:00.
    board: ['Observations after removal: overdue, 30 min late', 'Stoma inspection: due, due by 11:00'],
    unseen: [],
    warnings: ['blue after-removal, raised by no act'],
  },
  {
    ...{ day: 30, time: '11:05', what: 'after 48 h nothing of the tube is left to do' },
    // Nothing stands from 10:00 on, and a set that was missed is asked for until 11:00. The opening was seen closed at 10:30.
    board: [],
    unseen: [],
    warnings: [],
    why: { 'stoma-inspection': { says: 'Opening closed on 04-Nov-2026.' } },
  },
]
