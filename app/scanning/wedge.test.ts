import { expect, test } from 'vitest'
import { type Burst, type Key, struck } from './wedge.ts'

const keysOf = (text: string, everyMs = 4): Key[] =>
  Array.from(text, (key, i) => ({ key: key === '\n' ? 'Enter' : key, ctrl: false, atMs: i * everyMs }))

function scanned(keys: readonly Key[], separatorKey: string | null = null) {
  let burst: Burst | null = null
  const scans: string[] = []
  let kept = 0
  for (const key of keys) {
    const next = struck(burst, key, separatorKey)
    burst = next.burst
    if (next.scan !== null) scans.push(next.scan)
    if (next.isKept) kept += 1
  }
  return { scans, kept }
}

test('keys that come as a scanner sends them are a scan, and only the first three reach the page', () => {
  expect(scanned(keysOf(']d20109521234543213\n'))).toEqual({ scans: [']d20109521234543213'], kept: 17 })
})

test.each([36, 60, 200])('keys every %i ms are somebody typing', everyMs => {
  expect(scanned(keysOf('0109521234543213\n', everyMs))).toEqual({ scans: [], kept: 0 })
})

test('a few quick keys and Enter are no scan', () => {
  expect(scanned(keysOf('26\n'))).toEqual({ scans: [], kept: 0 })
})

test('Ctrl+], the character itself and the key that was set are the group separator', () => {
  const with_ = (key: Key) => [
    ...keysOf('10AB12'),
    { ...key, atMs: 24 },
    ...keysOf('21S7\n').map(next => ({ ...next, atMs: 28 + next.atMs })),
  ]
  const text = '10AB12\u001d21S7'
  expect(scanned(with_({ key: ']', ctrl: true, atMs: 0 })).scans).toEqual([text])
  expect(scanned(with_({ key: '\u001d', ctrl: false, atMs: 0 })).scans).toEqual([text])
  expect(scanned(with_({ key: 'F8', ctrl: false, atMs: 0 }), 'F8').scans).toEqual([text])
  expect(scanned(with_({ key: 'F8', ctrl: false, atMs: 0 })).scans).toEqual([])
})

test('keys that are held do not break a scan, and Tab ends one', () => {
  const keys = [
    { key: 'Shift', ctrl: false, atMs: 0 },
    ...keysOf('ABCDEF'),
    { key: 'Control', ctrl: true, atMs: 24 },
    { key: 'Tab', ctrl: false, atMs: 26 },
  ]
  expect(scanned(keys).scans).toEqual(['ABCDEF'])
})

test('a key that was pressed before the scan is not part of it', () => {
  const keys = [{ key: 'x', ctrl: false, atMs: -400 }, ...keysOf('0109521234543213\n')]
  expect(scanned(keys).scans).toEqual(['0109521234543213'])
})

test('what never ends is let go', () => {
  expect(scanned(keysOf(`${'9'.repeat(2001)}\n`)).scans).toEqual([])
})
