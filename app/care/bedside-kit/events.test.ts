import { expect, test } from 'vitest'
import { clearedBlock } from '../adverse-event/examples.ts'
import { type AdverseEventData, adverseEvents } from '../adverse-event/schema.ts'
import type { BedMove, StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { plainSuction } from '../suction/examples.ts'
import { suctions } from '../suction/schema.ts'
import { transfers } from '../transfer-checklist/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { wholeKit } from './examples.ts'
import { bedsideKit } from './kind.ts'
import { kitChecks } from './schema.ts'

const tube = (when = '2026-03-02 10:00', data = {}) => anEntry(tubeChanges, when, aTube(data))
const whole = (when: string) => anEntry(kitChecks, when, wholeKit)
const accident = (when: string, data: Partial<AdverseEventData> = {}) =>
  anEntry(adverseEvents, when, { ...clearedBlock, ...data })
const arrival = (when: string, place: string) =>
  anEntry(transfers, when, { moment: 'arrived', place, complete: 'yes', handedTo: 'T. Okafor' })
const suction = (when: string, passed: 'no' | 'difficult') => anEntry(suctions, when, { ...plainSuction, passed })
const movedAt = (when: string, ward: string | null = null): BedMove => ({ at: at(when), bed: 'A4', ward })

function dueOf(entries: readonly StoredEntry[], moves: readonly BedMove[] = [], now = '12:00') {
  const clock = clockOf(bedsideKit, 'bedside-kit-check', aContext(entries, now, { moves }))
  return clock.state === 'running' ? [clock.window.dueAt, clock.because] : clock
}

const checked = [tube(), whole('09:00')]
const used = (words: string) => `${words}, and the kit may have been used`

test.each<[string, StoredEntry, string]>([
  ['a blocked tube', accident('11:00'), used('the tube was blocked')],
  [
    'a displaced tube, put back at once',
    accident('11:00', { event: 'displaced', tubeNow: 'in', done: ['tube back'] }),
    used('the tube was displaced'),
  ],
  ['a bleed', accident('11:00', { event: 'bleeding', done: ['nothing'] }), used('there was a bleed')],
  [
    'a wrong cannula that was changed',
    accident('11:00', { event: 'wrong cannula', done: ['cannula changed'] }),
    used('there was an adverse event'),
  ],
  [
    'oxygen for another event',
    accident('11:00', { event: 'other', what: 'Oxygen tubing came off', done: ['oxygen'] }),
    used('there was an adverse event'),
  ],
  ['a catheter that would not pass', suction('11:00', 'no'), used('a suction catheter would not pass')],
  [
    'a tube that did not go in',
    tube('11:00', { difficulty: 'failed' }),
    'a tube did not go in, and spares may have been used',
  ],
  ['a displaced tube replaced', tube('11:00', { reason: 'displaced' }), 'the tube was put back after it was displaced'],
  ['a blocked tube replaced', tube('11:00', { reason: 'blocked' }), 'the tube was changed because it was blocked'],
  ['a planned change', tube('11:00', { reason: 'routine' }), 'the tube was changed'],
  ['a return to the ward', arrival('11:00', 'own bed, from imaging'), 'the patient arrived: own bed, from imaging'],
])('%s asks for a check within half an hour, and says so', (_, event, because) => {
  expect(dueOf([...checked, event])).toEqual([at('11:30'), because])
  expect(dueOf([...checked, event, whole('11:20')])).toEqual([at('23:00'), undefined])
})

test.each<[string, StoredEntry]>([
  ['a pressure injury', accident('11:00', { event: 'pressure injury', done: ['pressure off'] })],
  ['a valve with the cuff up, taken off', accident('11:00', { event: 'valve with cuff up', done: ['valve off'] })],
  ['a death', accident('11:00', { outcome: 'died' })],
  ['a catheter that passed with difficulty', suction('11:00', 'difficult')],
])('%s leaves the kit to the check of the shift', (_, event) => {
  expect(dueOf([...checked, event])).toEqual([at('23:00'), undefined])
})

test.each<[string, BedMove, string]>([
  ['within the ward', movedAt('11:00'), 'the patient was moved to bed A4'],
  ['from another ward', movedAt('11:00', 'Birch ward'), 'the patient was moved to Birch ward, bed A4'],
])('a move %s asks for a check within half an hour, and says where to', (_, move, because) => {
  expect(dueOf(checked, [move])).toEqual([at('11:30'), because])
  expect(dueOf([...checked, whole('11:00')], [move])).toEqual([at('23:00'), undefined])
})

test('of several events the first without a check counts', () => {
  const entries = [...checked, accident('10:40'), arrival('11:10', 'Birch ward')]
  expect(dueOf(entries, [movedAt('11:00')])).toEqual([at('11:10'), used('the tube was blocked')])
  expect(dueOf([...entries, whole('10:50')], [movedAt('11:00')])).toEqual([
    at('11:30'),
    'the patient was moved to bed A4',
  ])
})

test('while the tube is out nothing is checked; once it is back the kit is due from the accident on', () => {
  const out = accident('11:00', { event: 'unplanned removal', tubeNow: 'out', outcome: 'not settled' })
  expect(dueOf([...checked, out])).toMatchObject({ state: 'suspended' })
  expect(dueOf([...checked, out, tube('11:10', { reason: 'displaced' })])).toEqual([
    at('11:30'),
    used('the tube came out'),
  ])
})

test('what was before this tube asks for nothing', () => {
  const entries = [tube(), accident('2026-03-05 10:00'), aRemoval('2026-03-06 10:00'), tube('11:00'), whole('11:05')]
  expect(dueOf(entries, [movedAt('2026-03-05 12:00')])).toEqual([at('23:00'), undefined])
})
