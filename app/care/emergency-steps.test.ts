import { expect, test } from 'vitest'
import { emergencySteps } from './emergency-steps.ts'

const tube = { newStoma: false, isCuffed: true, isDual: true, hasConnectorOnInner: false }
const wordsOf = ({ oxygen, steps, cautions }: ReturnType<typeof emergencySteps>) =>
  [oxygen, ...steps.flatMap(({ act, next }) => [act, next]), ...cautions].join(' ')

test('after a laryngectomy nothing is done at the mouth', () => {
  const words = wordsOf(emergencySteps('not open', tube))
  expect(words).not.toMatch(/mask at the mouth|oxygen to the face and/i)
  expect(words).toContain('oxygen to the stoma')
  expect(words).toContain('Leave a voice prosthesis where it is')
})

test.each(['open', 'not known'] as const)('with an upper airway that is %s oxygen goes to face and neck', airway => {
  expect(emergencySteps(airway, tube).oxygen).toContain('the face and the neck')
})

test('oxygen comes before anything is taken off, and the tube comes out last', () => {
  const acts = emergencySteps('open', tube).steps.map(({ act }) => act)
  const place = (words: string) => acts.findIndex(act => act.includes(words))
  expect([
    place('Call'),
    place('oxygen'),
    place('Take off'),
    place('catheter'),
    place('cuff down'),
    place('remove the tube'),
  ]).toEqual([0, 2, 3, 4, 5, 6])
})

test('a tube without a cuff has no cuff to let down, a single cannula no inner one to remove', () => {
  const words = wordsOf(emergencySteps('open', { ...tube, isCuffed: false, isDual: false }))
  expect(words).not.toContain('cuff down')
  expect(words).not.toContain('inner cannula')
})

test('where the bag connects to the inner cannula, it says to put a clean one in', () => {
  expect(wordsOf(emergencySteps('open', { ...tube, hasConnectorOnInner: true }))).toContain(
    'connects to the inner cannula',
  )
})

test.each([
  ['open', true],
  ['not open', false],
] as const)('blind re-insertion at a new stoma is warned of: upper airway %s, %s', (airway, isWarned) => {
  const { cautions } = emergencySteps(airway, { ...tube, newStoma: true })
  expect(cautions.includes('New stoma: do not re-insert blindly.')).toBe(isWarned)
  expect(cautions.at(-1)).toBe('Follow your local emergency plan.')
})
