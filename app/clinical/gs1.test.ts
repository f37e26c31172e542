import fc from 'fast-check'
import { expect, test } from 'vitest'
import { type EntryMode, readSymbol } from './gs1.ts'

const today = '2026-12-01'
const GS = '\u001d'
const gtin = '0109521234543213'

function pairs(raw: string, entry: EntryMode = 'barcode') {
  const reading = readSymbol(raw, entry, today)
  return reading.ok ? reading.symbol.elements.map(({ ai, value }) => `${ai}=${value}`) : reading
}

test.each([
  ['the usual order', `]d2${gtin}17271231102B7${GS}21S1`, ['01=09521234543213', '17=271231', '10=2B7', '21=S1']],
  ['lot first', `]C110AB${GS}${gtin}`, ['10=AB', '01=09521234543213']],
  ['no identifier of the symbology', `${gtin}10AB`, ['01=09521234543213', '10=AB']],
  ['a separator in the first place', `${GS}${gtin}10AB`, ['01=09521234543213', '10=AB']],
  [
    'a separator too many after a fixed length',
    `]d2${gtin}${GS}17271231${GS}10AB`,
    ['01=09521234543213', '17=271231', '10=AB'],
  ],
  ['a separator at the end', `]d2${gtin}10AB${GS}`, ['01=09521234543213', '10=AB']],
  ['Enter at the end', `]d2${gtin}10AB\r\n`, ['01=09521234543213', '10=AB']],
  ['only expiry and lot', ']C11727123110AB', ['17=271231', '10=AB']],
  [
    'parts that are stepped over',
    `]d2${gtin}240R-1${GS}3103000123712X${GS}91Y`,
    ['01=09521234543213', '240=R-1', '3103=000123', '712=X', '91=Y'],
  ],
  ['a lot made of brackets', `]d2${gtin}10(17)`, ['01=09521234543213', '10=(17)']],
  ['EAN-13', ']E09521234543213', ['01=09521234543213']],
  ['EAN-8', ']E409521230', ['01=00000009521230']],
  ['a bare item number', '9521234543213', ['01=09521234543213']],
  ['a bare item number that begins like the internal identifier 90', '9012345678906', ['01=09012345678906']],
])('%s is read', (_, raw, elements) => {
  expect(pairs(raw)).toEqual(elements)
})

test.each([
  ['as printed', '(01)09521234543213(17)271231(10)AB', ['01=09521234543213', '17=271231', '10=AB']],
  ['with spaces around', ' (01) 09521234543213 (17) 271231 (10) AB ', ['01=09521234543213', '17=271231', '10=AB']],
  ['one part', '(10)AB', ['10=AB']],
  ['a bare item number', ' 9521234543213 ', ['01=09521234543213']],
  ['a bare number of a carton', '19521234543210', ['01=19521234543210']],
  ['as sent', ']d210AB', ['10=AB']],
])('typed %s is read', (_, raw, elements) => {
  expect(pairs(raw, 'manual')).toEqual(elements)
})

test.each([
  ['nothing', '', 0, /^Nothing was read/],
  ['an identifier alone', ']d2', 3, /^Nothing was read/],
  ['plain Data Matrix', ']d10109521234543213', 0, /not in GS1 form/],
  ['plain Code 128', ']C0HELLO', 0, /not in GS1 form/],
  ['plain QR', ']Q1https://example.org/', 0, /not in GS1 form/],
  ['another symbology', ']X0123', 0, /not in GS1 form/],
  ['a wristband', 'PATIENT 12345', 0, /^This code does not begin as a GS1 code does/],
  ['a wrong check digit', ']d20109521234543214', 18, /item number \(01\) has a check digit/],
  ['an empty lot before a separator', `]d2${gtin}10${GS}21S`, 21, /lot \(10\) is empty/],
  ['an empty lot at the end', `]d2${gtin}10`, 21, /lot \(10\) is empty/],
  ['two separators in a row', `]d210A${GS}${GS}21S`, 7, /^What follows the lot \(10\)/],
  ['a part cut short', `]d217271${GS}10A`, 8, /expiry date \(17\) ends too early/],
  ['a space in the lot', `]d210A B`, 6, /lot \(10\) has a character/],
  ['an unknown identifier', `]d2${gtin}05X`, 19, /^What follows the item number \(01\)/],
  ['month 13', `]d2${gtin}17131313`, 21, /expiry date \(17\) is no day of the calendar: 131313/],
  ['a swallowed lot', `]d210${'A'.repeat(18)}17271231`, 25, /longer than 20 characters\..*may leave out separators/],
  ['an EAN-13 of 12 digits', ']E0952123454321', 3, /should have 13 digits/],
  ['an EAN-13 misread', ']E09521234543214', 3, /do not fit its check digit/],
  ['digits with two meanings', '10952123454321', 0, /read in two ways/],
])('%s is refused', (_, raw, at, says) => {
  expect(pairs(raw)).toEqual({ ok: false, at, says: expect.stringMatching(says) })
})

test.each([
  ['a check digit', '(01)09521234543214', 17, /check digit/],
  ['a bare number', '9521234543214', 0, /do not fit its check digit/],
  ['a bracket in the lot', '(01)09521234543213(10)A(B', 23, /^What follows the lot/],
  ['an unknown identifier', '(01)09521234543213(05)1', 18, /^What follows the item number/],
  ['half an identifier', '(310)000123', 0, /does not begin as a GS1 code/],
  ['a space in the lot', '(10) A B', 6, /has a character/],
  ['an empty lot', '(10) (21)S', 5, /lot \(10\) is empty/],
  ['words', 'lot AB', 0, /does not begin as a GS1 code/],
])('typed wrongly, %s is refused', (_, raw, at, says) => {
  expect(pairs(raw, 'manual')).toEqual({ ok: false, at, says: expect.stringMatching(says) })
})

test('what came in is kept as it came', () => {
  const raw = `]d2${gtin}10AB\r`
  expect(readSymbol(raw, 'barcode', today)).toMatchObject({
    symbol: { raw, entry: 'barcode', symbology: ']d2', form: 'element string' },
  })
  expect(readSymbol(' (10)AB', 'manual', today)).toMatchObject({
    symbol: { raw: ' (10)AB', entry: 'manual', symbology: null, form: 'bracketed', elements: [{ ai: '10', at: 5 }] },
  })
})

test.each(['\r'.repeat(100_000), ' '.repeat(100_000), '('.repeat(100_000), `${gtin}17271231`.repeat(10_000)])(
  'a long hostile text is refused as a short one is',
  raw => {
    for (const entry of ['barcode', 'manual'] as const) expect(readSymbol(`${raw}x`, entry, today).ok).toBe(false)
  },
)

test('no text makes the reader fail, and every refusal points into the text', () => {
  const piece = fc.oneof(
    fc.string({ unit: 'binary' }),
    fc.string(),
    fc.constantFrom(
      ']d2',
      ']E0',
      ']',
      GS,
      gtin,
      '17271231',
      '10',
      '21',
      '(01)',
      '(10)',
      '\ud83d',
      '\udc00',
      '\u0000',
      '\r',
    ),
  )
  const text = fc.array(piece, { maxLength: 8 }).map(pieces => pieces.join(''))
  fc.assert(
    fc.property(text, fc.constantFrom('barcode' as const, 'manual' as const), (raw, entry) => {
      const reading = readSymbol(raw, entry, today)
      if (reading.ok) expect(reading.symbol.elements.length).toBeGreaterThan(0)
      else expect(reading.at >= 0 && reading.at <= raw.length && reading.says.endsWith('.')).toBe(true)
    }),
    { numRuns: 300 },
  )
})
