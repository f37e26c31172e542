import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'

const css = readFileSync(new URL('../tailwind.css', import.meta.url), 'utf8')
const themes = ['day', 'night'] as const

/** Colours of both themes by token, as tailwind.css declares them. */
const tokens = new Map(
  [...css.matchAll(/--([a-z0-9-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g)].map(
    ([, name = '', day = '', night = '']) => [name, { day, night }],
  ),
)

// WCAG 2.2, "relative luminance" and "contrast ratio".
function luminance(colour: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5]
    .map(start => Number.parseInt(colour.slice(start, start + 2), 16) / 255)
    .map(part => (part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4))
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue
}

function contrast(one: string, other: string): number {
  const [dark = 0, light = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b)
  return (light + 0.05) / (dark + 0.05)
}

function between(one: string, other: string, theme: (typeof themes)[number]): number {
  const [a, b] = [tokens.get(one), tokens.get(other)]
  if (!a || !b) throw new Error(`tailwind.css has no colour ${a ? other : one}`)
  return contrast(a[theme], b[theme])
}

const grounds = ['paper', 'surface', 'sunk']

/** Words by the grounds they stand on. brand-tint is also the ground of a row that has just changed, so any word may stand on it. */
const texts: readonly (readonly [string, readonly string[]])[] = [
  ['ink', [...grounds, 'late-tint', 'due-tint', 'brand-tint']],
  ['ink2', [...grounds, 'late-tint', 'due-tint', 'brand-tint']],
  ['ink3', [...grounds, 'brand-tint']],
  ['brand', [...grounds, 'brand-tint']],
  ['late', [...grounds, 'late-tint', 'brand-tint']],
  ['due', [...grounds, 'due-tint', 'brand-tint']],
  ['soon', [...grounds, 'brand-tint']],
  ['brand-ink', ['brand']],
  ['paper', ['ink']],
]

/** Shapes, lines and borders that say something. */
const marks: readonly (readonly [string, readonly string[]])[] = [
  ['edge', [...grounds, 'brand-tint']],
  ['done', [...grounds, 'brand-tint']],
  ['focus', [...grounds, 'late-tint', 'due-tint', 'brand-tint']],
  ['brand', grounds],
  ['late', [...grounds, 'late-tint', 'brand-tint']],
  ['due', [...grounds, 'due-tint', 'brand-tint']],
  ['soon', [...grounds, 'brand-tint']],
  ['ink2', grounds],
]

const cases = (pairs: typeof texts) =>
  pairs.flatMap(([name, on]) => on.flatMap(ground => themes.map(theme => [name, ground, theme] as const)))

test.each(cases(texts))('words in %s on %s are legible by %s', (name, ground, theme) => {
  expect(between(name, ground, theme)).toBeGreaterThanOrEqual(4.5)
})

test.each(cases(marks))('marks in %s on %s can be told apart by %s', (name, ground, theme) => {
  expect(between(name, ground, theme)).toBeGreaterThanOrEqual(3)
})

test('what is read at length has seven to one', () => {
  for (const theme of themes) {
    for (const ground of grounds) expect(between('ink', ground, theme)).toBeGreaterThanOrEqual(7)
  }
})

test('the outline of an amber window carries it, since its fill is too pale for a white ground', () => {
  expect(between('due', 'surface', 'day')).toBeGreaterThanOrEqual(3)
})

test('contrast is computed as the standard does it', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5)
  expect(contrast('#777777', '#ffffff')).toBeCloseTo(4.48, 2)
})
