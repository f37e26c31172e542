import { expect, test } from 'vitest'
import { warningAnswer } from './kind.ts'
import { type WarningAnswerData, warningAnswers } from './schema.ts'

test.each<[WarningAnswerData, string]>([
  [{ warning: 'cuff-high', answer: 'seen' }, 'Cuff high: seen.'],
  [{ warning: 'cuff-high', answer: 'acted on', done: 'Air let out' }, 'Cuff high: acted on. Air let out.'],
  [
    { warning: 'tube-past-limit', answer: 'settled', why: 'Kept until the scan.' },
    'Tube past limit: settled. Kept until the scan.',
  ],
])('an answer reads as which warning and what was said to it', (data, words) => {
  expect(warningAnswer.summary(data)).toBe(words)
})

const issuesOf = (data: Readonly<Record<string, unknown>>) =>
  warningAnswers.schema.safeParse({ warning: 'cuff-high', ...data }).error?.issues.map(({ path }) => path.join('.'))

test.each([
  [{ answer: 'seen' }, undefined],
  [{ answer: 'acted on' }, ['done']],
  [{ answer: 'settled' }, ['why']],
  [{ answer: 'settled', why: ' ' }, ['why']],
  [{ answer: 'seen', why: 'No need' }, ['why']],
  [{}, ['answer']],
])('%j is sent back for %j', (data, fields) => {
  expect(issuesOf(data)).toEqual(fields)
})
