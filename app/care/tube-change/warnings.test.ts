import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aTube } from '../make.ts'
import { tubeChange } from './kind.ts'
import { type TubeData, tubeChanges } from './schema.ts'
import { tubeWarnings } from './warnings.ts'

const first = (technique: TubeData['technique'], when = '2026-03-02 10:00') =>
  anEntry(tubeChanges, when, aTube({ reason: 'first insertion', technique }))
const old = anEntry(
  tubeChanges,
  '2026-03-02 10:00',
  aTube({ reason: 'on arrival', insertedOn: '2026-02-20', stomaMadeOn: '2025-06-01', technique: 'surgical' }),
)

interface About extends AboutContext {
  readonly before?: readonly StoredEntry[]
  readonly now?: string
}

const warningsOf = (overrides: Partial<TubeData>, { before = [old], now = '12:00', ...about }: About = {}) =>
  tubeWarnings(aTube(overrides), aContext(before, now, about))
const namesOf = (overrides: Partial<TubeData>, about: About = {}) =>
  warningsOf(overrides, about).map(({ name, level }) => `${name} ${level}`)

test('a plain change warns of nothing', () => {
  expect(namesOf({})).toEqual([])
  expect(namesOf({ reason: 'first insertion', technique: 'surgical' }, { before: [] })).toEqual([])
})

const early = ['first-change-early amber']

test.each<[string, TubeData['technique'], string, readonly string[]]>([
  ['surgical on day 3', 'surgical', '2026-03-05 12:00', early],
  ['surgical on day 4', 'surgical', '2026-03-06 00:00', []],
  ['percutaneous on day 6', 'percutaneous', '2026-03-08 23:59', early],
  ['percutaneous on day 7', 'percutaneous', '2026-03-09 00:00', []],
  ['technique not known on day 6, as percutaneous', 'not known', '2026-03-08 12:00', early],
  ['technique not known on day 7', 'not known', '2026-03-09 12:00', []],
])('a first change, %s', (_, technique, now, expected) => {
  expect(namesOf({ reason: 'first change' }, { before: [first(technique)], now })).toEqual(expected)
})

test('a first change before 72 hours says that it is for emergencies, and fits before and after', () => {
  const policy = { 'first-change-surgical-earliest': 3 }
  const at = (now: string) => warningsOf({ reason: 'first change' }, { before: [first('surgical')], now, policy })
  expect(at('2026-03-05 09:59')).toMatchObject([
    {
      action: 'Ask ENT or ICU before changing. If it is done, ask them to review today.',
      cause: 'The opening is only 3 days old. Before 72 hours a change is for emergencies.',
    },
  ])
  expect(at('2026-03-05 10:00')).toEqual([])
})

test('of a first tube that came with the patient the 72 hours count from the end of its day', () => {
  const came = {
    reason: 'on arrival',
    insertedOn: '2026-03-02',
    stomaMadeOn: '2026-03-02',
    technique: 'surgical',
  } as const
  const before = [anEntry(tubeChanges, '2026-03-04 10:00', aTube(came))]
  const policy = { 'first-change-surgical-earliest': 3 }
  expect(namesOf({}, { before, now: '2026-03-05 23:59', policy })).toEqual(early)
  expect(namesOf({}, { before, now: '2026-03-06 00:00', policy })).toEqual([])
})

test.each<[TubeData['reason'], readonly string[]]>([
  ['routine', early],
  ['smaller', early],
  ['blocked', []],
  ['fault', []],
  ['on arrival', []],
])('on day 2 a change with the reason %s', (reason, expected) => {
  const arrived =
    reason === 'on arrival'
      ? { insertedOn: '2026-03-02', stomaMadeOn: '2026-03-02', technique: 'surgical' as const }
      : {}
  expect(namesOf({ reason, ...arrived }, { before: [first('surgical')], now: '2026-03-04 12:00' })).toEqual(expected)
})

test.each<[NonNullable<TubeData['bleeding']>, readonly string[]]>([
  ['none', []],
  ['spotting', ['bleeding amber']],
  ['fresh', ['bleeding red']],
  ['active', ['bleeding red']],
])('bleeding %s', (bleeding, expected) => {
  expect(namesOf({ bleeding })).toEqual(expected)
})

