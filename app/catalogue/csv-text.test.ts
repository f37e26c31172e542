import fc from 'fast-check'
import { expect, test } from 'vitest'
import { csvText, readCsvText } from './csv-text.ts'

test('every cell is read back as it was written', () => {
  const cell = fc.oneof(
    fc.string({ unit: 'binary' }),
    fc.constantFrom(
      '=1+1',
      '+44',
      '-8',
      '@x',
      "'=x",
      "''-1",
      '"',
      '""',
      'a;b',
      'a,b',
      'a\nb',
      'a\r\nb',
      '\t',
      '＝x',
      "'",
      '',
    ),
  )
  fc.assert(
    fc.property(fc.array(fc.array(cell, { minLength: 2, maxLength: 4 }), { minLength: 1 }), rows => {
      const filled = rows.filter(cells => cells.some(text => text.trim() !== ''))
      const read = readCsvText(csvText(filled))
      expect('rows' in read && read.rows.map(({ cells }) => cells)).toEqual(filled)
    }),
  )
})

test.each(['=HYPERLINK("http://x.example")', '+1', '-1', '@SUM(A1)', '\tx', '＝1'])(
  '%j is no formula in a file',
  cell => {
    expect(csvText([[cell]])).toMatch(/^\uFEFF"?'/)
  },
)

test('a number below nothing stays a number', () => {
  expect(csvText([[-4, 0.5, '-4']])).toBe("\uFEFF-4,0.5,'-4\r\n")
})

test('a file says that it is UTF-8 and ends its lines as table programs do', () => {
  expect(
    csvText([
      ['é', 'b'],
      ['c', 'd'],
    ]),
  ).toBe('\uFEFFé,b\r\nc,d\r\n')
})
