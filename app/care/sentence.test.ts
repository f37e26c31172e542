import { expect, test } from 'vitest'
import { sentence } from './sentence.ts'

test.each([
  ['Dressing was wet', 'Dressing was wet.'],
  ['Dressing was wet.', 'Dressing was wet.'],
  ['Was it wet?', 'Was it wet?'],
  ['Wet\nand loose', 'Wet\nand loose.'],
])('%j ends as a sentence', (words, expected) => {
  expect(sentence(words)).toBe(expected)
})
