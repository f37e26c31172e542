import { expect, test } from 'vitest'
import { aContext, anEntry, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { innerCannulaExamples, replacedWithNew } from './examples.ts'
import { innerCannula } from './kind.ts'
import { type InnerCannulaData, innerCannulaSchema } from './schema.ts'
import { innerCannulaSentence } from './sentence.ts'

const withTube = (overrides: Parameters<typeof aTube>[0] = {}) =>
  aContext([anEntry(tubeChanges, '2026-03-02 10:00', aTube(overrides))], '12:00')

const problemsOf = (data: object) => innerCannulaSchema.safeParse(data).error?.issues.map(issue => issue.message)

test('the form starts with line and size of a dual tube, and with nothing else', () => {
  expect(innerCannula.startsWith?.(withTube())).toEqual({ line: 'Alder', size: '8.0' })
  const single = { construction: 'single', innerCannula: undefined, idWithInner: undefined } as const
  expect(innerCannula.startsWith?.(withTube(single))).toEqual({})
  expect(innerCannula.startsWith?.(aContext([], '12:00'))).toEqual({})
})

test.each<[TubeData['innerCannula'], object]>([
  ['disposable', { act: 'replaced' }],
  ['reusable', { act: 'swapped', other: 'cleaning' }],
])('the usual act for a %s one is %j, without its condition', (type, act) => {
  expect(innerCannula.usual?.(withTube({ innerCannula: type }))?.answers).toEqual({
    ...act,
    line: 'Alder',
    size: '8.0',
    locked: 'yes',
    spare: 'yes',
    tolerance: 'well',
  })
})

test('the usual act needs only the condition to be complete', () => {
  const answers = innerCannula.usual?.(withTube())?.answers
  expect(problemsOf({ ...answers })).toEqual(['Choose the condition found'])
  expect(problemsOf({ ...answers, condition: 'light' })).toBeUndefined()
})

test('there is no usual act without a tube, or while none was ever fitted', () => {
  expect(innerCannula.usual?.(aContext([], '12:00'))).toBeUndefined()
  expect(innerCannula.usual?.(withTube({ innerCannula: 'none' }))).toBeUndefined()
})

test('line and size are asked for when another cannula went in', () => {
  const { line: _line, size: _size, ...rest } = replacedWithNew
  expect(problemsOf(rest)).toEqual(['Enter the line of the inner cannula', 'Enter the size of the inner cannula'])
  expect(problemsOf({ ...rest, act: 'inspected' })).toBeUndefined()
})

test('what was not in place cannot have been looked at or cleaned', () => {
  expect(problemsOf({ ...replacedWithNew, act: 'cleaned', condition: 'none' })).toEqual([
    'None was in place: choose what was fitted, or why not',
  ])
})

test('an act that could not be done needs a reason and no lock', () => {
  const unable = { act: 'unable', condition: 'not seen', spare: 'yes', tolerance: 'well' }
  expect(problemsOf(unable)).toEqual(['Choose the reason it could not be done'])
  expect(problemsOf({ ...unable, whyUnable: 'stuck', locked: 'yes' })).toEqual(['Leave out the lock here'])
})

test.each<[Partial<InnerCannulaData>, boolean]>([
  [{}, false],
  [{ condition: 'moderate' }, false],
  [{ condition: 'heavy' }, true],
  [{ condition: 'blocked' }, true],
  [{ act: 'unable', whyUnable: 'other', locked: undefined }, true],
])('%o is drawn out of range: %s', (overrides, out) => {
  expect(innerCannula.outOfRange?.({ ...replacedWithNew, ...overrides }, withTube())).toBe(out)
})

test('the sentence says what was done, found and left', () => {
  expect(innerCannulaExamples.map(innerCannulaSentence)).toEqual([
    'Inner cannula replaced with new. Found with a light coating. Corvane Dual, 8.0. Locked. Spare at the bedside. Tolerated well.',
    'Inner cannula looked at and put back. Found clear. Corvane Dual, 8.0. Locked. Spare at the bedside. Coughed.',
    'Inner cannula swapped for the clean spare. Found half blocked or more. Halden, 6. Locked. Spare at the bedside. SpO2 fell to 90%. Secretions moderate, yellow, thick. Oxygen given before. With T. Okafor. Nebuliser given before.',
    'Inner cannula cleaned and put back. Found less than half blocked. Halden, 6, lot H26-0192, expires 31-Jan-2029. Locked. No spare at the bedside. Tolerated well.',
    'Inner cannula care could not be done: it would not come out. Condition not seen. Spare at the bedside. Coughed. Specialist called.',
    'Inner cannula left in; the other one of the pair seen to. Spare at the bedside. Other one of the pair: clean and ready. Dried and closed in its box.',
    'Inner cannula replaced with new. Found with a light coating. Found cleaned and used again, though single use. Corvane Dual, 8.0. Locked. Spare at the bedside. Tolerated well.',
  ])
})

test('left out, the sentence names no cannula in place', () => {
  const data = { ...replacedWithNew, act: 'unable', whyUnable: 'not back', locked: undefined } as const
  expect(innerCannula.summary(data)).toContain('None in place now.')
})

test('only the change of a disposable one opens with its act', () => {
  expect(innerCannula.tasks?.map(({ name, opensWith }) => [name, opensWith])).toEqual([
    ['inner-cannula-inspection', undefined],
    ['inner-cannula-change', { act: 'replaced' }],
    ['inner-cannula-clean', undefined],
  ])
})

test('each task says its rule with the values in force', () => {
  const says = innerCannula.tasks?.map(task => task.says(withTube()))
  expect(says?.[0]).toMatch(
    /^Every 8 h; every 4 h in the first 48 h of a tube; within 2 h of a heavy coating or a block\./,
  )
  expect(says?.[1]).toBe('A disposable inner cannula is replaced with a new one every 12 h.')
  expect(says?.[2]).toMatch(/at least every 24 h\./)
})
