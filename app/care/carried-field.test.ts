import { expect, test } from 'vitest'
import { codes, codesIn, codesText, decidedItem, itemOf } from './carried-field.ts'
import { careFields } from './field.ts'
import { isCarried } from './field-meta.ts'

const item = itemOf({ label: 'Scanned tube', of: 'tube', prints: { line: 'line', size: 'size' } })
const scanned = codes({ label: 'Codes' })
const schema = careFields({ item, scanned, made: decidedItem({ label: 'Made for' }) })

const read = [
  { entry: 'barcode', raw: ']d20109521234543213\u001d10AB' },
  { entry: 'manual', raw: '(17)271231' },
] as const

test('codes are kept one a line, with how each came in', () => {
  expect(codesText(read)).toBe('barcode ]d20109521234543213\u001d10AB\nmanual (17)271231')
  expect(codesIn(codesText(read))).toEqual(read)
})

test('a browser that sends lines with carriage returns changes nothing', () => {
  expect(scanned.parse('barcode a\r\nmanual b')).toBe('barcode a\nmanual b')
})

test.each([
  '',
  'x',
  'barcode',
  'barcode ',
  'voice a',
  'barcode a\n',
  'barcode a\u0000',
  'barcode \ud800',
  'a\nbarcode a',
])('no codes stand in %j', text => {
  expect(codesIn(text)).toBeNull()
  expect(scanned.safeParse(text).success).toBe(false)
})

test('eight codes are enough for one item', () => {
  const of = (count: number) => codesText(Array.from({ length: count }, () => read[1]))
  expect(codesIn(of(8))).toHaveLength(8)
  expect(codesIn(of(9))).toBeNull()
})

test('an item is named by its id alone', () => {
  const id = '019aa7c2-0000-7000-8000-000000000001'
  expect(schema.shape.item.parse(id)).toBe(id)
  expect(schema.shape.item.safeParse('8.0').success).toBe(false)
})

test('nobody is asked for what a scan or the catalogue fills in', () => {
  expect(isCarried({ control: 'codes', label: 'Codes' })).toBe(true)
  expect(isCarried({ control: 'date', label: 'Expiry date' })).toBe(false)
})
