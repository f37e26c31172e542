import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube, at, clockOf } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { calm, observationExamples } from './examples.ts'
import { observations } from './kind.ts'
import { type ObservationData, observationSchema, observationSets } from './schema.ts'
import { observationSentence } from './sentence.ts'

type Overrides = { readonly [Name in keyof ObservationData]?: ObservationData[Name] | undefined }

const tube = (when = '2026-03-02 10:00') => anEntry(tubeChanges, when, aTube())
const set = (when: string, overrides: Partial<ObservationData> = {}) =>
  anEntry(observationSets, when, { ...calm, ...overrides })

type About = Parameters<typeof aContext>[2]

function dueOf(entries: readonly StoredEntry[], now = '12:00', about: About = {}) {
  const clock = clockOf(observations, 'observations', aContext(entries, now, about))
  return clock.state === 'running' ? clock.window.dueAt : clock
}

test('sets read as short sentences', () => {
  expect(observationExamples.map(observationSentence)).toEqual([
    'Respiratory rate 16 a min, SpO2 96% on oxygen (tracheostomy mask, FiO2 28%). Breathing easy. Heart rate 82 a min. Alert.',
    'Respiratory rate 18 a min, SpO2 95% on air. Breathing easy. Heart rate 76 a min. Temperature 36.8 °C. Alert.',
    'Respiratory rate 26 a min, SpO2 92% on oxygen (oxygen at the exchanger, 2.5 L/min). Breathing harder than usual. Heart rate 118 a min, systolic 104 mmHg. Newly confused. Doctor called.',
    'Respiratory rate 0 a min, SpO2 78% on oxygen (other, 15 L/min). Not breathing. Heart rate 40 a min. Unresponsive.',
    'Respiratory rate 14 a min, SpO2 97% on oxygen (ventilator, FiO2 40%). Breathing easy. Heart rate 70 a min. Sedated on purpose.',
  ])
})

const issuesOf = (overrides: Overrides) => {
  const data = Object.fromEntries(Object.entries({ ...calm, ...overrides }).filter(([, value]) => value !== undefined))
  return observationSchema.safeParse(data).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`)
}

test.each<[Overrides, readonly string[] | undefined]>([
  [{}, undefined],
  [{ fio2: undefined }, ['fio2: Enter the share of oxygen (FiO2), or the oxygen flow']],
  [{ fio2: undefined, flow: 4 }, undefined],
  [{ oxygen: 'air', fio2: undefined }, undefined],
  [{ oxygen: 'air' }, ['fio2: Leave out the share of oxygen (FiO2) here']],
  [{ fio2: 20 }, ['fio2: Share of oxygen (FiO2) must be from 21 to 100 %']],
  [{ fio2: undefined, flow: 61 }, ['flow: Oxygen flow must be from 0 to 60 L/min']],
  [{ respiratoryRate: 4 }, undefined],
  [{ respiratoryRate: 3 }, ['respiratoryRate: Respiratory rate must be from 4 to 70 a min, unless not breathing']],
  [{ respiratoryRate: 0, effort: 'none' }, undefined],
  [{ respiratoryRate: 16, effort: 'none' }, ['effort: Not breathing does not go with this respiratory rate']],
  [{ respiratoryRate: 16, effort: 'none', oxygen: 'ventilator' }, undefined],
  [{ respiratoryRate: 71 }, ['respiratoryRate: Respiratory rate must be from 0 to 70 a min']],
  [{ spo2: 39 }, ['spo2: Oxygen saturation (SpO2) must be from 40 to 100 %']],
  [{ temperature: 29.9 }, ['temperature: Temperature must be from 30 to 43 °C']],
])('a set with %j', (overrides, expected) => {
  expect(issuesOf(overrides)).toEqual(expected)
})

test.each<[string, readonly StoredEntry[], string]>([
  ['never taken: after the tube went in', [tube('10:00')], '14:00'],
  ['taken this morning', [tube(), set('09:00')], '13:00'],
  ['taken ahead of time', [tube(), set('09:00'), set('11:20')], '15:20'],
  ['taken, and the tube changed since', [tube(), set('09:00'), tube('10:00')], '13:00'],
  ['and one written late for before', [tube(), set('09:00'), late('08:00', '11:00')], '13:00'],
  ['taken, retracted', [tube(), set('06:00'), ...retracted('09:00')], '10:00'],
])('observations are due, %s', (_, entries, due) => {
  expect(dueOf(entries)).toEqual(at(due))
})

function late(when: string, writtenAt: string): StoredEntry {
  return anEntry(observationSets, when, calm, { recordedAt: at(writtenAt) })
}

function retracted(when: string): readonly StoredEntry[] {
  const mistaken = set(when)
  return [mistaken, aCorrection(mistaken, observationSets, when, calm, { status: 'retracted' })]
}

test('policy and care plan set the hours', () => {
  const policy = { 'observations-interval': 6 }
  expect(dueOf([tube(), set('09:00')], '12:00', { policy })).toEqual(at('15:00'))
  expect(dueOf([tube(), set('09:00')], '12:00', { policy, personal: { 'observations-interval': 1 } })).toEqual(
    at('10:00'),
  )
})

test('hours count as elapsed over the change of clocks', () => {
  expect(dueOf([tube(), set('2026-03-28 23:00')], '2026-03-29 05:00')).toEqual(at('2026-03-29 04:00'))
})

test('they do not concern somebody without a tube, and stand still after removal for good', () => {
  expect(dueOf([])).toEqual({ state: 'none' })
  const because = 'tube out for good since 10-Mar-2026'
  expect(dueOf([tube(), set('09:00'), aRemoval('10:00')])).toEqual({ state: 'suspended', because })
})

test('nothing is ever filled in ahead', () => {
  expect(observations).not.toHaveProperty('startsWith')
  expect(observations).not.toHaveProperty('usual')
})
