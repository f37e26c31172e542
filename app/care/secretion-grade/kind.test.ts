import { expect, test } from 'vitest'
import { aContext, anEntry, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { secretionGrade } from './kind.ts'
import { type SecretionGradeData, secretionGradeSchema, secretionGrades } from './schema.ts'

const thin: SecretionGradeData = {
  cough: 'vigorous',
  passes: 'one',
  colour: 'clear',
  viscosity: 'watery',
  interval: 'rare',
  flags: ['none'],
}
const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())

function warned(data: Partial<SecretionGradeData>, before?: Partial<SecretionGradeData>) {
  const entries = before ? [tube, anEntry(secretionGrades, '08:00', { ...thin, ...before })] : [tube]
  return secretionGrade.warnings?.({ ...thin, ...data }, aContext(entries, '12:00')).map(({ name }) => name)
}

test.each<[Partial<SecretionGradeData>, Partial<SecretionGradeData> | undefined, readonly string[]]>([
  [{}, undefined, []],
  [{ colour: 'green' }, undefined, ['secretions-changed']],
  [{ colour: 'green' }, {}, ['secretions-changed']],
  [{ colour: 'green' }, { colour: 'green' }, []],
  [{ colour: 'green', viscosity: 'thick' }, { colour: 'green' }, ['secretions-changed']],
  [{ viscosity: 'tenacious' }, { viscosity: 'thick' }, []],
  [{ flags: ['streaks'] }, {}, ['secretions-blood']],
  [{ flags: ['feed'] }, {}, ['secretions-feed']],
  [{ flags: ['old'] }, {}, ['secretions-old-blood']],
])('graded %j after %j', (data, before, expected) => {
  expect(warned(data, before)).toEqual(expected)
})

test('none of these does not go with a flag', () => {
  expect(secretionGradeSchema.safeParse({ ...thin, flags: ['none', 'feed'] }).error?.issues[0]?.message).toBe(
    'None of these does not go with another',
  )
})

test('the sentence gives the sum and what it is made of', () => {
  expect(secretionGrade.summary({ ...thin, flags: ['feed'] })).toBe(
    'Secretions graded 1 of 15. Cough vigorous, 1 pass, clear, watery, suction more than 3 hours apart. Also seen: like feed or food.',
  )
})
