import { expect, test } from 'vitest'
import { demoCatalogue } from '#database/seeders/catalogue.ts'
import { columns, headings } from './columns.ts'
import { csvText, readCsvText } from './csv-text.ts'
import { importPlan, type PlannedRow } from './import-plan.ts'
import { type Catalogue, catalogueCells } from './known-items.ts'

const empty: Catalogue = { lines: [], tubes: [], innerCannulas: [], fits: [] }
const exported = csvText([
  columns.map(column => headings[column]),
  ...catalogueCells(demoCatalogue).map(cells => columns.map(column => cells[column])),
])
let minted = 0
const newId = () => `019acb00-0000-7000-8000-${String(++minted).padStart(12, '0')}`

const HEAD =
  'Item,Line,Maker,Size,Size system,Construction,Inner cannula,ID with inner cannula mm,ID of outer tube mm,OD mm,Length mm,Cuff,Fenestrated,15 mm connector,Flange,Insertion aid,Reusable inner cannulas,Inner cannulas that fit,Use,Pack size,GTIN'
const TUBE = 'tube,Ferrin,Oskerry,8.0,ISO 5366,single,,,8,11,80,air,no,outer,fixed,yes,0,,,,'
const DUAL =
  'tube,Ferrin,Oskerry,7.0,ISO 5366,dual,disposable,7,8,10.5,75,air,no,outer,fixed,yes,0,7.0 disposable x10,,,'
const CANNULA = 'inner cannula,Ferrin,Oskerry,7.0,,,,,,,,,no,,,,,,disposable,10,'

function rowsOf(text: string, catalogue: Catalogue = demoCatalogue): readonly PlannedRow[] {
  const plan = importPlan(text, catalogue, newId)
  if ('fault' in plan) throw new Error(`${plan.fault.line}: ${plan.fault.says}`)
  return plan.rows
}
const told = (text: string, catalogue?: Catalogue) =>
  rowsOf(text, catalogue).map(({ line, fate, errors }) => [
    line,
    fate,
    ...errors.map(({ heading, says }) => `${heading}: ${says}`),
  ])

test('what was exported is the same item for item when it is imported again', () => {
  expect(new Set(rowsOf(exported).map(({ fate }) => fate))).toEqual(new Set(['same']))
})

test('what was exported fills an empty catalogue with the same lines', () => {
  const rows = rowsOf(exported, empty)
  expect(new Set(rows.map(({ fate }) => fate))).toEqual(new Set(['new']))
  expect(rows.map(({ cells }) => cells)).toEqual(catalogueCells(demoCatalogue))
})

test('new items of one file may name each other, in any order, whatever separates the cells', () => {
  expect(told([HEAD, DUAL, CANNULA, TUBE].join('\n'))).toEqual([
    [2, 'new'],
    [3, 'new'],
    [4, 'new'],
  ])
  const semicolons = [HEAD, TUBE.replace(',8,11,80,', ',"8,0","11,0",80,')].map(line =>
    line.replace(/"[^"]*"|,/g, part => (part === ',' ? ';' : part)),
  )
  expect(told(semicolons.join('\r\n'))).toEqual([[2, 'new']])
})

test('a change says what was and what is to be', () => {
  const text = exported.replace(',9,11.3,78,air,no,', ',9,11.4,78,air,no,')
  const changed = rowsOf(text).filter(({ fate }) => fate !== 'same')
  expect(changed.map(({ changes }) => changes)).toEqual([[{ heading: 'OD mm', was: '11.3', now: '11.4' }]])
})

test('an item without an id is known by its GTIN, else by all that describes it', () => {
  const [tube] = demoCatalogue.tubes
  const lines = exported.split('\r\n')
  const line = lines.find(text => text.includes(tube?.id ?? 'none'))?.replace(tube?.id ?? '', '') ?? ''
  expect(told([lines[0], line].join('\r\n'))).toEqual([[2, 'same']])
  expect(told([lines[0], line.replace(tube?.gtin ?? '', '')].join('\r\n'))).toEqual([[2, 'changed']])
})

