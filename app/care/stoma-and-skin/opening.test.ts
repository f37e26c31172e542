import { expect, test } from 'vitest'
import type { PatientFacts } from '../kind.ts'
import { aContext, anEntry, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { usualCheck } from './examples.ts'
import { openingWarnings } from './opening.ts'
import type { StomaData } from './schema.ts'

type About = Parameters<typeof aContext>[2]

/** The opening was made on 01-Mar-2026, so that the day of a March date is one less. */
const firstTube = anEntry(tubeChanges, '2026-03-01 10:00', aTube({ reason: 'first insertion', technique: 'surgical' }))

function warningsOf(overrides: Partial<StomaData>, now = '12:00', about: About = {}) {
  return openingWarnings({ ...usualCheck, ...overrides }, aContext([firstTube], now, about))
}

const namesOf = (overrides: Partial<StomaData>, about: About = {}) =>
  warningsOf(overrides, '12:00', about).map(({ name, level }) => `${name} ${level}`)

test('a clean opening warns of nothing', () => {
  expect(namesOf({})).toEqual([])
})

test.each([
  ['spotting', ['stoma-spotting amber']],
  ['fresh ooze', ['stoma-bleeding red']],
  ['active', ['stoma-bleeding red']],
] as const)('bleeding: %s', (bleeding, expected) => {
  expect(namesOf({ appearance: ['redness'], bleeding })).toEqual(expected)
})

test('at a bleed the tube stays in, with its cuff up', () => {
  expect(warningsOf({ appearance: ['redness'], bleeding: 'active' })[0]?.action).toBe(
    'Call for help now and stay with the patient. Leave the tube in; if it has a cuff, keep it up. Treat this as a warning bleed. Follow your local emergency plan.',
  )
})

test('at a bleed without a tube nothing is said of one', () => {
  const context = aContext([], '12:00', { patient: { upperAirway: 'not open' } })
  const [warning] = openingWarnings({ ...usualCheck, appearance: ['redness'], bleeding: 'active' }, context)
  expect(warning?.action).not.toContain('tube')
})

test.each([
  ['2026-03-03 12:00', 'Blood at the opening on day 2.'],
  ['2026-03-04 12:00', 'Blood at the opening on day 3: from day 3 to day 42 it may come from a large artery.'],
  ['2026-04-12 12:00', 'Blood at the opening on day 42: from day 3 to day 42 it may come from a large artery.'],
  ['2026-04-13 12:00', 'Blood at the opening on day 43.'],
])('fresh blood on %s is red in any case; the cause names the days in which an artery may bleed', (now, cause) => {
  expect(warningsOf({ appearance: ['redness'], bleeding: 'fresh ooze' }, now)).toEqual([
    expect.objectContaining({ level: 'red', cause }),
  ])
})

test('where the age of the opening is not known the bleed is said without a day', () => {
  const context = aContext([], '12:00')
  const [warning] = openingWarnings({ ...usualCheck, appearance: ['redness'], bleeding: 'active' }, context)
  expect(warning?.cause).toBe('Active bleeding at the opening.')
})

test.each(['surgical emphysema', 'neck swelling'] as const)('%s is red', finding => {
  expect(namesOf({ appearance: [finding] })).toEqual(['neck-swelling red'])
})

test('swelling at the opening alone is not swelling of the neck', () => {
  expect(namesOf({ appearance: ['swelling'] })).toEqual([])
})

test.each<[PatientFacts['upperAirway'], string]>([
  ['open', 'Oxygen to face.'],
  ['not open', 'Oxygen to the stoma.'],
  ['not known', 'Oxygen to face and stoma.'],
])('with the upper airway %s: %s', (upperAirway, oxygen) => {
  const [warning] = warningsOf({ appearance: ['surgical emphysema'] }, '12:00', { patient: { upperAirway } })
  expect(warning?.action).toBe(
    `Stop any bagging through the tube. ${oxygen} Call for help now. Follow your local emergency plan.`,
  )
})

test.each<[Partial<StomaData>, readonly string[]]>([
  [{ appearance: ['redness'] }, []],
  [{ appearance: ['redness', 'swelling', 'crusting'] }, []],
  [{ appearance: ['clean'], fever: 'yes' }, []],
  [{ appearance: ['redness', 'warmth'] }, ['stoma-infection amber']],
  [{ appearance: ['pus', 'odour'] }, ['stoma-infection amber']],
  [{ appearance: ['pus'], fever: 'yes' }, ['stoma-infection amber']],
  [{ appearance: ['pus'], fever: 'no' }, []],
])('infection is suspected from two signs on: %j', (overrides, expected) => {
  expect(namesOf(overrides)).toEqual(expected)
})

test('the number of signs is set by policy', () => {
  const policy = { 'stoma-infection-signs': 3 }
  expect(namesOf({ appearance: ['redness', 'warmth'] }, { policy })).toEqual([])
  expect(namesOf({ appearance: ['redness', 'warmth', 'pus'] }, { policy })).toEqual(['stoma-infection amber'])
})

test('a swab is asked for unless it was sent', () => {
  const [asked] = warningsOf({ appearance: ['redness', 'pus'] })
  const [sent] = warningsOf({ appearance: ['redness', 'pus'], swab: 'yes' })
  expect(asked?.action).toContain('swab')
  expect(sent?.action).toBe('Ask a doctor to look at the stoma this shift.')
})

test('a wound that breaks down is shown to ENT', () => {
  expect(namesOf({ appearance: ['breakdown'] })).toEqual(['stoma-breakdown amber'])
})

test('an air leak asks for the position of the tube; without a tube only a laryngectomy stoma is told on', () => {
  expect(warningsOf({ appearance: ['air leak'] })[0]?.action).toContain('Check the position of the tube')
  const leak = { ...usualCheck, appearance: ['air leak'] } as const satisfies StomaData
  expect(openingWarnings(leak, aContext([], '12:00'))).toEqual([])
  const laryngectomy = aContext([], '12:00', { patient: { upperAirway: 'not open' } })
  expect(openingWarnings(leak, laryngectomy)[0]?.action).toBe('Tell the tracheostomy team today.')
})

test('several findings warn together, the most pressing first', () => {
  const appearance: StomaData['appearance'] = ['redness', 'pus', 'breakdown', 'surgical emphysema']
  expect(namesOf({ appearance, bleeding: 'active' })).toEqual([
    'stoma-bleeding red',
    'neck-swelling red',
    'stoma-infection amber',
    'stoma-breakdown amber',
  ])
})
