import { expect, test } from 'vitest'
import { cuffState, cuffStateAt, inflatedAt } from '../cuff-pressure/cuff.ts'
import { cuffChecks } from '../cuff-pressure/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aTube, at } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { waterCuffs } from '../water-cuff/schema.ts'
import { cuffStateKind } from './kind.ts'
import { type CuffStateData, cuffStates } from './schema.ts'

const tube = (cuff: 'air' | 'water' | 'foam' | 'none' = 'air') =>
  anEntry(tubeChanges, '2026-03-02 10:00', aTube({ cuff }))
const letDown: CuffStateData = { act: 'down', why: 'trial', agreedBy: 'Team', suctionFirst: 'both', tolerance: 'well' }
const goneUp: CuffStateData = { act: 'up', why: 'night', leak: 'no', tolerance: 'well' }
const down = (when: string) => anEntry(cuffStates, when, letDown)
const up = (when: string) => anEntry(cuffStates, when, goneUp)
const read = (when: string) => anEntry(cuffChecks, when, { found: 25, unit: 'cmH2O', method: 'manometer' })
const water = (when: string, instilledMl: number) =>
  anEntry(waterCuffs, when, { prescribedMl: 5, removedMl: 5, instilledMl, leak: 'no' })

test.each<[string, readonly StoredEntry[], string]>([
  ['nothing charted', [tube()], 'inflated'],
  ['let down', [tube(), down('09:00')], 'deflated'],
  ['let down and up again', [tube(), down('09:00'), up('10:00')], 'inflated'],
  ['let down, then read under pressure', [tube(), down('09:00'), read('10:00')], 'inflated'],
  ['read, then let down', [tube(), read('08:00'), down('09:00')], 'deflated'],
  ['let down on the tube before', [tube(), down('2026-03-01 09:00')], 'inflated'],
  ['water', [tube('water')], 'water'],
  ['water let down', [tube('water'), down('09:00')], 'deflated'],
  ['water let down and filled', [tube('water'), down('09:00'), water('10:00', 5)], 'water'],
  ['water left empty', [tube('water'), water('10:00', 0)], 'deflated'],
  ['foam', [tube('foam'), down('09:00')], 'foam'],
  ['no cuff', [tube('none'), down('09:00')], 'no cuff'],
])('cuff: %s', (_, entries, state) => {
  expect(cuffState(aContext(entries, '12:00').record)).toBe(state)
})

test('it can be asked at a moment of the past', () => {
  const { record } = aContext([tube(), down('09:00'), up('10:00')], '12:00')
  expect([at('08:59'), at('09:00'), at('09:59'), at('10:00')].map(when => cuffStateAt(record, when))).toEqual([
    'inflated',
    'deflated',
    'deflated',
    'inflated',
  ])
  expect(inflatedAt(record)).toEqual(at('10:00'))
})

const warned = (data: CuffStateData, entries: readonly StoredEntry[] = [tube()], ventilated = false) =>
  cuffStateKind
    .warnings?.(data, aContext(entries, '12:00', { patient: { ventilated } }))
    .map(({ name, level }) => `${name} ${level}`)

test.each<[string, CuffStateData, readonly string[]]>([
  ['well', letDown, []],
  ['not suctioned', { ...letDown, suctionFirst: 'none' }, ['cuff-down-not-suctioned amber']],
  ['distress', { ...letDown, tolerance: 'distress' }, ['cuff-state-distress red']],
  ['wet voice', { ...letDown, tolerance: 'wet voice' }, ['cuff-state-wet-voice amber']],
  ['up, with a leak', { ...goneUp, leak: 'yes' }, ['cuff-leak amber']],
])('charted: %s', (_, data, expected) => {
  expect(warned(data)).toEqual(expected)
})

test('a cuff that is not there, foam, and a ventilator are told of', () => {
  expect(warned(letDown, [tube('none')])).toEqual(['cuff-state-no-such-cuff amber'])
  expect(warned(letDown, [tube('foam')])).toEqual(['cuff-state-no-such-cuff amber'])
  expect(warned(letDown, [tube()], true)).toEqual(['cuff-down-ventilated amber'])
})
