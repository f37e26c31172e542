import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { oralCareExamples, plainRound } from './examples.ts'
import { oralCare } from './kind.ts'
import { type OralCareData, oralCareSchema, oralCares } from './schema.ts'
import { oralCareSentence } from './sentence.ts'
import { oralCareWarnings } from './warnings.ts'

const tube = (when = '2026-03-02 10:00') => anEntry(tubeChanges, when, aTube())
const round = (when: string, ...care: OralCareData['care']) =>
  anEntry(oralCares, when, { ...plainRound, ...(care.length > 0 ? { care } : {}) })
const brushed = (when: string) => round(when, 'looked', 'brushed')

type About = Parameters<typeof aContext>[2]

function dueOf(task: string, entries: readonly StoredEntry[], now = '12:00', about: About = {}) {
  const clock = clockOf(oralCare, task, aContext(entries, now, about))
  return clock.state === 'running' ? clock.window.dueAt : clock
}

test('rounds read as short sentences', () => {
  expect(oralCareExamples.map(oralCareSentence)).toEqual([
    'Mouth care: looked at, moistened. Found clean and moist.',
    'Mouth care: looked at, moistened, teeth or dentures brushed. Found dry, coated tongue.',
    'Mouth care: looked at, mouth suctioned. Found white patches, sore or ulcer. Asked for a swab.',
    'Mouth care: mouth suctioned. Found bleeding.',
  ])
})

test('clean and another finding contradict each other', () => {
  const { error } = oralCareSchema.safeParse({ ...plainRound, seen: ['clean', 'dry'] })
  expect(error?.issues.map(({ message }) => message)).toEqual(['Clean and moist does not go with another finding'])
})

test.each<[string, readonly StoredEntry[], string]>([
  ['never: after the tube went in', [tube('10:00')], '14:00'],
  ['this morning', [tube(), round('09:00')], '13:00'],
  ['this morning, brushed', [tube(), brushed('09:00')], '13:00'],
  ['this morning, with suction alone since', [tube(), round('09:00'), round('11:00', 'suctioned')], '13:00'],
  ['and the tube changed since', [tube(), round('09:00'), tube('10:00')], '13:00'],
  ['with a late entry for before', [tube(), round('09:00'), late('08:00', '11:00')], '13:00'],
  ['this morning, retracted', [tube(), round('06:00'), ...retracted('09:00')], '10:00'],
])('the mouth is due, last looked after %s', (_, entries, due) => {
  expect(dueOf('oral-care', entries)).toEqual(at(due))
})

function late(when: string, writtenAt: string): StoredEntry {
  return anEntry(oralCares, when, plainRound, { recordedAt: at(writtenAt) })
}

function retracted(when: string): readonly StoredEntry[] {
  const mistaken = round(when)
  return [mistaken, aCorrection(mistaken, oralCares, when, plainRound, { status: 'retracted' })]
}

test.each<[string, readonly StoredEntry[], string]>([
  ['never', [tube('2026-03-10 05:00')], '17:00'],
  ['in the evening', [tube(), brushed('2026-03-09 21:00')], '09:00'],
  ['in the evening, looked at since', [tube(), brushed('2026-03-09 21:00'), round('08:00')], '09:00'],
])('brushing is due, last done %s', (_, entries, due) => {
  expect(dueOf('tooth-brushing', entries)).toEqual(at(due))
})

test('policy and care plan set the hours', () => {
  const policy = { 'oral-care-interval': 2, 'tooth-brushing-interval': 8 }
  const entries = [tube(), brushed('09:00')]
  expect(dueOf('oral-care', entries, '12:00', { policy })).toEqual(at('11:00'))
  expect(dueOf('tooth-brushing', entries, '12:00', { policy })).toEqual(at('17:00'))
  expect(dueOf('oral-care', entries, '12:00', { policy, personal: { 'oral-care-interval': 6 } })).toEqual(at('15:00'))
})

test('hours count as elapsed over the change of clocks', () => {
  expect(dueOf('oral-care', [tube(), round('2026-03-28 23:00')], '2026-03-29 05:00')).toEqual(at('2026-03-29 04:00'))
})

test.each(['oral-care', 'tooth-brushing'])('%s stops with the tube', task => {
  expect(dueOf(task, [])).toEqual({ state: 'none' })
  const because = 'tube out for good since 10-Mar-2026'
  expect(dueOf(task, [tube(), brushed('09:00'), aRemoval('10:00')])).toEqual({ state: 'suspended', because })
})

test.each<[OralCareData['seen'], readonly string[]]>([
  [['clean'], []],
  [['dry', 'coated'], []],
  [['sore'], ['mouth-sore blue']],
  [['thrush'], ['mouth-patches blue']],
  [
    ['bleeding', 'sore'],
    ['mouth-bleeding amber', 'mouth-sore blue'],
  ],
])('a mouth found %j warns of %j', (seen, expected) => {
  const warnings = oralCareWarnings({ ...plainRound, seen })
  expect(warnings.map(({ name, level }) => `${name} ${level}`)).toEqual(expected)
})

test('the usual round leaves what is seen to be looked at', () => {
  expect(oralCare.usual?.(aContext([tube()], '12:00'))?.answers).toEqual({ care: ['looked', 'moistened'] })
  expect(oralCare.usual?.(aContext([], '12:00'))).toBeUndefined()
})
