import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aRemoval, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { kitExamples, wholeKit } from './examples.ts'
import { itemWords, kitItems } from './items.ts'
import { bedsideKit } from './kind.ts'
import { type KitData, kitChecks, kitSchema } from './schema.ts'
import { kitSentence } from './sentence.ts'
import { kitWarnings, standingKitWarnings } from './warnings.ts'

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const check = (when: string, data: KitData) => anEntry(kitChecks, when, data)
const without = (...missing: NonNullable<KitData['missing']>): KitData => {
  return { ...wholeKit, complete: 'no', missing, owner: 'T. Okafor' }
}

const standingOf = (entries: readonly StoredEntry[], now = '12:00', policy = {}) =>
  standingKitWarnings(aContext([tube, ...entries], now, { policy }))

test('checks read as short sentences', () => {
  expect(kitExamples.map(kitSentence)).toEqual([
    'Bedside kit complete. Suction tested at 120 mmHg. Held against: Tube Halden 6 Jackson and one size smaller; plain inner cannula Halden 6.',
    'Bedside kit not complete: no spare tube one size smaller, no obturator. T. Okafor gets it, within 10 min. Suction tested at 16 kPa. Used at the change this morning.',
    'Bedside kit not complete: no working suction. Equipment library gets it.',
  ])
})

const issuesOf = (data: object) => kitSchema.safeParse(data).error?.issues.map(({ message }) => message)

test.each<[string, object, readonly string[] | undefined]>([
  ['everything there', wholeKit, undefined],
  ['suction not tested', { complete: 'yes' }, ['Enter what suction was tested at']],
  ['no unit', { complete: 'yes', suctionTested: 120 }, ['Choose the unit on the vacuum gauge']],
  [
    'a number in the wrong unit',
    { ...wholeKit, suctionUnit: 'kPa' },
    ['Check the unit: 120 kPa is more than 760 mmHg'],
  ],
  ['the most that there is', { ...wholeKit, suctionTested: 101, suctionUnit: 'kPa' }, undefined],
  ['missing without a name', { ...wholeKit, complete: 'no' }, ['Choose the missing', 'Enter the person getting it']],
  ['suction itself is missing', { complete: 'no', missing: ['suction'], owner: 'Porter' }, undefined],
  [
    'another item is missing: suction is tested all the same',
    { complete: 'no', missing: ['gel'], owner: 'Porter' },
    ['Enter what suction was tested at'],
  ],
  ['complete, and yet an owner', { ...wholeKit, owner: 'Porter' }, ['Leave out the person getting it here']],
])('a check with %s', (_, data, expected) => {
  expect(issuesOf(data)).toEqual(expected)
})

test('every item has its words inside a sentence', () => {
  expect(Object.keys(itemWords)).toEqual(Object.keys(kitItems))
})

test.each<[KitData, readonly string[]]>([
  [wholeKit, []],
  [without('obturator'), ['bedside-kit-missing amber']],
  [{ ...wholeKit, suctionTested: 80 }, []],
  [{ ...wholeKit, suctionTested: 79.5 }, []],
  [{ ...wholeKit, suctionTested: 79 }, ['bedside-kit-suction-weak amber']],
  [{ ...wholeKit, suctionTested: 11, suctionUnit: 'kPa' }, []],
  [{ ...wholeKit, suctionTested: 10, suctionUnit: 'kPa' }, ['bedside-kit-suction-weak amber']],
])('%j warns of %j', (data, expected) => {
  const warnings = kitWarnings(data, aContext([tube], '12:00'))
  expect(warnings.map(({ name, level }) => `${name} ${level}`)).toEqual(expected)
})

test('the least vacuum is set by policy', () => {
  const context = aContext([tube], '12:00', { policy: { 'suction-vacuum-low': 120 } })
  expect(kitWarnings({ ...wholeKit, suctionTested: 110 }, context)).toHaveLength(1)
})

test('what is missing is named, to be got now', () => {
  const [warning] = kitWarnings(without('spare same', 'gel'), aContext([tube], '12:00'))
  expect(warning?.action).toBe(
    'Get a spare tube of the same size, water-soluble gel now. Stay nearby until it arrives.',
  )
})

test('without a tube nothing is said', () => {
  expect(kitWarnings(without('gel'), aContext([], '12:00'))).toEqual([])
})

test.each([
  ['11:45', false],
  ['11:44', true],
])('missing since %s: the charge nurse is told at 12:00: %s', (since, tells) => {
  const [warning] = standingOf([check(since, without('gel'))])
  expect(warning?.action.startsWith('Tell the charge nurse: missing for more than 15 minutes. Get ')).toBe(tells)
})

test('the time counts from the first check at which something was missing, and policy sets it', () => {
  const twice = [check('11:30', without('gel', 'wedge')), check('11:55', without('gel'))]
  const [warning] = standingOf(twice)
  expect(warning?.action).toMatch(/^Tell the charge nurse: .* Get water-soluble gel now\./)
  expect(standingOf(twice, '12:00', { 'bedside-kit-missing-within': 60 })[0]?.action).toMatch(/^Get /)
})

test('it stands until a complete check, or until the tube is out for good', () => {
  const gap = check('11:50', without('gel'))
  const names = (...more: readonly StoredEntry[]) => standingOf([gap, ...more]).map(({ name }) => name)
  expect(names()).toEqual(['bedside-kit-missing'])
  expect(names(check('11:55', wholeKit))).toEqual([])
  expect(names(aRemoval('11:55'))).toEqual([])
})

test('weak suction stands until it was tested again', () => {
  const weak = check('11:50', { ...wholeKit, suctionTested: 40 })
  expect(standingOf([weak]).map(({ name }) => name)).toEqual(['bedside-kit-suction-weak'])
  expect(standingOf([weak, check('11:55', wholeKit)])).toEqual([])
})

test.each<[Parameters<typeof aTube>[0], string]>([
  [{}, 'Tube Alder 8.0 ISO 5366 and one size smaller; plain inner cannula Alder 8.0'],
  [
    { sutures: 'in place' },
    'Tube Alder 8.0 ISO 5366 and one size smaller; plain inner cannula Alder 8.0; stitch cutter',
  ],
  [
    { cuff: 'none', construction: 'single', innerCannula: undefined, idWithInner: undefined },
    'Tube Alder 8.0 ISO 5366 and one size smaller; cuffed tube of the same size',
  ],
])('the form starts with the spares that the tube asks for: %j', (overrides, spares) => {
  const context = aContext([anEntry(tubeChanges, '2026-03-02 10:00', aTube(overrides))], '12:00')
  expect(bedsideKit.startsWith?.(context)).toEqual({ spares })
})

test('the unit of the gauge is that of the last check; whether the kit is there is looked at each time', () => {
  const context = aContext([tube, check('09:00', { ...wholeKit, suctionTested: 16, suctionUnit: 'kPa' })], '12:00')
  expect(bedsideKit.startsWith?.(context)).toMatchObject({ suctionUnit: 'kPa' })
  expect(bedsideKit.startsWith?.(context)).not.toHaveProperty('complete')
  expect(bedsideKit).not.toHaveProperty('usual')
})
