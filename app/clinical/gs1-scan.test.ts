import fc from 'fast-check'
import { expect, test } from 'vitest'
import { type Gs1Scan, itemOf } from './gs1-scan.ts'

const today = '2026-12-01'
const gtin = '0109521234543213'

const scanned = (raw: string): Gs1Scan => ({ raw, entry: 'barcode', sendsSeparator: false })
const typed = (raw: string): Gs1Scan => ({ raw, entry: 'manual', sendsSeparator: false })

test('one code may say everything', () => {
  const raw = `]d2${gtin}112610311728110010AB\u001d21S7`
  expect(itemOf([scanned(raw)], today)).toEqual({
    ok: true,
    item: {
      gtin: '09521234543213',
      lot: 'AB',
      serial: 'S7',
      expiresOn: '2028-11-30',
      expiryMonthOnly: true,
      producedOn: '2026-10-31',
      productionMonthOnly: false,
      separatorMissing: null,
      symbols: [expect.objectContaining({ raw, symbology: ']d2', entry: 'barcode' })],
    },
  })
})

test('what a label leaves out is null', () => {
  expect(itemOf([scanned(']E09521234543213')], today)).toMatchObject({
    item: {
      gtin: '09521234543213',
      lot: null,
      serial: null,
      expiresOn: null,
      expiryMonthOnly: false,
      producedOn: null,
    },
  })
})

test('item number and lot may come from two codes, in either order, one scanned and one typed', () => {
  const codes = [scanned(`]C1${gtin}`), typed('(17)271231(10)AB')]
  for (const scans of [codes, codes.toReversed()]) {
    expect(itemOf(scans, today)).toMatchObject({
      ok: true,
      item: { gtin: '09521234543213', lot: 'AB', expiresOn: '2027-12-31' },
    })
  }
})

test('a code without an item number waits for the other one', () => {
  expect(itemOf([scanned(']C11727123110AB')], today)).toMatchObject({
    ok: false,
    scan: 0,
    says: 'The item number (01) is still missing. Scan the other code on the label.',
    soFar: { lot: 'AB', expiresOn: '2027-12-31' },
  })
})

test('no code at all waits for the item number', () => {
  expect(itemOf([], today)).toMatchObject({ ok: false, scan: 0, at: 0, soFar: { lot: null, symbols: [] } })
})

test('a code read twice changes nothing', () => {
  const one = itemOf([scanned(`]d2${gtin}10AB`)], today)
  const two = itemOf([scanned(`]d2${gtin}10AB`), scanned(`]d2${gtin}10AB`)], today)
  expect(two).toMatchObject({ ok: one.ok, item: { gtin: '09521234543213', lot: 'AB' } })
})

test.each([
  [
    'another item',
    [`]C1${gtin}`, ']C10109521234543220'],
    1,
    5,
    /gives the item number \(01\) otherwise than the code before/,
  ],
  ['another lot', [`]C1${gtin}10AB`, ']C110AC'], 1, 5, /gives the lot \(10\) otherwise than the code before/],
  ['two lots in one code', [`]C1${gtin}10AB\u001d10AC`], 0, 26, /gives the lot \(10\) twice, with different values/],
  ['a carton of two', [`]C1${gtin}372`], 0, 21, /for a carton or a piece/],
  ['a carton beside an item', [`]C1${gtin}`, ']C10209521234543213372'], 1, 5, /for a carton or a piece/],
  ['two kinds of serial number', [`]C1${gtin}21A\u001d235B`], 0, 26, /two kinds of serial number/],
  ['a misread code', [`]C1${gtin}`, ']C117131313'], 1, 5, /no day of the calendar/],
])('%s is refused, at the code that does not fit', (_, raws, scan, at, says) => {
  const reading = itemOf(raws.map(scanned), today)
  expect(reading).toEqual({ ok: false, scan, at, says: expect.stringMatching(says) })
})

test('a lot that may have swallowed the expiry date is kept, with the suspicion', () => {
  const raw = `]d2${gtin}10123ABC17271231`
  expect(itemOf([scanned(raw)], today)).toMatchObject({
    ok: true,
    item: {
      lot: '123ABC17271231',
      expiresOn: null,
      separatorMissing: { ai: '10', readings: [[{ value: '123ABC' }, { ai: '17', value: '271231' }]] },
    },
  })
})

test('a scanner that is known to send separators is believed', () => {
  const raw = `]d2${gtin}10123ABC17271231`
  expect(itemOf([{ raw, entry: 'barcode', sendsSeparator: true }], today)).toMatchObject({
    item: { lot: '123ABC17271231', separatorMissing: null },
  })
})

test('the suspicion may come from the second of two codes', () => {
  expect(itemOf([scanned(`]C1${gtin}`), scanned(']C110AB17271231')], today)).toMatchObject({
    item: { separatorMissing: { ai: '10' } },
  })
})

test('no texts make the reading fail', () => {
  const text = fc.oneof(fc.string({ unit: 'binary' }), fc.constantFrom(`]d2${gtin}`, ']C110AB17271231', '(21)\ud83d'))
  fc.assert(
    fc.property(fc.array(text, { maxLength: 4 }), raws => {
      const reading = itemOf(raws.map(scanned), today)
      expect(reading.ok || reading.scan < Math.max(raws.length, 1)).toBe(true)
    }),
  )
})

test('the order of scans never changes an item', () => {
  const codes = [`]C1${gtin}`, ']C1112610311727110010AB', ']C121S7', `(01)09521234543213`].map(scanned)
  const read = (scans: readonly Gs1Scan[]) => {
    const reading = itemOf(scans, today)
    return reading.ok ? { ...reading.item, symbols: [] } : reading
  }
  fc.assert(
    fc.property(fc.shuffledSubarray(codes, { minLength: 4 }), scans => {
      expect(read(scans)).toEqual(read(codes))
    }),
    { numRuns: 24 },
  )
})