test('a bleed at a change is held against the days in which an artery may bleed', () => {
  const on = (now: string) => warningsOf({ bleeding: 'fresh', reason: 'routine' }, { before: [first('surgical')], now })
  expect(on('2026-03-09 12:00')[0]).toMatchObject({
    action:
      'Call for help now and stay with the patient. Leave the tube in; if it has a cuff, keep it up. Treat this as a warning bleed. Follow your local emergency plan.',
    cause:
      'Fresh blood at the tube change on day 7 after the opening was made; until day 42 a bleed may warn of a larger one.',
  })
  expect(on('2026-04-14 12:00')[0]?.cause).toBe('Fresh blood at the tube change.')
})

test.each([
  [92, {}, []],
  [91, {}, ['tube-change-spo2-low amber']],
  [86, { patient: { spo2Low: 88, spo2High: 92 } }, []],
  [85, { patient: { spo2Low: 88, spo2High: 92 } }, ['tube-change-spo2-low amber']],
])('SpO2 that fell to %i', (spo2Low, about, expected) => {
  expect(namesOf({ spo2Low }, about)).toEqual(expected)
})

test('a position not confirmed is amber, unless the tube came with the patient', () => {
  expect(namesOf({ position: 'not confirmed' })).toEqual(['position-not-confirmed amber'])
  const came = {
    reason: 'on arrival',
    insertedOn: '2026-03-01',
    stomaMadeOn: '2026-02-01',
    technique: 'surgical',
  } as const
  expect(namesOf({ ...came, position: 'not confirmed' }, { before: [] })).toEqual([])
})

test.each<[TubeData['connector'], string]>([
  ['inner', 'inner-cannula-absent red'],
  ['outer', 'inner-cannula-absent amber'],
  ['none', 'inner-cannula-absent amber'],
])('a dual tube without inner cannula, connector %s', (connector, expected) => {
  expect(namesOf({ innerCannula: 'none', connector })).toEqual([expected])
})

test('a tube is expired from the day after its date, by the day it went in', () => {
  expect(namesOf({ expiresOn: '2026-03-09' })).toEqual(['tube-expired amber'])
  expect(namesOf({ expiresOn: '2026-03-10' })).toEqual([])
  const came = {
    reason: 'on arrival',
    insertedOn: '2026-03-01',
    stomaMadeOn: '2026-02-01',
    technique: 'surgical',
  } as const
  expect(namesOf({ ...came, expiresOn: '2026-03-05' }, { before: [] })).toEqual([])
})

test.each([
  ['2026-03-11', '2026-03-01', 'A date lies ahead.'],
  ['2026-03-01', '2026-03-02', 'The opening is charted as made after this tube went in.'],
  ['2026-03-01', '2026-03-01', undefined],
])('a tube of %s in an opening of %s', (insertedOn, stomaMadeOn, cause) => {
  const came = { reason: 'on arrival', insertedOn, stomaMadeOn, technique: 'surgical' } as const
  expect(warningsOf(came, { before: [] })[0]?.cause).toBe(cause)
})

test('the usual change is the same tube, without findings, people, lot, mark or an absent inner cannula', () => {
  const usual = (overrides: Partial<TubeData>) =>
    tubeChange.usual?.(aContext([anEntry(tubeChanges, '2026-03-02 10:00', aTube(overrides))], '12:00'))
  expect(usual({ lot: 'A1', spo2Low: 95, bleeding: 'none' })).toEqual({
    words: 'Same tube as now: 8.0 ISO 5366, cuffed, dual',
    answers: {
      line: 'Alder',
      sizeSystem: 'ISO 5366',
      size: '8.0',
      idWithInner: 8,
      idWithoutInner: 9.1,
      od: 11.8,
      lengthMm: 81,
      cuff: 'air',
      construction: 'dual',
      innerCannula: 'disposable',
      fenestrated: 'no',
      connector: 'outer',
      flange: 'fixed',
    },
  })
  expect(usual({ innerCannula: 'none' })?.answers).toMatchObject({ innerCannula: undefined })
  expect(tubeChange.usual?.(aContext([], '12:00'))).toBeUndefined()
})
