import { expect, test } from 'vitest'
import { intervalClock, promptClock, shiftClock } from '../care/clock.ts'
import { freeNote } from '../care/free-note/kind.ts'
import type { StoredEntry, TaskRule, WardFacts } from '../care/kind.ts'
import { careTasks } from '../care/kinds.ts'
import { aContext, anEntry, aPolicy, at } from '../care/make.ts'
import { numberSetting } from '../care/policy.ts'
import { hours, minutes } from '../time/duration.ts'
import { wardLoad } from './what-if.ts'

const every = numberSetting({
  name: 'turn-interval',
  label: 'Turned every',
  unit: 'h',
  default: 8,
  min: 1,
  max: 24,
  personal: true,
  affects: 'Turning.',
  source: { says: 'No published number', standing: 'product proposal' },
})

const about = { airway: false, settings: [every], says: () => 'Turn.' }

const turning: TaskRule = {
  ...about,
  name: 'turning',
  clock: ({ record, values }) =>
    intervalClock({
      values,
      last: record.latest(freeNote),
      start: record.admittedAt,
      interval: hours(values.of(every)),
    }),
}

const oncePerShift: TaskRule = {
  ...about,
  name: 'look',
  clock: ({ record, ward, values }) =>
    shiftClock({ values, last: record.latest(freeNote), start: record.admittedAt, ward }),
}

const ward: WardFacts = { zone: 'Europe/London', shiftTimes: ['07:00', '15:00', '23:00'], pressureUnit: 'cmH2O' }

const note = (when: string) => anEntry(freeNote, when, { words: 'Turned' })

interface Run {
  readonly rule: TaskRule
  readonly entries: readonly StoredEntry[]
  readonly values?: Readonly<Record<string, number>>
  readonly from?: string
  readonly to?: string
}

function load({ rule, entries, values = {}, from = '2026-03-10 07:00', to = '2026-03-11 07:00' }: Run) {
  const { record } = aContext(entries, '12:00', { admittedAt: '2026-03-10 07:00' })
  return wardLoad({
    stays: [{ record, from: record.admittedAt, until: at('2026-04-01 00:00') }],
    policy: aPolicy(values),
    ward,
    from: at(from),
    to: at(to),
    tasks: [{ kind: freeNote, rule }],
  })
}

// Admitted at 07:00 and turned at 15:00, 23:30 and 06:00: every 8 h with an hour's tolerance all are in time.
const threeTurns = [note('15:00'), note('23:30'), note('2026-03-11 06:00')]

test.each([
  // interval, tasks in 24 h, late
  [8, 3, 0],
  [12, 2, 0],
  // every 6 h: 15:00 comes after 14:00 and 23:30 after 22:00; 06:00 is in time for 05:30 and an hour
  [6, 4, 2],
  [4, 6, 3],
])('turned every 8 h or so, an interval of %i h asks for %i and finds %i late', (interval, tasks, late) => {
  const { total, byTask } = load({ rule: turning, entries: threeTurns, values: { [every.name]: interval } })
  expect(total).toEqual({ tasks, late })
  expect([...byTask.keys()]).toEqual(['Turning'])
})

test.each([
  // 15:00 comes after 14:00 for a tolerance of an hour, not after 15:00; 23:30 after 22:00 and after 23:00
  [60, 2],
  [120, 1],
  [15, 3],
])('a draft that gives every 6 h a tolerance of %i min finds %i late, and asks for the same', (tolerance, late) => {
  const values = { [every.name]: 6, 'lateness-middle-tolerance': tolerance }
  expect(load({ rule: turning, entries: threeTurns, values }).total).toEqual({ tasks: 4, late })
})

test('tasks and lateness belong to the shift that they fall due in', () => {
  const { byShift } = load({ rule: turning, entries: threeTurns, values: { [every.name]: 6 } })
  // due 13:00, 19:00, 01:00 and 07:00; late after 14:00 and after 22:00
  expect([...byShift]).toEqual([
    ['Shift from 07:00', { tasks: 1, late: 1 }],
    ['Shift from 15:00', { tasks: 1, late: 1 }],
    ['Shift from 23:00', { tasks: 2, late: 0 }],
  ])
})

