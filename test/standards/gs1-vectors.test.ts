// The parser of scanned labels against published codes. Numbers with prefixes other than 0952 are published examples, none of a real item.
import { expect, test } from 'vitest'
import { type Gs1Element, readSymbol } from '#app/clinical/gs1.ts'
import { fullYear, labelDate } from '#app/clinical/gs1-dates.ts'
import { checkDigit, hasCheckDigit } from '#app/clinical/gs1-gtin.ts'
import { itemOf } from '#app/clinical/gs1-scan.ts'

const today = '2026-12-01'

function elements(raw: string): Readonly<Record<string, string>> | string {
  const reading = readSymbol(raw.replaceAll('^', '\u001d'), 'barcode', today)
  if (!reading.ok) return reading.says
  return Object.fromEntries(reading.symbol.elements.map(({ ai, value }: Gs1Element) => [ai, value]))
}

function item(raw: string) {
  return itemOf([{ raw: raw.replaceAll('^', '\u001d'), entry: 'barcode', sendsSeparator: true }], today)
}

// Below, ^ stands for the group separator.

// BWIPP wiki, "GS1 Application Identifier Standard Format".
test('S-01 the example of the BWIPP manual', () => {
  const raw = ']d201095212345432131710010110123ABC^211234567890'
  expect(elements(raw)).toEqual({ '01': '09521234543213', 17: '100101', 10: '123ABC', 21: '1234567890' })
  expect(item(raw)).toMatchObject({ item: { expiresOn: '2010-01-01', expiryMonthOnly: false } })
})

// gs1-syntax-engine 1.4.1, tests of scan data.
test.each([']C1', ']d2', ']Q3', ']e0'])('S-02 %s marks an element string', symbology => {
  const raw = `${symbology}011231231231233310ABC123^99TESTING`
  expect(elements(raw)).toEqual({ '01': '12312312312333', 10: 'ABC123', 99: 'TESTING' })
})

// Sample of a unique device identification by GS1 for the US Food and Drug Administration.
test('S-03 the sample label of a device', () => {
  expect(item(']d20151022222233336111412311715070710A213B1^211234')).toMatchObject({
    item: { gtin: '51022222233336', producedOn: '2014-12-31', expiresOn: '2015-07-07', lot: 'A213B1', serial: '1234' },
  })
})

// Computed; GS1's own engine, BWIPP and zint agree.
test('S-04 the check digit of 0952123454321 is 3, so that 4 is refused', () => {
  expect(elements(']C10109521234543213')).toEqual({ '01': '09521234543213' })
  expect(elements(']C10109521234543214')).toMatch(/check digit/)
})

// gs1-syntax-engine 1.4.1, tests of application identifiers.
test('S-05 a weight beside an item number, and the same with a wrong check digit', () => {
  expect(elements('(01)95012345678903(3103)000123')).toEqual({ '01': '95012345678903', 3103: '000123' })
  expect(elements('(01)95012345678902(3103)000123')).toMatch(/check digit/)
})

test('S-06 month 13 is refused', () => {
  expect(elements('(01)95012345678903(11)131313')).toMatch(/no day of the calendar/)
})

// gs1.org, "How to calculate a check digit manually".
test('S-07 the worked example of GS1: 629104150021 and then 3', () => {
  expect(checkDigit('629104150021')).toBe(3)
})

// gs1-syntax-dictionary, tests of the check digit linter.
test.each([
  ['02345673', true],
  ['12345673', false],
  ['416000336108', true],
  ['416000336109', false],
  ['1234567890128', true],
  ['1234567890129', false],
  ['12345678901231', true],
  ['12345678901232', false],
])('S-07 the check digit of %s fits: %s', (digits, fits) => {
  expect(hasCheckDigit(digits)).toBe(fits)
})

// gs1-syntax-dictionary, tests of the linter for dates whose day may be 00.
test.each([
  ['000606', '2000-06-06'],
  ['500606', '2050-06-06'],
  ['750606', '2075-06-06'],
  ['200229', '2020-02-29'],
  ['240229', '2024-02-29'],
  ['000229', '2000-02-29'],
  ['200600', '2020-06-30'],
])('S-08 %s is %s', (digits, on) => {
  expect(labelDate(digits, today)?.on).toBe(on)
})

test.each(['200010', '201310', '200132', '210229', '240230', '200431'])('S-08 %s is no date', digits => {
  expect(labelDate(digits, today)).toBeNull()
})

// gs1-syntax-engine 1.4.1, tests of raw element strings.
test('S-09 a separator too many is let pass, a digit too many or too few is not', () => {
  expect(elements('^0112345678901231^')).toEqual({ '01': '12345678901231' })
  expect(elements('^01123456789012312')).toMatch(/not known to GS1/)
  expect(elements('^011234567890123')).toMatch(/ends too early/)
})

// gs1-syntax-engine 1.4.1, tests of scan data.
test.each([
  [']E02112345678900', '02112345678900'],
  [']E402345673', '00000002345673'],
])('S-10 %s is item %s', (raw, gtin) => {
  expect(item(raw)).toMatchObject({ item: { gtin } })
})

// A public knowledge base on encoding; GS1's own engine agrees.
test('S-11 a delivery address is stepped over', () => {
  expect(item(']d201034531200000111712050810ABCD1234^4109501101020917')).toMatchObject({
    item: { gtin: '03453120000011', expiresOn: '2012-05-08', lot: 'ABCD1234' },
  })
})

// GS1 General Specifications, note on day 00: the last day of the month, leap years included.
test.each([
  ['130200', '2013-02-28'],
  ['160200', '2016-02-29'],
])('S-12 expiry %s is %s', (digits, expiresOn) => {
  expect(item(`]d2011234567890123117${digits}10A`)).toMatchObject({
    item: { expiresOn, expiryMonthOnly: true, lot: 'A' },
  })
})

// GS1 General Specifications 7.12: the difference to the running year decides, 51 to 99 back, -99 to -50 ahead.
test('the century of all two-digit years follows the rule of GS1 in every year of this century', () => {
  for (let year = 2000; year < 2100; year++) {
    for (let digits = 0; digits < 100; digits++) {
      const difference = digits - (year % 100)
      const century = difference >= 51 ? 1900 : difference <= -50 ? 2100 : 2000
      expect(fullYear(digits, year)).toBe(century + digits)
    }
  }
})

// Held against GS1's own engine, which accepts the code as it stands.
test('a code without its separator reads as GS1 reads it, but is suspected', () => {
  const raw = ']d2010952123454321310123ABC17271231'
  expect(elements(raw)).toEqual({ '01': '09521234543213', 10: '123ABC17271231' })
  expect(itemOf([{ raw, entry: 'barcode', sendsSeparator: false }], today)).toMatchObject({
    item: { lot: '123ABC17271231', expiresOn: null, separatorMissing: { ai: '10' } },
  })
})
