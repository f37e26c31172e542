import { expect, test } from 'vitest'
import { aContext, anEntry, aRemoval, aTube, at } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { usedTube } from '../tube-change/supplies.ts'
import { innerCannulaExamples, replacedWithNew } from './examples.ts'
import { type InnerCannulaData, innerCannulaActs } from './schema.ts'
import { innerCannulaUse, plannedInnerCannulas } from './supplies.ts'

const tube = (overrides: Partial<TubeData> = {}) => anEntry(tubeChanges, '2026-03-02 10:00', aTube(overrides))
const recordWith = (...entries: Parameters<typeof aContext>[0]) => aContext(entries, '12:00').record

test('a new cannula takes one, by line, size and the tube that it went into', () => {
  const ofTube = usedTube(aTube())
  expect(innerCannulaUse(replacedWithNew, recordWith(tube()))).toEqual([
    { item: { device: 'inner cannula', id: undefined, line: 'Corvane Dual', size: '8.0', ofTube }, quantity: 1 },
  ])
})

test('a scanned one is known by its catalogue id, and without a tube by itself alone', () => {
  const id = '01890f3c-7d3b-7a44-8f10-2f1d0c9a6b11'
  const used = { device: 'inner cannula', id, line: 'Corvane Dual', size: '8.0', ofTube: undefined }
  expect(innerCannulaUse({ ...replacedWithNew, item: id }, recordWith())).toEqual([{ item: used, quantity: 1 }])
  expect(innerCannulaUse({ ...replacedWithNew, item: id }, null)).toEqual([{ item: used, quantity: 1 }])
})

test.each(innerCannulaExamples.filter(({ act }) => act !== 'replaced'))('$act takes nothing', data => {
  expect(innerCannulaUse(data, recordWith(tube()))).toEqual([])
})

test('one without line or size is not one that could be counted', () => {
  const { size: _, ...rest } = replacedWithNew
  expect(innerCannulaUse(rest as InnerCannulaData, recordWith(tube()))).toEqual([])
})

const plannedOf = (entries: Parameters<typeof aContext>[0], policy = {}) =>
  plannedInnerCannulas(aContext(entries, '12:00', { policy }))

test('a disposable cannula is needed each interval, for as long as this tube is in', () => {
  expect(plannedOf([tube()], { 'inner-cannula-disposable-interval': 8 })).toMatchObject([
    { item: { line: 'Alder', size: '8.0' }, perDay: 3, since: at('2026-03-02 10:00') },
  ])
})

test.each<[string, Parameters<typeof aContext>[0]]>([
  ['a single-cannula tube', [tube({ construction: 'single', innerCannula: undefined, idWithInner: undefined })]],
  ['a reusable pair', [tube({ innerCannula: 'reusable' })]],
  ['no tube', []],
  ['a tube that is out for good', [tube(), aRemoval('2026-03-09 10:00')]],
])('%s needs none', (_, entries) => {
  expect(plannedOf(entries)).toEqual([])
})

test('a tube that went in without one needs what was fitted first', () => {
  const bare = tube({ innerCannula: 'none' })
  const fitted = (act: 'replaced' | 'swapped') => anEntry(innerCannulaActs, '11:00', { ...replacedWithNew, act })
  expect(plannedOf([bare])).toEqual([])
  expect(plannedOf([bare, fitted('replaced')])).toHaveLength(1)
  expect(plannedOf([bare, fitted('swapped')])).toEqual([])
})