test('a column that is left out keeps what is known', () => {
  const [tube] = demoCatalogue.tubes
  const text = `Item,Id,Line,Maker,Size,OD mm\ntube,${tube?.id},Corvane Dual,Quillmere Works,6.0,9.4`
  expect(rowsOf(text).map(({ changes }) => changes)).toEqual([[{ heading: 'OD mm', was: '9.3', now: '9.4' }]])
})

test.each([
  [TUBE.replace('air', 'balloon'), 'Cuff: Write one of: none, air, water, foam'],
  [TUBE.replace(',8,11,', ',8,wide,'), 'OD mm: Outside diameter must be from 3 to 18 mm'],
  [TUBE.replace(',8,11,', ',11,8,'), 'OD mm: Outside diameter must be larger than the inside diameter'],
  [DUAL.replace('disposable,7,8', ',7,8'), 'Inner cannula: Choose the inner cannula'],
  [TUBE.replace('single,,', 'single,reusable,'), 'Inner cannula: Leave out the inner cannula here'],
  [`${TUBE}09521234543214`, 'GTIN: GTIN must be 8, 12, 13 or 14 digits with the right check digit'],
  [`${TUBE}9.52E+12`, 'GTIN: GTIN must be 8, 12, 13 or 14 digits with the right check digit'],
  [`${TUBE}${demoCatalogue.tubes[0]?.gtin}`, 'GTIN: The tube Corvane Dual 6.0 has this GTIN'],
  [TUBE.replace('tube', 'cannula'), 'Item: Write "tube" or "inner cannula"'],
  [`${TUBE},surplus`, 'Item: The line has more cells than there are columns'],
  [TUBE.replace('Ferrin', 'Linnet'), 'Maker: Linnet is made by Vastenhaug'],
  [
    TUBE.replace('yes,0,', 'yes,0,8.0 disposable x10'),
    'Inner cannulas that fit: A single cannula takes no inner cannula',
  ],
  [
    DUAL.replace('7.0 disposable x10', '7.0'),
    'Inner cannulas that fit: Ferrin has no inner cannula "7.0". Write it as "8.0 disposable x10"',
  ],
  [
    `${CANNULA.replace('no,', 'no,outer,').replace(',,disposable', ',disposable')}`,
    '15 mm connector: Leave this empty for an inner cannula',
  ],
  [TUBE.replace('8.0', '"8.0\nx"'), 'Size: Size on the label has characters that cannot be stored'],
])('%s is refused: %s', (line, says) => {
  const [row] = rowsOf(`${HEAD}\n${line}`)
  expect(row?.fate).toBe('error')
  expect(row?.errors.map(error => `${error.heading}: ${error.says}`)).toContain(says)
})

test('two lines about one item are both refused, each with the other line', () => {
  expect(told([HEAD, TUBE, TUBE].join('\n')).map(row => row[1])).toEqual(['error', 'error'])
  const [head = '', line = ''] = exported.split('\r\n')
  expect(told([head, line, line].join('\n'))).toEqual([
    [2, 'error', 'Id: Line 3 is about the same item'],
    [3, 'error', 'Id: Line 2 is about the same item'],
  ])
})

test.each([
  ['', 1, 'There is nothing in it'],
  ['Item,Line\ntube,x', 1, 'The first line names the columns; it lacks "Maker", "Size"'],
  [`${HEAD},Colour\n${TUBE},blue`, 1, 'No column is called "Colour"'],
  [`${HEAD},Size\n${TUBE},1`, 1, 'Two columns are called "Size"'],
  [HEAD, 1, 'There is no item below the headings'],
  [`${HEAD}\n"tube`, 2, 'A quotation mark is opened and not closed'],
])('%j cannot be read', (text, line, says) => {
  expect(importPlan(text, empty, newId)).toEqual({ fault: { line, says } })
})

test('lines are counted where they begin, over empty lines and line breaks in cells', () => {
  const { rows } = readCsvText('a,b\n\n"one\ntwo",x\nlast,y') as { rows: readonly { line: number }[] }
  expect(rows.map(({ line }) => line)).toEqual([1, 3, 5])
})
