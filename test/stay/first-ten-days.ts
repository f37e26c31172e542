import type { Moment } from './moment.ts'

/*
 * Intervals of the first version, the product's own numbers: inner cannula looked at every 8 h, every 4 h in the first 48 h of a tube,
 * within 2 h of a block; disposable one new every 12 h; cuff 8 h; observations, need for suction and mouth 4 h; teeth 12 h; dressing,
 * ties and exchanger 24 h; stoma, ties, humidity, red flags and kit once in each shift, 07:00 to 19:00 to 07:00. From 4 h on a window
 * is 60 min to either side, from 24 h on 120 min; care by the hour is due soon as its window opens, from 24 h on 4 h before.
 */
export const firstTenDays: readonly Moment[] = [
  {
    ...{ day: 0, time: '17:40', what: 'in its first 48 h an inner cannula is looked at every 4 h' },
    // Looked at 12:10, two hours after the tube went in: due 16:10, window to 17:10. Everything else was done since 16:00.
    board: ['Inner cannula inspection: overdue, 30 min late'],
    warnings: [],
    why: {
      'inner-cannula-inspection': {
        last: 'Last on 05-Oct-2026 12:10 by Dana Day.',
        says: 'First 48 h of this tube.',
        policy: 'Tracheostomy care, version 1, reviewed by M. Osei on 01-Sep-2026.',
        values: {
          'Inner cannula looked at every': '8 h',
          'Inner cannula of a newly inserted tube looked at every': '4 h',
          'A tube counts as newly inserted for': '48 h',
          'Inner cannula looked at again after a heavy coating or a block, within': '2 h',
        },
      },
    },
  },
  {
    ...{ day: 2, time: '19:30', what: 'after 48 h every 8 h, and a new shift begins' },
    // The tube went in on day 0 at 10:00. Looked at on day 2 at 12:10, at 50 h 10 min: due 20:10, window 19:10 to 21:10.
    // Since the round of 16:00: 20:00, 20:05, 20:06, each to 60 min later. Teeth 08:06 and a new cannula 08:10 of this day, 12 h on.
    // The night began at 19:00; its kit was seen at 19:15, the rest has until 07:00. Cuff 16:20: due 00:20, opens 23:20.
    board: [
      'Observations: due, due by 21:00',
      'Suction need: due, due by 21:05',
      'Oral care: due, due by 21:06',
      'Tooth brushing: due, due by 21:06',
      'Inner cannula change: due, due by 21:10',
      'Inner cannula inspection: due, due by 21:10',
      'Humidification check: due, due by tomorrow 07:00',
      'Red flags: due, due by tomorrow 07:00',
      'Stoma inspection: due, due by tomorrow 07:00',
      'Ties check: due, due by tomorrow 07:00',
    ],
    warnings: [],
    why: { 'inner-cannula-inspection': { last: 'Last on 07-Oct-2026 12:10 by Dana Day.' } },
  },
  {
    ...{ day: 4, time: '11:30', what: 'what is put off stays in sight, and only that' },
    // Dressing and ties changed on day 3 at 09:00: due 09:00, window to 11:00. The dressing is put off by 4 h at 09:00, to 13:00; the ties
    // are not. Round of 08:00: 12:00, 12:05, 12:06, each to 60 min later. The look at stoma and ties has until 19:00.
    board: [
      'Ties change: overdue, 30 min late',
      'Observations: due, due by 13:00',
      'Suction need: due, due by 13:05',
      'Oral care: due, due by 13:06',
      'Stoma inspection: due, due by 19:00',
      'Ties check: due, due by 19:00',
      'Dressing change: deferred, deferred to 13:00',
    ],
    warnings: [],
    why: { 'dressing-change': { says: 'Deferred to 09-Oct-2026 13:00 by Dana Day.' } },
  },
  {
    ...{ day: 5, time: '13:25', what: 'a catheter that will not pass is red, and rises after a minute' },
    // Charted 13:20: seen by nobody at 13:21. After use the kit is looked at within 30 min. The look at the need for suction of 12:05
    // still counts, to 17:05.
    board: ['Bedside kit check: due, due by 13:50'],
    unseen: ['suction-will-not-pass'],
    warnings: ['red suction-will-not-pass, raised 13:20, rises 13:21'],
  },
  {
    ...{ day: 5, time: '15:40', what: 'a blocked inner cannula is looked at again within two hours' },
    // Blocked at 13:30, a new one in: due by 15:30, with no window beyond. The catheter passed at 13:35: next look for suction 17:35,
    // opens 16:35. Observations 12:00 and mouth 12:06: to 17:00, 17:06. Cuff 08:20: due 16:20, window 15:20 to 17:20.
    board: [
      'Inner cannula inspection: overdue, 10 min late',
      'Observations: due, due by 17:00',
      'Oral care: due, due by 17:06',
      'Cuff pressure check: due, due by 17:20',
    ],
    unseen: ['inner-cannula-narrowed'],
    // Amber rises 15 min after it was charted.
    warnings: ['amber inner-cannula-narrowed, raised 13:30, rises 13:45'],
    why: { 'inner-cannula-inspection': { says: 'It was blocked at the last check.' } },
  },
  {
    ...{ day: 6, time: '12:10', what: 'a second block within 24 h, seen, acted on and settled' },
    // Blocked day 5 at 13:30 and day 6 at 10:20: 20 h 50 min apart. To be looked at again by 12:20. Sutures are due on day 7, tomorrow.
    board: ['Inner cannula inspection: due, due by 12:20', 'Suture removal: due soon, due tomorrow'],
    unseen: ['inner-cannula-narrowed'],
    warnings: [
      'amber inner-cannula-narrowed, raised 10:20, rises 10:35',
      'amber inner-cannula-repeat-block, raised 10:20, seen 10:45, acted on 11:30, settled 12:00',
    ],
    why: {
      'inner-cannula-repeat-block': {
        values: { 'A second block asks for the specialist when it comes within': '24 h' },
      },
    },
  },
  {
    ...{ day: 7, time: '17:30', what: 'sutures are due on day 7, and a first change may come from day 7 to day 10' },
    // Day 7 is the 12th of October; percutaneous: from day 7, target day 10, the 15th.
    board: ['Suture removal: due, due today', 'First tube change: due soon, by 15-Oct-2026'],
    warnings: [],
    why: {
      'first-tube-change': {
        last: 'By date: 15-Oct-2026.',
        says: 'First change from day 7, by day 10 after insertion. An experienced operator, with airway help at hand.',
      },
      'suture-removal': { values: { 'Flange sutures out by': '7 days' } },
    },
  },
  {
    ...{ day: 8, time: '14:05', what: 'a leak with air added twice in 12 h is red; sutures past day 7 are amber' },
    // Air added at 06:00 and 14:00, 8 h apart, 3.5 mL; a leak is heard. Red rises at 14:01, the amber of the same act at 14:15; the sutures
    // were raised by no act and ask at once. Gauge read 14:00, in the band.
    board: ['Suture removal: overdue, 1 day late', 'First tube change: due soon, by 15-Oct-2026'],
    unseen: ['cuff-leak-displacement', 'sutures-past-day'],
    warnings: [
      'red cuff-leak-displacement, raised 14:00, rises 14:01',
      'amber cuff-repeated-leak, raised 14:00, rises 14:15',
      'amber sutures-past-day, raised by no act, rises 14:05',
    ],
    why: {
      'cuff-repeated-leak': {
        values: {
          'Air added this often asks for a review': '2 times',
          'Air added asks for a review above, in all': '3 mL',
          'Air added is counted over the last': '12 h',
        },
      },
    },
  },
  {
    ...{ day: 9, time: '09:20', what: 'a new pressure injury of stage 2 asks for somebody' },
    // Found at 09:00, with fresh dressing and ties. Exchanger of day 8 at 09:30: due 09:30, window to 11:30. Humidity has until 19:00.
    board: [
      'HME change: due, due by 11:30',
      'Humidification check: due, due by 19:00',
      'First tube change: due soon, due tomorrow',
    ],
    unseen: ['pressure-injury'],
    warnings: ['amber pressure-injury, raised 09:00, rises 09:15'],
  },
  {
    ...{ day: 10, time: '10:40', what: 'a tube change begins every clock anew, and asks for cuff and kit' },
    // Changed 10:30: cuff within 15 min, kit within 30, though the kit was whole at 07:15; inner cannula and suction 14:30. The injury of
    // day 9 was answered then, and seen again since without being new.
    board: ['Cuff pressure check: due, due by 10:45', 'Bedside kit check: due, due by 11:00'],
    unseen: [],
    warnings: ['amber pressure-injury, raised 09:00, seen 10:00, acted on 11:00'],
    why: {
      'cuff-pressure-check': { says: 'The tube was changed.' },
      'bedside-kit-check': { says: 'The tube was changed.' },
    },
  },
]
