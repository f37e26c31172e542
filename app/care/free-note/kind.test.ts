import { expect, test } from 'vitest'
import { freeNote } from './kind.ts'

test.each([
  ['Slept well', 'Slept well.'],
  ['Slept well.', 'Slept well.'],
  ['Asked for his glasses?', 'Asked for his glasses?'],
])('the note %s reads as %s', (words, says) => {
  expect(freeNote.summary({ words })).toBe(says)
})

test.each([
  ['', ['Enter the note']],
  ['   ', ['Enter the note']],
  ['x'.repeat(2001), ['Note must be at most 2000 characters']],
])('a note is not empty and not endless: %.10s', (words, messages) => {
  expect(freeNote.schema.safeParse({ words }).error?.issues.map(({ message }) => message)).toEqual(messages)
})

test('a note is never due, warns of nothing and starts empty', () => {
  for (const part of ['tasks', 'warnings', 'standing', 'startsWith', 'usual']) expect(freeNote).not.toHaveProperty(part)
})
