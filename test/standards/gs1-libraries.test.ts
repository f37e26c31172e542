// The parser of scanned labels against two libraries: gs1-barcode-parser-mod reads, without judging, what is valid;
// bwip-js judges by the GS1 Barcode Syntax Dictionary what may be printed.
import bwipjs from 'bwip-js/node'
import fc from 'fast-check'
import { parseBarcode } from 'gs1-barcode-parser-mod'
import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import { readSymbol } from '#app/clinical/gs1.ts'
import { labelDate } from '#app/clinical/gs1-dates.ts'
import { ownLength } from '#app/clinical/gs1-elements.ts'
import { checkDigit } from '#app/clinical/gs1-gtin.ts'
import { itemOf } from '#app/clinical/gs1-scan.ts'

type Part = readonly [ai: string, value: string]

const today = '2026-12-01'

// Both libraries take the century from the clock of the machine.
beforeEach(() => {
  vi.setSystemTime('2026-12-01T12:00:00Z')
})
afterEach(() => {
  vi.useRealTimers()
})

const SET_82 = '!"%&\'()*+,-./0123456789:;<=>?ABCDEFGHIJKLMNOPQRSTUVWXYZ_abcdefghijklmnopqrstuvwxyz'
const words = (most: number, set = SET_82) =>
  fc.string({ unit: fc.constantFrom(...Array.from(set)), minLength: 1, maxLength: most })
const digits = (length: number) =>
  fc.string({ unit: fc.constantFrom(...Array.from('0123456789')), minLength: length, maxLength: length })
const gtin = digits(9).map(serial => `0952${serial}${checkDigit(`0952${serial}`)}`)
const date = fc
  .tuple(fc.integer({ min: 0, max: 99 }), fc.integer({ min: 1, max: 12 }), fc.integer({ min: 0, max: 28 }))
  .map(numbers => numbers.map(number => String(number).padStart(2, '0')).join(''))

const part = (ai: string, value: fc.Arbitrary<string>) => value.map((text): Part => [ai, text])

/** Parts of which any may stand on one item, and each at most once. */
function label(set = SET_82): fc.Arbitrary<readonly Part[]> {
  const others = [
    part('10', words(20, set)),
    part('11', date),
    part('17', date),
    part('21', words(20, set)),
    part('22', words(20, set)),
    part('240', words(30, set)),
    part('3103', digits(6)),
    part('712', words(20, set)),
    part('91', words(90, set)),
  ]
  return fc
    .tuple(part('01', gtin), ...others)
    .chain(([number, ...rest]) => fc.shuffledSubarray(rest).map(chosen => [number, ...chosen]))
    .chain(parts => fc.shuffledSubarray(parts, { minLength: parts.length }))
}

/** The parts as a scanner sends them. `extra` puts a separator after every part, where none is needed too. */
function sent(parts: readonly Part[], extra = false): string {
  const ended = parts.map(([ai, value], i) => {
    const last = i === parts.length - 1
    return `${ai}${value}${extra || (ownLength(ai) === null && !last) ? '\u001d' : ''}`
  })
  return ended.join('')
}

const printed = (parts: readonly Part[]) => parts.map(([ai, value]) => `(${ai})${value}`).join('')

function isPrintable(text: string): boolean {
  try {
    return bwipjs.raw({ bcid: 'gs1datamatrix', text }).length > 0
  } catch (error) {
    if (error instanceof Error && error.message.startsWith('bwipp.GS1')) return false
    throw error
  }
}

test('gs1-barcode-parser-mod reads the same parts and dates from every valid code', () => {
  const symbology = fc.constantFrom(']C1', ']d2', ']Q3')
  fc.assert(
    fc.property(label(), symbology, fc.boolean(), (parts, id, extra) => {
      const code = id + sent(parts, extra)
      const { parsedCodeItems } = parseBarcode(code)
      const reading = readSymbol(code, 'barcode', today)
      expect(reading.ok && reading.symbol.elements.map(({ ai, value }) => [ai, value])).toEqual(
        parsedCodeItems.map(({ ai, raw }) => [ai, raw]),
      )
      for (const { ai, raw, isoDate } of parsedCodeItems)
        if (ai === '11' || ai === '17') expect(labelDate(raw, today)?.on).toBe(isoDate)
    }),
    { numRuns: 100 },
  )
})

test('what bwip-js prints is read back as it was, scanned and typed', () => {
  // No brackets: neither bwip-js nor a reader of print can tell those in a value from those around an identifier.
  fc.assert(
    fc.property(label(SET_82.replace(/[()]/g, '')), parts => {
      expect(isPrintable(printed(parts))).toBe(true)
      for (const [raw, entry] of [
        [printed(parts), 'manual'],
        [sent(parts), 'barcode'],
      ] as const) {
        const reading = readSymbol(raw, entry, today)
        expect(reading.ok && reading.symbol.elements.map(({ ai, value }) => [ai, value])).toEqual(parts)
      }
    }),
    { numRuns: 40 },
  )
})

/** Labels with mistakes: wrong check digits, impossible dates, lengths, characters, identifiers and pairs. */
const mistaken: fc.Arbitrary<readonly Part[]> = fc.array(
  fc.oneof(
    part('01', fc.oneof(gtin, digits(14), digits(13), digits(15), words(14))),
    part('01', fc.constant('09521234543213')),
    part('10', fc.oneof(words(30), fc.constantFrom('', 'A~', 'A B', 'Ä', 'A\u001d', '😀'))),
    part('11', fc.oneof(date, digits(6), digits(5))),
    part('17', fc.oneof(date, digits(6), fc.constantFrom('270230', '271301', '270001', '270431', '', '27123'))),
    part('21', fc.oneof(words(22), fc.constantFrom('', '#', 'A\nB'))),
    fc.constantFrom<Part>(['02', '09521234543213'], ['37', '2'], ['235', 'T'], ['8006', '095212345432130102']),
    fc.constantFrom<Part>(['05', '1'], ['1', '2'], ['3106', '000123'], ['3103', '12'], ['240', ''], ['', 'A']),
  ),
  { minLength: 1, maxLength: 4 },
)

function isItem(raw: string): boolean {
  return itemOf([{ raw, entry: 'manual', sendsSeparator: false }], today).ok
}

test('what bwip-js refuses is never accepted, and what it takes is accepted with its item number', () => {
  let refused = 0
  fc.assert(
    fc.property(mistaken, parts => {
      const text = printed(parts)
      const printable = isPrintable(text)
      if (!printable) refused++
      expect(isItem(text)).toBe(printable && parts.some(([ai]) => ai === '01'))
    }),
    { numRuns: 300 },
  )
  expect(refused).toBeGreaterThan(50)
})

test.each([
  '(01)09521234543214',
  '(01)09521234543213(17)271301',
  '(01)09521234543213(17)270230',
  '(01)09521234543213(10)123456789012345678901',
  '(01)09521234543213(10)',
  '(01)09521234543213(10)A~B',
  '(01)09521234543213(05)1',
  '(10)ABC',
  '(01)09521234543213(37)2',
  '(01)09521234543213(10)A(10)B',
])('bwip-js and the parser both refuse %s', text => {
  expect(isPrintable(text)).toBe(false)
  expect(isItem(text)).toBe(false)
})

test('both accept a date by the month', () => {
  expect(isPrintable('(01)09521234543213(17)271100')).toBe(true)
  expect(isItem('(01)09521234543213(17)271100')).toBe(true)
})
