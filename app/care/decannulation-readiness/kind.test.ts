import { expect, test } from 'vitest'
import { aContext, anEntry, at } from '../make.ts'
import { decannulationReadiness } from './kind.ts'
import { readinessOf } from './readiness.ts'
import { readinessChecks, readinessSchema } from './schema.ts'

const [ready, partly] = decannulationReadiness.examples
if (!ready || !partly) throw new Error('Two examples are needed')

test('each criterion stands by its latest answer, with its time and reason', () => {
  const { record } = aContext(
    [anEntry(readinessChecks, '08:00', ready), anEntry(readinessChecks, '10:00', partly)],
    '12:00',
  )
  const criteria = readinessOf(record)
  expect(criteria.map(({ answer }) => answer).slice(0, 10)).toEqual([
    ...Array(5).fill('yes'),
    'no',
    'not assessed',
    'yes',
    'yes',
    'no',
  ])
  expect(criteria[6]).toMatchObject({
    name: 'swallow',
    label: 'Effective swallow',
    isCore: true,
    answer: 'not assessed',
    entry: { performedAt: at('10:00') },
    reason: 'Scope booked for Thursday',
  })
})

test('what was never asked is not assessed, and has no time', () => {
  const criteria = readinessOf(aContext([], '12:00').record)
  expect(criteria).toHaveLength(14)
  expect(new Set(criteria.map(({ answer, entry }) => `${answer} ${typeof entry}`))).toEqual(
    new Set(['not assessed undefined']),
  )
})

test('what was not assessed needs its reason', () => {
  const issues = readinessSchema.safeParse({ ...ready, swallow: 'not assessed' }).error?.issues
  expect(issues?.map(({ path, message }) => `${path.join('.')}: ${message}`)).toEqual([
    'whyNotSwallow: Enter the reason: swallow not assessed',
  ])
})

test('the sentence names what is not met and what is open', () => {
  expect(decannulationReadiness.summary(partly)).toBe(
    'Readiness for removal of the tube: 7 of 10 met. Not met: Effective cough, Team agrees. Not assessed: Effective swallow.',
  )
})
