import { expect, test } from 'vitest'
import type { PatientFacts, StoredEntry } from '../kind.ts'
import { aContext, anEntry, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { calm } from './examples.ts'
import { observations } from './kind.ts'
import { type ObservationData, observationSets } from './schema.ts'
import { observationWarnings, standingObservationWarnings } from './warnings.ts'

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const set = (when: string, overrides: Partial<ObservationData> = {}) =>
  anEntry(observationSets, when, { ...calm, ...overrides })

type About = Parameters<typeof aContext>[2]

function namesOf(overrides: Partial<ObservationData>, about: About = {}, before: readonly StoredEntry[] = []) {
  const warnings = observationWarnings({ ...calm, ...overrides }, aContext([tube, ...before], '12:00', about))
  return warnings.map(({ name, level }) => `${name} ${level}`)
}

const EXTREME = ['observations-extreme amber']

test.each<[Partial<ObservationData>, readonly string[]]>([
  [{}, []],
  [{ respiratoryRate: 8 }, EXTREME],
  [{ respiratoryRate: 9 }, []],
  [{ respiratoryRate: 24 }, []],
  [{ respiratoryRate: 25 }, EXTREME],
  [{ heartRate: 40 }, EXTREME],
  [{ heartRate: 41 }, []],
  [{ heartRate: 130 }, []],
  [{ heartRate: 131 }, EXTREME],
  [{ systolic: 90 }, EXTREME],
  [{ systolic: 91 }, []],
  [{ systolic: 219 }, []],
  [{ systolic: 220 }, EXTREME],
  [{ awareness: 'confused' }, EXTREME],
  [{ awareness: 'voice' }, EXTREME],
  [{ awareness: 'pain' }, EXTREME],
  [{ awareness: 'unresponsive' }, EXTREME],
  [{ awareness: 'sedated' }, []],
])('a single value that scores 3 in NEWS2 asks for an urgent review: %j', (overrides, expected) => {
  expect(namesOf(overrides)).toEqual(expected)
})

test('several extremes are one warning that names them all', () => {
  const data: ObservationData = { ...calm, respiratoryRate: 28, heartRate: 140, awareness: 'confused' }
  const warnings = observationWarnings(data, aContext([tube], '12:00'))
  expect(warnings.map(({ cause }) => cause)).toEqual([
    'Respiratory rate 28 a min, Heart rate 140 a min, Newly confused.',
  ])
})

test.each([
  ['observations-respiratory-rate-low', 10, { respiratoryRate: 10 }],
  ['observations-respiratory-rate-high', 30, { respiratoryRate: 30 }],
  ['observations-heart-rate-low', 50, { heartRate: 50 }],
  ['observations-heart-rate-high', 120, { heartRate: 120 }],
  ['observations-systolic-low', 100, { systolic: 100 }],
  ['observations-systolic-high', 200, { systolic: 200 }],
])('%s is set by policy', (name, value, overrides) => {
  expect(namesOf(overrides, { policy: { [name]: value } })).toEqual(EXTREME)
})

const target = (spo2Low: number | null, spo2High: number | null): About => ({ patient: { spo2Low, spo2High } })

test.each<[number | null, number | null, number, readonly string[]]>([
  [94, 98, 94, []],
  [94, 98, 93, ['observations-spo2-below-target amber']],
  [94, 98, 92, ['observations-spo2-below-target amber']],
  [94, 98, 91, ['observations-spo2-far-below red']],
  [88, 92, 88, []],
  [88, 92, 87, ['observations-spo2-below-target amber']],
  [88, 92, 86, ['observations-spo2-below-target amber']],
  [88, 92, 85, ['observations-spo2-far-below red']],
  [null, null, 92, []],
  [null, null, 91, ['observations-spo2-far-below red']],
])('target %s to %s, SpO2 %i', (low, high, spo2, expected) => {
  expect(namesOf({ spo2 }, target(low, high))).toEqual(expected)
})

test('on scale 2 its own floor counts too, where the policy lets targets be missed by more', () => {
  const about = { ...target(88, 92), policy: { 'suction-spo2-below-target': 6 } }
  expect(namesOf({ spo2: 84 }, about)).toEqual(['observations-spo2-below-target amber'])
  expect(namesOf({ spo2: 83 }, about)).toEqual(['observations-spo2-far-below red'])
  expect(namesOf({ spo2: 84 }, { ...about, policy: { ...about.policy, 'observations-spo2-low-scale-2': 84 } })).toEqual(
    ['observations-spo2-far-below red'],
  )
})

test.each<[number, number, readonly string[]]>([
  [97, 95, []],
  [97, 94, ['observations-spo2-fallen amber']],
  [99, 95, ['observations-spo2-fallen amber']],
  [94, 97, []],
])('SpO2 from %i to %i within target 94 to 98', (before, spo2, expected) => {
  expect(namesOf({ spo2 }, target(94, 98), [set('08:00', { spo2: before })])).toEqual(expected)
})

test('the fall counts from the set just before, and policy sets it', () => {
  const before = [set('04:00', { spo2: 99 }), set('08:00', { spo2: 96 })]
  expect(namesOf({ spo2: 95 }, target(94, 98), before)).toEqual([])
  const policy = { 'observations-spo2-fall': 4 }
  expect(namesOf({ spo2: 94 }, { ...target(94, 98), policy }, [set('08:00', { spo2: 97 })])).toEqual([])
})

test.each<[ObservationData['effort'], readonly string[]]>([
  ['easy', []],
  ['increased', ['observations-effort amber']],
  ['distress', ['observations-breathing red']],
])('breathing: %s', (effort, expected) => {
  expect(namesOf({ effort })).toEqual(expected)
})

test('apnoea is red, and its rate no extreme beside it', () => {
  expect(namesOf({ effort: 'none', respiratoryRate: 0 })).toEqual(['observations-breathing red'])
})

test.each<[PatientFacts['upperAirway'], RegExp]>([
  ['open', /^Call for help now\. Give oxygen to the face and the stoma\./],
  ['not known', /^Call for help now\. Give oxygen to the face and the stoma\./],
  ['not open', /^Call for help now\. Give oxygen to the stoma\. The mouth does not connect to the lungs\./],
])('what to do follows the upper airway: %s', (upperAirway, action) => {
  const context = aContext([tube], '12:00', { patient: { upperAirway } })
  const seen: readonly Partial<ObservationData>[] = [{ effort: 'distress' }, { spo2: 80 }]
  for (const overrides of seen) {
    const [warning] = observationWarnings({ ...calm, ...overrides }, context)
    expect(warning?.action).toMatch(action)
    expect(warning?.action).toMatch(/Follow your local emergency plan\.$/)
  }
})

test('a set stands until the next one, a fall against the set before it', () => {
  const standingOf = (...entries: readonly StoredEntry[]) =>
    standingObservationWarnings(aContext([tube, ...entries], '12:00', target(94, 98))).map(({ name }) => name)
  expect(standingOf()).toEqual([])
  expect(standingOf(set('09:00', { effort: 'distress', heartRate: 135 }))).toEqual([
    'observations-breathing',
    'observations-extreme',
  ])
  expect(standingOf(set('09:00', { effort: 'distress' }), set('09:10'))).toEqual([])
  expect(standingOf(set('08:00', { spo2: 98 }), set('09:00', { spo2: 95 }))).toEqual(['observations-spo2-fallen'])
  expect(standingOf(set('08:00', { spo2: 98 }), set('09:00', { spo2: 95 }), set('09:30', { spo2: 95 }))).toEqual([])
})

test.each<[Partial<ObservationData>, boolean]>([
  [{}, false],
  [{ spo2: 90 }, true],
  [{ heartRate: 140 }, true],
])('a set with %j is out of range: %s', (overrides, expected) => {
  expect(observations.outOfRange?.({ ...calm, ...overrides }, aContext([tube], '12:00'))).toBe(expected)
})
