import { expect, test } from 'vitest'
import { aContext, anEntry } from '../make.ts'
import { coughStrength } from './kind.ts'
import { type CoughData, coughChecks, coughSchema } from './schema.ts'
import { coughOf } from './verdict.ts'

const measured = (route: CoughData['route'], peakFlow: number): CoughData => ({ route, peakFlow, assisted: 'no' })
const warned = (data: CoughData) => coughStrength.warnings?.(data, aContext([], '12:00')).map(({ name }) => name)

test.each<[CoughData, readonly string[]]>([
  [{ grade: '1', route: 'not measured' }, []],
  [measured('mouth', 160), ['cough-too-weak']],
  [measured('mouth', 161), ['cough-retention']],
  [measured('mouth', 270), []],
  [measured('valve', 100), ['cough-too-weak']],
  [measured('valve', 101), []],
  [measured('tube', 60), ['cough-too-weak']],
  [measured('tube', 61), []],
])('a cough of %j', (data, expected) => {
  expect(warned(data)).toEqual(expected)
})

test.each([
  [{ route: 'not measured' }, 'Choose the cough on command, or enter a peak flow'],
  [{ route: 'mouth', assisted: 'no' }, 'Enter the best peak flow'],
  [{ route: 'mouth', peakFlow: 200 }, 'Choose the assisted cough'],
])('%j is sent back: %s', (data, message) => {
  expect(coughSchema.safeParse(data).error?.issues[0]?.message).toBe(message)
})

test('the latest measured cough counts, not a later grade', () => {
  const entries = [
    anEntry(coughChecks, '08:00', measured('valve', 120)),
    anEntry(coughChecks, '10:00', { grade: '2', route: 'not measured' }),
  ]
  expect(coughOf(aContext(entries, '12:00'))).toMatchObject({ verdict: 'met', route: 'valve', limit: 100 })
})
