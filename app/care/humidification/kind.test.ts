import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { humidificationExamples } from './examples.ts'
import { humidification } from './kind.ts'
import { type HumidificationData, humidificationSchema, humidifications } from './schema.ts'
import { humidificationSentence } from './sentence.ts'
import { humidificationWarnings, standingHumidificationWarnings } from './warnings.ts'

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const look = (when: string, data: HumidificationData) => anEntry(humidifications, when, data)
const hme = { method: 'hme', hmeChanged: 'no' } as const
const laryngectomy = { patient: { upperAirway: 'not open' } } as const

const namesOf = (data: HumidificationData) =>
  humidificationWarnings(data, aContext([tube], '12:00')).map(({ name, level }) => `${name} ${level}`)
const standingOf = (...entries: readonly StoredEntry[]) =>
  standingHumidificationWarnings(aContext([tube, ...entries], '12:00')).map(({ name }) => name)

test('looks read as short sentences', () => {
  expect(humidificationExamples.map(humidificationSentence)).toEqual([
    'Heat and moisture exchanger on, not changed. Secretions thin.',
    'Heat and moisture exchanger on, changed. Secretions thick. Wet through.',
    'Heated humidifier on, water filled up, 37 °C. Secretions moderate.',
    'Heated humidifier on, water low.',
    'Cold aerosol on.',
    'Nebuliser given. Secretions tenacious.',
    'No humidification.',
  ])
})

test('each method asks for what it needs, and for nothing else', () => {
  const issuesOf = (data: object) => humidificationSchema.safeParse(data).error?.issues.map(({ message }) => message)
  expect(issuesOf({ method: 'hme' })).toEqual(['Choose the exchanger'])
  expect(issuesOf({ method: 'heated' })).toEqual(['Choose the water level'])
  expect(issuesOf({ method: 'bib' })).toBeUndefined()
  expect(issuesOf({ method: 'bib', hmeChanged: 'no', temperature: 37 })).toEqual([
    'Leave out the exchanger here',
    'Leave out the temperature of the air here',
  ])
})

test.each<[HumidificationData, readonly string[]]>([
  [hme, []],
  [{ method: 'none' }, ['no-humidification amber']],
  [{ method: 'heated', waterLevel: 'ok' }, []],
  [{ method: 'heated', waterLevel: 'filled' }, []],
  [{ method: 'heated', waterLevel: 'low' }, ['humidifier-water-low amber']],
  [{ ...hme, consistency: 'moderate' }, []],
  [{ ...hme, consistency: 'thick' }, ['humidification-thick-secretions blue']],
  [{ method: 'nebuliser', consistency: 'tenacious' }, ['humidification-thick-secretions blue']],
  [{ method: 'heated', waterLevel: 'ok', consistency: 'tenacious' }, []],
  [{ method: 'none', consistency: 'thick' }, ['no-humidification amber', 'humidification-thick-secretions blue']],
])('%j warns of %j', (data, expected) => {
  expect(namesOf(data)).toEqual(expected)
})

test('thick secretions ask for nebulisers, and during them whether they help', () => {
  const actionOf = (data: HumidificationData) => humidificationWarnings(data, aContext([tube], '12:00'))[0]?.action
  expect(actionOf({ ...hme, consistency: 'thick' })).toMatch(/^Ask a doctor about saline nebulisers/)
  expect(actionOf({ method: 'nebuliser', consistency: 'thick' })).toMatch(/^Look daily whether nebulisers still help/)
})

test('dry air and low water stand until a later look', () => {
  expect(standingOf(look('09:00', { method: 'none' }))).toEqual(['no-humidification'])
  expect(standingOf(look('09:00', { method: 'none' }), look('10:00', hme))).toEqual([])
  expect(standingOf(look('09:00', { method: 'none' }), look('10:00', { method: 'nebuliser' }))).toEqual([])
  const low = look('09:00', { method: 'heated', waterLevel: 'low' })
  expect(standingOf(low)).toEqual(['humidifier-water-low'])
  expect(standingOf(low, look('09:10', { method: 'heated', waterLevel: 'filled' }))).toEqual([])
  expect(standingOf(look('09:00', { method: 'none' }), aRemoval('10:00'))).toEqual([])
})

test('it is silent without an opening, and speaks for a laryngectomy stoma', () => {
  expect(humidificationWarnings({ method: 'none' }, aContext([], '12:00'))).toEqual([])
  expect(humidificationWarnings({ method: 'none' }, aContext([], '12:00', laryngectomy))).toHaveLength(1)
  const none = look('09:00', { method: 'none' })
  expect(standingHumidificationWarnings(aContext([none], '12:00', laryngectomy))).toHaveLength(1)
})

test.each<[string, readonly StoredEntry[], object | undefined]>([
  ['nothing', [], undefined],
  ['none in use', [look('09:00', { method: 'none' })], undefined],
  [
    'an exchanger',
    [look('09:00', hme)],
    { words: 'Heat and moisture exchanger, not changed', answers: { method: 'hme', hmeChanged: 'no' } },
  ],
  [
    'a heated humidifier, whose water is left to be looked at',
    [look('09:00', { method: 'heated', waterLevel: 'ok' })],
    { words: 'Heated humidifier', answers: { method: 'heated' } },
  ],
])('the usual after %s', (_, entries, expected) => {
  expect(humidification.usual?.(aContext([tube, ...entries], '12:00'))).toEqual(expected)
})
