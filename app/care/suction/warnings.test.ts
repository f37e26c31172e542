import { expect, test } from 'vitest'
import type { PatientFacts, StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { plainSuction } from './examples.ts'
import { type SuctionData, suctions } from './schema.ts'
import { standingSuctionWarnings, suctionWarnings } from './warnings.ts'

const firstTube = (on: string) =>
  anEntry(tubeChanges, `${on} 10:00`, aTube({ reason: 'first insertion', technique: 'surgical' }))

const anEpisode = (when: string, overrides: Partial<SuctionData> = {}) =>
  anEntry(suctions, when, { ...plainSuction, ...overrides })

interface About extends AboutContext {
  readonly before?: readonly StoredEntry[]
}

function warningsOf(overrides: Partial<SuctionData>, { before = [firstTube('2026-03-02')], ...about }: About = {}) {
  return suctionWarnings({ ...plainSuction, ...overrides }, aContext(before, '12:00', about))
}

test('plain suction warns of nothing, nor does a look', () => {
  expect(warningsOf({})).toEqual([])
  expect(suctionWarnings({ act: 'need only' }, aContext([firstTube('2026-03-02')], '12:00'))).toEqual([])
})

test.each<[PatientFacts['upperAirway'], RegExp]>([
  ['open', /^Call for help now\. Give oxygen to the face and the stoma\. .* Follow your local emergency plan\.$/],
  ['not known', /^Call for help now\. Give oxygen to the face and the stoma\. .* Follow your local emergency plan\.$/],
  ['not open', /^Call for help now\. Give oxygen to the stoma\. The mouth does not connect .* emergency plan\.$/],
])('a catheter that will not pass is red, upper airway %s', (upperAirway, action) => {
  const patient = { upperAirway }
  expect(warningsOf({ passed: 'no' }, { patient })).toMatchObject([{ name: 'suction-will-not-pass', level: 'red' }])
  expect(warningsOf({ passed: 'no' }, { patient })[0]?.action).toMatch(action)
})

test('a catheter that passed with difficulty is no warning', () => {
  expect(warningsOf({ passed: 'difficult' })).toEqual([])
})

test('distress is red', () => {
  expect(warningsOf({ tolerance: 'distress' })).toMatchObject([{ name: 'suction-distress', level: 'red' }])
})

test.each([
  [94, 98, 91, true],
  [94, 98, 92, false],
  [88, 92, 85, true],
  [88, 92, 86, false],
  [null, null, 91, true],
  [null, null, 92, false],
])('target from %s to %s, SpO2 settled at %i: red is %s', (spo2Low, spo2High, spo2After, red) => {
  const names = warningsOf({ spo2After }, { patient: { spo2Low, spo2High } }).map(({ name }) => name)
  expect(names).toEqual(red ? ['suction-spo2-not-recovering'] : [])
})

test('a low SpO2 that recovered is no warning', () => {
  expect(warningsOf({ tolerance: 'desaturation', spo2Low: 80, spo2After: 96 })).toEqual([])
})

test.each([
  ['none', '2026-02-20', undefined, undefined],
  ['streaks', '2026-02-20', 'amber', 'Ask a doctor to see the patient this shift.'],
  ['fresh', '2026-03-10', 'red', /^Call for help now and stay with the patient\. Leave the tube in; .* plan\.$/],
  ['fresh', '2026-02-20', 'red', /Treat this as a warning bleed\. Follow your local emergency plan\.$/],
  ['heavy', '2025-12-01', 'red', /Treat this as a warning bleed\. Follow your local emergency plan\.$/],
] as const)('blood %s with an opening made on %s: %s', (blood, madeOn, level, action) => {
  const admittedAt = '2025-11-01 08:00'
  const [warning] = warningsOf({ blood }, { before: [firstTube(madeOn)], admittedAt })
  expect(warning?.level).toBe(level)
  if (action) expect(warning?.action).toMatch(action)
})

test.each([
  ['2026-03-08', false],
  ['2026-03-07', true],
  ['2026-01-27', true],
  ['2026-01-26', false],
])('an opening made on %s is within day 3 to 42 on 10-Mar-2026: %s', (madeOn, within) => {
  const before = [firstTube(madeOn)]
  const policy = { 'bleed-streaks-red': true }
  expect(warningsOf({ blood: 'streaks' }, { before, policy })[0]?.level).toBe(within ? 'red' : 'amber')
  expect(/after the opening was made/.test(warningsOf({ blood: 'fresh' }, { before })[0]?.cause ?? '')).toBe(within)
})

test('an opening of unknown age leaves streaks amber and fresh blood red', () => {
  const before = [anEntry(tubeChanges, '2026-03-02 10:00', aTube())]
  const policy = { 'bleed-streaks-red': true }
  expect(warningsOf({ blood: 'streaks' }, { before, policy })[0]?.level).toBe('amber')
  expect(warningsOf({ blood: 'fresh' }, { before })).toMatchObject([{ level: 'red', cause: 'Fresh blood.' }])
})

test.each<[Partial<SuctionData>, string | undefined]>([
  [{ colour: 'yellow' }, undefined],
  [{ colour: 'green' }, 'Secretions are green, which is new.'],
  [{ consistency: 'thick' }, 'Secretions are thick, which is new.'],
  [{ colour: 'green', consistency: 'tenacious' }, 'Secretions are green and tenacious, which is new.'],
])('secretions %o after clear ones: %s', (overrides, cause) => {
  const before = [firstTube('2026-03-02'), anEpisode('08:00')]
  expect(warningsOf(overrides, { before })[0]?.cause).toBe(cause)
})

test('green secretions that are known are not told again', () => {
  const before = [firstTube('2026-03-02'), anEpisode('08:00', { colour: 'green' })]
  expect(warningsOf({ colour: 'green' }, { before })).toEqual([])
})

test('secretions like feed call doctor and speech-language therapist each time', () => {
  const before = [firstTube('2026-03-02'), anEpisode('08:00', { colour: 'feed' })]
  expect(warningsOf({ colour: 'feed' }, { before })).toMatchObject([{ name: 'suction-feed', level: 'amber' }])
})

const standing = (entries: readonly StoredEntry[]) =>
  standingSuctionWarnings(aContext([firstTube('2026-03-02'), ...entries], '14:00')).map(({ name }) => name)

test('a catheter that would not pass stands until one passes or the tube is changed', () => {
  const stuck = anEpisode('11:00', { passed: 'no' })
  expect(standing([stuck])).toEqual(['suction-will-not-pass'])
  expect(standing([stuck, anEntry(suctions, '11:10', { act: 'need only' })])).toEqual(['suction-will-not-pass'])
  expect(standing([stuck, anEpisode('11:30')])).toEqual([])
  expect(standing([stuck, anEntry(tubeChanges, '11:30', aTube())])).toEqual([])
})

test('blood stands until an episode without it, and is then kept in sight', () => {
  expect(standing([anEpisode('11:00', { blood: 'fresh' })])).toEqual(['suction-blood'])
  expect(standing([anEpisode('11:00', { blood: 'fresh' }), anEpisode('12:00')])).toEqual(['warning-bleed'])
  expect(standing([anEpisode('11:00', { blood: 'streaks' }), anEpisode('12:00')])).toEqual([])
})

test('a standing bleed keeps the day on which it was seen', () => {
  const entries = [firstTube('2026-03-02'), anEpisode('2026-03-04 12:00', { blood: 'fresh' })]
  expect(standingSuctionWarnings(aContext(entries, '2026-03-06 12:00'))[0]?.cause).toBe(
    'Fresh blood. Charted 04-Mar-2026 12:00.',
  )
})

test.each<[string, Partial<SuctionData>]>([
  ['suction-distress', { tolerance: 'distress' }],
  ['suction-spo2-not-recovering', { tolerance: 'desaturation', spo2Low: 80, spo2After: 85 }],
  ['suction-spo2-low', { tolerance: 'desaturation', spo2Low: 80 }],
])('%s stands until somebody looks again', (name, overrides) => {
  const low = anEpisode('11:00', overrides)
  expect(standing([low])).toEqual([name])
  expect(standing([low, anEntry(suctions, '11:10', { act: 'need only' })])).toEqual([])
  expect(standing([low, anEpisode('11:10')])).toEqual([])
})

test('a standing warning says when it was charted', () => {
  const context = aContext([firstTube('2026-03-02'), anEpisode('11:00', { passed: 'no' })], '14:00')
  expect(standingSuctionWarnings(context)[0]?.cause).toBe(
    'The suction catheter would not pass. Charted 10-Mar-2026 11:00.',
  )
})

test('nothing but a fresh bleed stands once the tube is out for good', () => {
  expect(standing([anEpisode('11:00', { passed: 'no' }), aRemoval('13:00')])).toEqual([])
  expect(standing([anEpisode('11:00', { blood: 'fresh' }), aRemoval('13:00')])).toEqual(['warning-bleed'])
})
