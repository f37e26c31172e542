import { expect, test } from 'vitest'
import { decannulations } from '../decannulation/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { usualCheck } from './examples.ts'
import { type SkinSite, type StomaData, stomaChecks } from './schema.ts'
import { skinWarnings, standingSkinWarnings, unresolvedSkin } from './skin.ts'

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const sites = usualCheck.sites

const check = (when: string, overrides: Partial<StomaData> = {}) =>
  anEntry(stomaChecks, when, { ...usualCheck, ...overrides })

const injury = (stage: NonNullable<StomaData['stage']>, findingSite: SkinSite = 'flange left') =>
  ({
    skin: 'pressure injury',
    stage,
    findingSite,
    sites: [...new Set([...sites, findingSite])],
  }) satisfies Partial<StomaData>
const moisture = (findingSite: SkinSite = 'flange bottom') =>
  ({ skin: 'moisture damage', findingSite }) satisfies Partial<StomaData>

const namesOf = (overrides: Partial<StomaData>, before: readonly StoredEntry[] = []) =>
  skinWarnings({ ...usualCheck, ...overrides }, aContext([tube, ...before], '12:00')).map(
    ({ name, level }) => `${name} ${level}`,
  )

const openOf = (...checks: readonly StoredEntry[]) =>
  unresolvedSkin(aContext([tube, ...checks], '12:00').record).map(({ data }) => `${data.skin}, ${data.findingSite}`)

test('intact skin seen everywhere warns of nothing', () => {
  expect(namesOf({})).toEqual([])
})

test.each([
  ['stage-1', 'pressure-injury-early blue'],
  ['stage-2', 'pressure-injury amber'],
  ['stage-3', 'pressure-injury amber'],
  ['stage-4', 'pressure-injury amber'],
  ['unstageable', 'pressure-injury amber'],
  ['deep-tissue', 'pressure-injury amber'],
] as const)('a new pressure injury of %s', (stage, expected) => {
  expect(namesOf(injury(stage))).toEqual([expected])
})

test.each<[string, Partial<StomaData>, string]>([
  ['the same stage at the same place', injury('stage-2'), 'pressure-injury-known blue'],
  ['a worse stage at the same place', injury('stage-3'), 'pressure-injury amber'],
  ['the same stage at another place', injury('stage-2', 'back of neck'), 'pressure-injury amber'],
])('after a stage 2 injury on the left, %s', (_, overrides, expected) => {
  expect(namesOf(overrides, [check('2026-03-09 09:00', injury('stage-2'))])).toEqual([expected])
})

test('an injury that had healed is new when it comes back', () => {
  const before = [check('2026-03-08 09:00', injury('stage-2')), check('2026-03-09 09:00')]
  expect(namesOf(injury('stage-2'), before)).toEqual(['pressure-injury amber'])
})

test('the warning names stage, place and size, and asks for referral and an incident report', () => {
  const [warning] = skinWarnings({ ...usualCheck, ...injury('stage-2'), sizeMm: 8 }, aContext([tube], '12:00'))
  expect(warning).toMatchObject({
    action: 'Take the pressure off, refer to wound care or ENT today, and report an incident.',
    cause: 'New: Stage 2 pressure injury, under flange, left, 8 mm.',
  })
})

test('moisture damage and a macerated edge ask for dry skin, never for a stage', () => {
  expect(namesOf(moisture())).toEqual(['moisture-damage amber'])
  expect(namesOf({ appearance: ['maceration'] })).toEqual(['moisture-damage amber'])
})

test('a look at part of the skin says what is left', () => {
  const [warning] = skinWarnings(
    { ...usualCheck, sites: ['flange left', 'flange right', 'flange top'] },
    aContext([tube], '12:00'),
  )
  expect(warning).toMatchObject({
    level: 'blue',
    action: 'Look at the rest of the skin this shift: under flange, bottom; back of neck, under ties.',
  })
})

test('a laryngectomy stoma without a tube has no flange to look under', () => {
  const context = aContext([], '12:00', { patient: { upperAirway: 'not open' } })
  expect(skinWarnings({ ...usualCheck, sites: ['around opening'] }, context)).toEqual([])
})

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['nothing was charted', [], []],
  ['the skin was intact', [check('09:00')], []],
  ['it only blanched', [check('09:00', { skin: 'blanching redness', findingSite: 'flange top' })], []],
  ['it was damaged', [check('09:00', injury('stage-2'))], ['pressure injury, flange left']],
  ['a later look found it whole', [check('08:00', injury('stage-2')), check('09:00')], []],
  [
    'a later look did not go there',
    [check('08:00', injury('stage-2')), check('09:00', { sites: ['back of neck'] })],
    ['pressure injury, flange left'],
  ],
  [
    'a later look found worse at the same place',
    [check('08:00', moisture('flange left')), check('09:00', injury('stage-3'))],
    ['pressure injury, flange left'],
  ],
  [
    'a later look found damage elsewhere, which hides it',
    [check('08:00', injury('stage-2')), check('09:00', moisture())],
    ['moisture damage, flange bottom', 'pressure injury, flange left'],
  ],
  [
    'a later look elsewhere, then all of it whole',
    [check('07:00', injury('stage-2')), check('08:00', moisture()), check('09:00')],
    [],
  ],
  [
    'a late entry tells of before the look that found it whole',
    [check('09:00'), anEntry(stomaChecks, '08:00', { ...usualCheck, ...injury('stage-2') })],
    [],
  ],
])('damage still open when %s', (_, checks, expected) => {
  expect(openOf(...checks)).toEqual(expected)
})

test('damage charted in error and retracted does not stay open', () => {
  const mistaken = check('09:00', injury('stage-2'))
  const retraction = aCorrection(mistaken, stomaChecks, '09:00', usualCheck, { status: 'retracted' })
  expect(openOf(mistaken, retraction)).toEqual([])
})

const standingOf = (...entries: readonly StoredEntry[]) => standingSkinWarnings(aContext([tube, ...entries], '12:00'))

test('injuries at several places stand as one warning that names each with its day', () => {
  const first = check('2026-03-08 09:00', injury('stage-2'))
  const second = check('2026-03-09 09:00', injury('deep-tissue', 'back of neck'))
  expect(standingOf(first, second)).toEqual([
    expect.objectContaining({
      name: 'pressure-injury',
      level: 'amber',
      cause:
        'Deep tissue injury, back of neck, under ties, seen 09-Mar-2026. Stage 2 pressure injury, under flange, left, seen 08-Mar-2026.',
    }),
  ])
})

test('a stage 1 injury does not stand; moisture damage does until it is cleared', () => {
  expect(standingOf(check('09:00', injury('stage-1')))).toEqual([])
  expect(standingOf(check('08:00', moisture())).map(({ name }) => name)).toEqual(['moisture-damage'])
  expect(standingOf(check('08:00', moisture()), check('09:00'))).toEqual([])
})

test('an injury stands after the tube is out for good', () => {
  const removal = anEntry(decannulations, '11:00', {
    agreed: 'yes',
    operator: 'A. Haddad',
    helper: 'T. Okafor',
    kit: 'complete',
    breathing: 'comfortable',
    dressing: 'yes',
  })
  expect(standingOf(check('09:00', injury('stage-2')), removal)).toHaveLength(1)
})
