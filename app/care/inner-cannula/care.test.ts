import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf, windowOf } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { replacedWithNew } from './examples.ts'
import { innerCannula } from './kind.ts'
import { type InnerCannulaData, innerCannulaActs } from './schema.ts'

function aTubeIn(innerCannula: TubeData['innerCannula'], when = '2026-03-02 10:00'): StoredEntry {
  return anEntry(tubeChanges, when, aTube({ innerCannula }))
}

function anAct(when: string, act: InnerCannulaData['act'] = 'replaced'): StoredEntry {
  const outcome = act === 'unable' ? { whyUnable: 'stuck', locked: undefined } : {}
  return anEntry(innerCannulaActs, when, { ...replacedWithNew, ...outcome, act } as InnerCannulaData)
}

type Task = 'inner-cannula-change' | 'inner-cannula-clean'

const due = (task: Task, entries: readonly StoredEntry[], now = '12:00', about = {}) =>
  windowOf(innerCannula, task, aContext(entries, now, about)).dueAt

const clock = (task: Task, entries: readonly StoredEntry[]) => clockOf(innerCannula, task, aContext(entries, '12:00'))

test('never replaced, a disposable one is due twelve hours after the tube went in', () => {
  expect(due('inner-cannula-change', [aTubeIn('disposable', '07:30')])).toEqual(at('19:30'))
})

test('never cleaned, a reusable one is due a day after the tube went in', () => {
  expect(due('inner-cannula-clean', [aTubeIn('reusable', '07:30')])).toEqual(at('2026-03-11 07:30'))
})

test('replaced at 06:00, a disposable one is due at 18:00, on time from 17:00 to 19:00, seriously overdue after 22:00', () => {
  const context = aContext([aTubeIn('disposable'), anAct('06:00')], '12:00')
  expect(windowOf(innerCannula, 'inner-cannula-change', context)).toMatchObject({
    dueAt: at('18:00'),
    opensAt: at('17:00'),
    closesAt: at('19:00'),
    seriousAt: at('22:00'),
  })
})

test('cleaned at 06:00, a reusable one is due at 06:00, on time for two hours around it, seriously overdue after 18:00', () => {
  const context = aContext([aTubeIn('reusable'), anAct('06:00', 'cleaned')], '12:00')
  expect(windowOf(innerCannula, 'inner-cannula-clean', context)).toMatchObject({
    dueAt: at('2026-03-11 06:00'),
    soonAt: at('2026-03-11 02:00'),
    opensAt: at('2026-03-11 04:00'),
    closesAt: at('2026-03-11 08:00'),
    seriousAt: at('2026-03-11 18:00'),
  })
})

test.each(['06:00', '17:59', '18:00', '18:01'])('asked at %s the due time of a change is the same', now => {
  expect(due('inner-cannula-change', [aTubeIn('disposable'), anAct('06:00')], now)).toEqual(at('18:00'))
})

test.each<[InnerCannulaData['act'], string]>([
  ['replaced', '21:00'],
  ['swapped', '18:00'],
  ['cleaned', '18:00'],
  ['inspected', '18:00'],
  ['unable', '18:00'],
])('a disposable one charted as %s at 09:00 is due at %s', (act, when) => {
  expect(due('inner-cannula-change', [aTubeIn('disposable'), anAct('06:00'), anAct('09:00', act)])).toEqual(at(when))
})

test.each<[InnerCannulaData['act'], string]>([
  ['replaced', '09:00'],
  ['swapped', '09:00'],
  ['cleaned', '09:00'],
  ['inspected', '06:00'],
  ['unable', '06:00'],
])('a reusable one charted as %s at 09:00 is due the next day at %s', (act, when) => {
  const entries = [aTubeIn('reusable'), anAct('06:00', 'cleaned'), anAct('09:00', act)]
  expect(due('inner-cannula-clean', entries)).toEqual(at(`2026-03-11 ${when}`))
})

test('a corrected act counts at its corrected time', () => {
  const wrong = anAct('09:00')
  const corrected = aCorrection(wrong, innerCannulaActs, '08:00', replacedWithNew)
  expect(due('inner-cannula-change', [aTubeIn('disposable'), wrong, corrected])).toEqual(at('20:00'))
})

test('a change of the whole tube sets the clock back', () => {
  expect(due('inner-cannula-change', [aTubeIn('disposable'), anAct('06:00'), aTubeIn('disposable', '09:00')])).toEqual(
    at('21:00'),
  )
})

test('each kind of inner cannula has its own task', () => {
  expect(clock('inner-cannula-clean', [aTubeIn('disposable')])).toEqual({ state: 'none' })
  expect(clock('inner-cannula-change', [aTubeIn('reusable')])).toEqual({ state: 'none' })
})

test('a tube that went in without one takes its task from the first that was fitted', () => {
  const bare = aTubeIn('none')
  expect(clock('inner-cannula-change', [bare])).toEqual({ state: 'none' })
  expect(due('inner-cannula-change', [bare, anAct('06:00', 'replaced')])).toEqual(at('18:00'))
  expect(due('inner-cannula-clean', [bare, anAct('06:00', 'swapped'), anAct('09:00', 'replaced')])).toEqual(
    at('2026-03-11 09:00'),
  )
})

test('a care plan overrides the interval of a change and of a clean', () => {
  const personal = { 'inner-cannula-disposable-interval': 6, 'inner-cannula-reusable-interval': 12 }
  expect(due('inner-cannula-change', [aTubeIn('disposable'), anAct('06:00')], '12:00', { personal })).toEqual(
    at('12:00'),
  )
  expect(due('inner-cannula-clean', [aTubeIn('reusable'), anAct('06:00', 'cleaned')], '12:00', { personal })).toEqual(
    at('18:00'),
  )
})

test('across the spring change of clocks a change stays twelve elapsed hours away', () => {
  const entries = [aTubeIn('disposable'), anAct('2026-03-28 22:00')]
  expect(due('inner-cannula-change', entries, '2026-03-29 08:00')).toEqual(at('2026-03-29 11:00'))
})

test('both are suspended for a single-cannula tube and after the tube is out for good', () => {
  const single = anEntry(
    tubeChanges,
    '08:00',
    aTube({ construction: 'single', innerCannula: undefined, idWithInner: undefined }),
  )
  const removed = [aTubeIn('disposable'), aRemoval('11:00')]
  for (const task of ['inner-cannula-change', 'inner-cannula-clean'] as const) {
    expect(clock(task, [single])).toEqual({ state: 'suspended', because: 'single-cannula tube' })
    expect(clock(task, removed)).toEqual({ state: 'suspended', because: 'tube out for good since 10-Mar-2026' })
    expect(clock(task, [])).toEqual({ state: 'none' })
  }
})
