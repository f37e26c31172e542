import { expect, test } from 'vitest'
import { careFields, choice, quantity } from './field.ts'
import { charted } from './kind.ts'
import { readPayload, versionOf } from './payload.ts'

const first = charted({
  slug: 'humidity',
  schema: careFields({ level: quantity({ label: 'Water level', unit: 'mL', min: 0, max: 500 }) }),
})

// Version 1 stored litres; version 2 stored mL under another name; version 3 asks for the method too.
const third = charted({
  slug: 'humidity',
  schema: careFields({
    level: quantity({ label: 'Water level', unit: 'mL', min: 0, max: 500 }),
    method: choice({ label: 'Method', options: { heated: 'Heated', 'not known': 'Not known' } }),
  }),
  upgrades: [
    (old: { litres: number }) => ({ water: old.litres * 1000 }),
    (old: { water: number }) => ({ level: old.water, method: 'not known' }),
  ],
})

test('a kind without upgrades is at version 1', () => {
  expect(versionOf(first)).toBe(1)
})

test('every upgrade makes a version', () => {
  expect(versionOf(third)).toBe(3)
})

test.each([
  [1, { litres: 0.25 }, { level: 250, method: 'not known' }],
  [2, { water: 250 }, { level: 250, method: 'not known' }],
  [3, { level: 250, method: 'heated' }, { level: 250, method: 'heated' }],
])('a payload of version %i is read in the shape of today', (version, raw, data) => {
  expect(readPayload(third, version, raw)).toEqual({ ok: true, data })
})

test.each([0, -1, 4, 1.5, Number.NaN])('version %s is said to be unknown', version => {
  expect(readPayload(third, version, {})).toEqual({ ok: false, why: `version ${version} is not known` })
})

test('a payload outside its schema is said to be unreadable, with every reason', () => {
  expect(readPayload(third, 3, { level: 900 })).toEqual({
    ok: false,
    why: 'level: Water level must be from 0 to 500 mL; method: Choose the method',
  })
})

test.each([null, 'text', 26, [], undefined])('%j is not a payload', raw => {
  expect(readPayload(first, 1, raw)).toMatchObject({ ok: false })
})

test('a stored field that is no longer known makes a payload unreadable rather than dropping it', () => {
  expect(readPayload(first, 1, { level: 100, colour: 'blue' })).toMatchObject({ ok: false })
})
