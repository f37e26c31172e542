import { expect, test } from 'vitest'
import { carriedReading, gs1Scan, readCode, scanForm } from './scan-form.ts'

function form(...fields: readonly (readonly [string, string])[]): FormData {
  const sent = new FormData()
  for (const [name, value] of fields) sent.append(name, value)
  return sent
}

test('codes are carried on with how they came, and the new one is added', () => {
  const raw = ']d20109521234543213\u001d10AB'
  const sent = form(
    ['before', carriedReading({ source: 'scanner', raw })],
    ['source', 'camera'],
    ['code', ']C117271231'],
  )
  expect(scanForm(sent)).toEqual({
    before: [{ source: 'scanner', raw }],
    added: { source: 'camera', raw: ']C117271231' },
    readBack: null,
  })
})

test.each(['', 'scanner', 'scanner ', 'radio 01', ' x', `typed ${'9'.repeat(501)}`])(
  '%.12j is no code that a page carried on',
  text => {
    expect(scanForm(form(['before', text])).before).toEqual([])
  },
)

test('whatever is sent, there are at most eight codes, and an empty one is none', () => {
  const many = Array.from({ length: 20 }, () => ['before', 'typed 01'] as const)
  expect(scanForm(form(...many, ['code', '  '], ['source', '__proto__']))).toMatchObject({ added: null })
  expect(scanForm(form(...many)).before).toHaveLength(8)
})

test('a camera is believed to send separators, a scanner once it has been tested, and a person types brackets', () => {
  const from = (source: 'scanner' | 'camera' | 'typed', isTrusted: boolean) => gs1Scan({ source, raw: 'x' }, isTrusted)
  expect(from('camera', false)).toMatchObject({ entry: 'barcode', sendsSeparator: true })
  expect(from('scanner', false)).toMatchObject({ entry: 'barcode', sendsSeparator: false })
  expect(from('scanner', true)).toMatchObject({ entry: 'barcode', sendsSeparator: true })
  expect(from('typed', true)).toMatchObject({ entry: 'manual', sendsSeparator: false })
  expect(readCode({ source: 'typed', raw: ' (01)1 ' })).toEqual({ entry: 'manual', raw: '(01)1' })
})