test('once a shift: a shift without it is late, two in one shift are one', () => {
  const entries = [note('08:00'), note('09:00'), note('23:30')]
  const { total, byShift } = load({ rule: oncePerShift, entries })
  expect(total).toEqual({ tasks: 2, late: 1 })
  expect(byShift.get('Shift from 15:00')).toEqual({ tasks: 1, late: 1 })
})

test('what nobody did at all is late once, until it is done', () => {
  expect(load({ rule: turning, entries: [] }).total).toEqual({ tasks: 3, late: 1 })
})

test('what was late before the time looked at is not counted again', () => {
  const entries = [note('2026-03-11 08:00')]
  const { total } = load({ rule: turning, entries, from: '2026-03-11 07:00', to: '2026-03-12 07:00' })
  // done at 08:00, due again at 16:00 and late from 17:00
  expect(total).toEqual({ tasks: 3, late: 1 })
})

test('care that an event asks for counts once, when it is done', () => {
  const afterEvent: TaskRule = {
    ...about,
    name: 'check-after-event',
    clock({ record, values }) {
      const last = record.latest(freeNote)
      const event = at('2026-03-10 10:00')
      return last && last.performedAt > event
        ? { state: 'none' }
        : promptClock({ values, event, within: minutes(15), last, because: 'the patient came' })
    },
  }
  expect(load({ rule: afterEvent, entries: [note('10:10')] }).total).toEqual({ tasks: 1, late: 0 })
  expect(load({ rule: afterEvent, entries: [note('10:20')] }).total).toEqual({ tasks: 1, late: 1 })
})

test("a patient's own value counts under either policy", () => {
  const { record } = aContext(threeTurns, '12:00')
  const asked = {
    ward,
    from: at('2026-03-10 07:00'),
    to: at('2026-03-11 07:00'),
    tasks: [{ kind: freeNote, rule: turning }],
  }
  const stays = [{ record, from: at('2026-03-10 07:00'), until: at('2026-03-11 07:00') }]
  const loads = [8, 6].map(
    hoursEach => wardLoad({ ...asked, stays, policy: aPolicy({ [every.name]: hoursEach }) }).total,
  )
  expect(loads[0]).not.toEqual(loads[1])
})

test('a child on a ward without rules for children is counted apart', () => {
  const { record } = aContext(threeTurns, '12:00', { patient: { bornOn: '2015-06-01' } })
  const stays = [{ record, from: at('2026-03-10 07:00'), until: at('2026-03-11 07:00') }]
  const result = wardLoad({ stays, policy: aPolicy(), ward, from: at('2026-03-10 07:00'), to: at('2026-03-11 07:00') })
  expect(result).toMatchObject({ total: { tasks: 0, late: 0 }, withoutRules: 1, clocksRead: 0 })
})

test('clocks are read by entries, not by minutes', () => {
  const entries = Array.from({ length: 14 * 6 }, (_, i) => note(`2026-03-${10 + Math.floor(i / 6)} 0${i % 6}:30`))
  const { record } = aContext(entries, '2026-03-24 07:00', { admittedAt: '2026-03-10 00:00' })
  const { clocksRead } = wardLoad({
    stays: [{ record, from: record.admittedAt, until: at('2026-03-24 07:00') }],
    policy: aPolicy(),
    ward,
    from: at('2026-03-10 07:00'),
    to: at('2026-03-24 07:00'),
  })
  // None of the rules asks for a note: once each, and what asks for the time in each of 42 shifts.
  expect(clocksRead).toBeLessThanOrEqual(careTasks.length * (42 + 1))
  // From 07:00 and at each of three turns.
  expect(load({ rule: turning, entries: threeTurns }).clocksRead).toBe(4)
})

test('a clock that asks for the time is read at the start of each shift as well', () => {
  const onlyLater: TaskRule = {
    ...about,
    name: 'later',
    clock: context => (context.now < at('2026-03-10 20:00') ? { state: 'none' } : turning.clock(context)),
  }
  // At 07:00, 15:00, 23:00; the last read finds what fell due at 15:00 late.
  expect(load({ rule: onlyLater, entries: [] })).toMatchObject({ clocksRead: 3, total: { late: 0 } })
  expect(load({ rule: onlyLater, entries: [note('08:00')] }).clocksRead).toBe(3)
})
