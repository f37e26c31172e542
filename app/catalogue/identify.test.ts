import { expect, test } from 'vitest'
import { type UsedCannula, type UsedTube, unidentified } from '../care/supply.ts'
import { identifyIn, itemKey, type Listing } from './identify.ts'

const tube = { line: 'Corvane', size: '8.0', cuff: 'air', fenestrated: 'no' }
const plain = { line: 'Corvane', size: '8.0', fenestrated: 'no', use: 'disposable' }
const listing: Listing = {
  tubes: [
    { id: 't-plain', ...tube },
    { id: 't-holes', ...tube, fenestrated: 'yes' },
    { id: 't-lone', ...tube, line: 'Halden', size: '6' },
  ],
  cannulas: [
    { id: 'c-plain', ...plain },
    { id: 'c-holes', ...plain, fenestrated: 'yes' },
    { id: 'c-lone', ...plain, line: 'Halden', size: '6', use: 'reusable' },
  ],
  fits: [
    { tubeId: 't-plain', innerCannulaId: 'c-plain' },
    { tubeId: 't-holes', innerCannulaId: 'c-holes' },
    { tubeId: 't-lone', innerCannulaId: 'c-lone' },
  ],
}
const keyOf = (item: Parameters<ReturnType<typeof identifyIn>>[0]) => itemKey(identifyIn(listing)(item))
const usedTube = (more: Partial<UsedTube> = {}): UsedTube => ({ device: 'tube', ...tube, ...more })
const used = (more: Partial<UsedCannula> = {}): UsedCannula => ({
  ...{ device: 'inner cannula', line: 'Corvane', size: '8.0' },
  ...more,
})

test.each<[string, Partial<UsedTube>, string]>([
  ['by its id, whatever is printed', { id: 'T-HOLES', line: 'Another' }, 't-holes'],
  ['by print, cuff and fenestration', {}, 't-plain'],
  ['by print alone where there is one', { line: ' halden ', size: '6.0', cuff: 'none' }, 't-lone'],
  ['not at all, where none is so', { cuff: 'foam' }, unidentified.tube],
  ['not at all, of another line', { line: 'Marrow' }, unidentified.tube],
])('a tube is told %s', (_, more, key) => {
  expect(keyOf(usedTube(more))).toBe(key)
})

test.each<[string, Partial<UsedCannula>, string]>([
  ['by its id', { id: 'c-holes' }, 'c-holes'],
  ['by the tube it went into, where two are printed alike', { ofTube: usedTube({ fenestrated: 'yes' }) }, 'c-holes'],
  ['not by a guess between two', {}, unidentified.innerCannula],
  ['by print alone where there is one', { line: 'Halden', size: '6' }, 'c-lone'],
  ['not at all, where the tube is not known', { ofTube: usedTube({ line: 'Marrow' }) }, unidentified.innerCannula],
  [
    'as the disposable one of its tube, where what is printed is in no list',
    { line: 'Misread', ofTube: usedTube() },
    'c-plain',
  ],
])('an inner cannula is told %s', (_, more, key) => {
  expect(keyOf(used(more))).toBe(key)
})

test('what is kept by name is itself', () => {
  expect(keyOf({ supply: 'exchanger' })).toBe('exchanger')
})
