import { expect, test } from 'vitest'
import type { PatientFacts, StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { usualCheck } from '../stoma-and-skin/examples.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { tubesBack } from './failed.ts'
import { decannulation } from './kind.ts'
import { type DecannulationData, decannulations } from './schema.ts'
import { removalWarnings, standingRemovalWarnings } from './warnings.ts'

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const smooth: DecannulationData = {
  agreed: 'yes',
  operator: 'M. Osei',
  helper: 'T. Okafor',
  kit: 'complete',
  breathing: 'comfortable',
  dressing: 'yes',
}
const removed = (when: string, overrides: Partial<DecannulationData> = {}) =>
  anEntry(decannulations, when, { ...smooth, ...overrides })

function warningsOf(overrides: Partial<DecannulationData>, upperAirway: PatientFacts['upperAirway'] = 'open') {
  const all = removalWarnings({ ...smooth, ...overrides }, aContext([tube], '12:00', { patient: { upperAirway } }))
  return all.filter(({ name }) => name !== 'removal-criteria-not-met')
}

test.each<[PatientFacts['upperAirway'], DecannulationData['dressing'], string | undefined]>([
  ['open', 'yes', undefined],
  ['open', 'no', 'opening-not-covered amber'],
  ['not known', 'yes', 'opening-covered amber'],
  ['not known', 'no', undefined],
  ['not open', 'yes', 'opening-covered red'],
  ['not open', 'no', undefined],
])('upper airway %s, airtight dressing %s', (upperAirway, dressing, expected) => {
  const [warning] = warningsOf({ dressing }, upperAirway)
  expect(warning && `${warning.name} ${warning.level}`).toBe(expected)
})

test('an airtight dressing on a laryngectomy comes off first', () => {
  expect(warningsOf({}, 'not open')[0]?.action).toBe(
    'Take the dressing off the opening now. The mouth does not connect to the lungs. Call for help. Follow your local emergency plan.',
  )
})

test.each<[PatientFacts['upperAirway'], string]>([
  [
    'open',
    'Call for help now. Give oxygen to the face and the opening. Bring the spare tube and dilators. Follow your local emergency plan.',
  ],
  [
    'not open',
    'Call for help now. Give oxygen to the stoma. The mouth does not connect to the lungs. Follow your local emergency plan.',
  ],
])('stridor or laboured breathing afterwards is red, upper airway %s', (upperAirway, action) => {
  for (const breathing of ['stridor', 'laboured'] as const) {
    const warnings = warningsOf({ breathing, dressing: upperAirway === 'open' ? 'yes' : 'no' }, upperAirway)
    expect(warnings).toMatchObject([{ name: 'removal-breathing', level: 'red', action }])
  }
})

test('a removal that the team had not agreed is told on', () => {
  expect(warningsOf({ agreed: 'no' })).toMatchObject([{ name: 'removal-not-agreed', level: 'amber' }])
})

const standing = (entries: readonly StoredEntry[], now: string) =>
  standingRemovalWarnings(aContext([tube, ...entries], now)).map(({ name }) => name)
const looked = anEntry(stomaChecks, '11:00', usualCheck)

test.each<[string, readonly StoredEntry[], string, readonly string[]]>([
  ['nothing while a tube is in', [], '12:00', []],
  ['the spare for 48 hours', [aRemoval('10:00')], '2026-03-12 10:00', ['after-removal']],
  ['nothing after that', [aRemoval('10:00')], '2026-03-12 10:01', []],
  [
    'a failed removal once a tube is back',
    [aRemoval('10:00'), anEntry(tubeChanges, '10:30', aTube())],
    '12:00',
    ['removal-failed'],
  ],
  ['bad breathing', [removed('10:00', { breathing: 'stridor' })], '12:00', ['removal-breathing', 'after-removal']],
  ['no bad breathing once looked at', [removed('10:00', { breathing: 'stridor' }), looked], '12:00', ['after-removal']],
  ['no amber ones', [removed('10:00', { agreed: 'no', dressing: 'no' })], '12:00', ['after-removal']],
])('what stands: %s', (_, entries, now, expected) => {
  expect(standing(entries, now)).toEqual(expected)
})

test('it says until when the spare stays', () => {
  expect(standingRemovalWarnings(aContext([tube, aRemoval('10:00')], '12:00'))[0]?.action).toBe(
    'Watch breathing, cough and voice. Keep a spare tube, one a size smaller and dilators at the bedside until 12-Mar-2026 10:00.',
  )
})

test('the sentence says who, how it went and what was noted', () => {
  expect(decannulation.summary({ ...smooth, agreed: 'no', dressing: 'no', note: 'Voice clear' })).toBe(
    'Tube taken out for good by M. Osei with T. Okafor. Breathing comfortable. Kit complete. No airtight dressing. Not agreed by the team. Voice clear.',
  )
})

test('what the record did not show as ready is said with the removal, and not refused', () => {
  const [warning] = removalWarnings(smooth, aContext([tube], '12:00'))
  expect(warning).toMatchObject({
    name: 'removal-criteria-not-met',
    level: 'amber',
    cause:
      'Not shown by the record before the tube came out: the cuff was charted as up; no cap trial was passed; readiness for removal was not charted.',
  })
})

test('what was missing from the kit is got', () => {
  expect(warningsOf({ kit: 'incomplete', kitMissing: ['dilators'] })).toMatchObject([
    { name: 'removal-kit-incomplete', level: 'amber', cause: 'Missing at the bedside: tracheal dilators.' },
  ])
})

test('a tube that went back in late is no failed removal', () => {
  const back = anEntry(tubeChanges, '2026-03-07 10:01', aTube())
  const out = aRemoval('2026-03-05 10:00')
  expect(tubesBack(aContext([tube, out, back], '12:00').record, aContext([], '12:00').values)).toMatchObject([
    { isFailure: false },
  ])
})
