import { expect, test } from 'vitest'
import { type Board, boardCounts, livePatients } from './board.ts'
import type { TaskView } from './views.ts'
import { standingWords } from './words.ts'

const ms = (time: string) => new Date(`2026-03-10T${time}:00Z`).getTime()

function aTask(name: string, closes: string, more: Partial<TaskView> = {}): TaskView {
  const window = {
    dueAt: ms(closes) - 3_600_000,
    soonAt: ms(closes) - 7_200_000,
    opensAt: ms(closes) - 7_200_000,
    closesAt: ms(closes),
    seriousAt: ms(closes) + 3 * 3_600_000,
  }
  return { kind: 'k', name, title: name, lane: 'Cuff', airway: true, chartWords: 'Chart', window, ...more }
}

function aBoard(beds: Readonly<Record<string, readonly TaskView[]>>): Board {
  return {
    wardId: 'w',
    wardName: 'Alder',
    zone: 'Europe/London',
    shiftEndsAt: ms('15:00'),
    policy: 'Policy',
    toCountersign: 0,
    patients: Object.entries(beds).map(([bed, tasks]) => ({
      patientId: bed,
      bed,
      familyName: bed,
      givenName: 'A',
      age: 60,
      recordNumber: bed,
      laryngectomy: false,
      care: { tasks, marks: [], running: [], warnings: [] },
    })),
  }
}

test('the longest late stands first, then what is due, then the rest by bed', () => {
  const board = aBoard({
    A10: [],
    A2: [],
    B1: [aTask('b', '13:30')],
    C1: [aTask('c', '12:30')],
    D1: [aTask('d', '14:30')],
  })
  expect(livePatients(board, ms('14:00'), 'pressing').map(({ bed }) => bed)).toEqual(['C1', 'B1', 'D1', 'A2', 'A10'])
})

test('beds are sorted as people count them', () => {
  const board = aBoard({ A10: [aTask('late', '08:00')], A2: [], A1: [] })
  expect(livePatients(board, ms('14:00'), 'bed').map(({ bed }) => bed)).toEqual(['A1', 'A2', 'A10'])
})

test('a red warning stands before any lateness', () => {
  const board = aBoard({ A1: [aTask('late', '08:00')], B1: [] })
  const [first, second] = board.patients
  if (!first || !second) throw new Error('two patients were made')
  const red = { level: 'red', name: 'bleeding', action: 'Call for help now.', risesAt: null } as const
  const patients = [first, { ...second, care: { ...second.care, warnings: [red] } }]
  expect(livePatients({ ...board, patients }, ms('14:00'), 'pressing')[0]?.bed).toBe('B1')
})

test('a warning that nobody has seen in time rises, amber above late care and red above everything', () => {
  const board = aBoard({ A1: [aTask('late', '08:00')], B1: [], C1: [], D1: [] })
  const [late, amber, red, seen] = board.patients
  if (!late || !amber || !red || !seen) throw new Error('four patients were made')
  const warned = (patient: typeof late, level: 'red' | 'amber', risesAt: number | null) => ({
    ...patient,
    care: { ...patient.care, warnings: [{ level, name: 'w', action: 'Act.', risesAt }] },
  })
  const patients = [
    late,
    warned(amber, 'amber', ms('14:00')),
    warned(red, 'red', ms('14:00')),
    warned(seen, 'red', null),
  ]
  const order = (time: string) => livePatients({ ...board, patients }, ms(time), 'pressing').map(({ bed }) => bed)
  expect(order('13:59')).toEqual(['C1', 'D1', 'A1', 'B1'])
  expect(order('14:00')).toEqual(['C1', 'D1', 'B1', 'A1'])
})

test('the same board at a later moment is late without being served again', () => {
  const board = aBoard({ A1: [aTask('cuff', '13:30')] })
  expect(livePatients(board, ms('13:30'), 'bed')[0]?.worst).toBe('due')
  expect(livePatients(board, ms('13:31'), 'bed')[0]?.worst).toBe('overdue')
  expect(livePatients(board, ms('16:31'), 'bed')[0]?.worst).toBe('seriously overdue')
})

test('the numbers above the board count each task once', () => {
  const board = aBoard({
    A1: [aTask('a', '13:30'), aTask('b', '14:30')],
    B1: [aTask('c', '17:30'), aTask('d', '15:59')],
  })
  const patients = livePatients(board, ms('14:00'), 'bed')
  expect(boardCounts(patients, board.shiftEndsAt)).toEqual({
    overdue: 1,
    due: 2,
    thisShift: 0,
    tubesNearLimit: 0,
    warned: 0,
  })
})

test.each([
  ['14:00', '30 min late'],
  ['13:00', 'due by 13:30'],
  ['11:00', 'due 12:30'],
])('at %s a window that closes 13:30 is told as %s', (now, words) => {
  const task = livePatients(aBoard({ A1: [aTask('cuff', '13:30')] }), ms(now), 'bed')[0]?.tasks[0]
  if (!task) throw new Error('a task was made')
  expect(standingWords(task, ms(now), 'Europe/London')).toBe(words)
})

test('a deferred task tells its new time, and a suspended one that it rests', () => {
  const deferred = aTask('cuff', '17:00', { deferredUntil: ms('16:00') })
  const { window: _, ...suspended } = aTask('inner', '17:00')
  const tasks = livePatients(aBoard({ A1: [deferred, suspended] }), ms('14:00'), 'bed')[0]?.tasks ?? []
  expect(tasks.map(task => standingWords(task, ms('14:00'), 'Europe/London'))).toEqual([
    'deferred to 16:00',
    'suspended',
  ])
})
