import { expect, test } from 'vitest'
import { type CuffData, cuffChecks } from '../care/cuff-pressure/schema.ts'
import type { StoredEntry } from '../care/kind.ts'
import { aContext, aCorrection, anEntry, aTube, at } from '../care/make.ts'
import { usualCheck } from '../care/stoma-and-skin/examples.ts'
import { type StomaData, stomaChecks } from '../care/stoma-and-skin/schema.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { type WarningAnswerData, warningAnswers } from '../care/warning-answer/schema.ts'
import { answerableWarnings, warningLives } from './warning-lives.ts'

const tube = anEntry(tubeChanges, '2026-03-09 10:00', aTube())
const pressure = (found: number): CuffData => ({ found, unit: 'cmH2O', method: 'manometer' })
const high = anEntry(cuffChecks, '10:00', pressure(36))
const answer = (when: string, data: Omit<WarningAnswerData, 'warning'>) =>
  anEntry(warningAnswers, when, { warning: 'cuff-high', ...data })

const lifeAt = (now: string, ...entries: readonly StoredEntry[]) =>
  warningLives(aContext([tube, high, ...entries], now)).find(({ warning }) => warning.name === 'cuff-high')

test('a warning is raised by the act that found it, and rises after the minutes of the policy', () => {
  expect(lifeAt('10:05')).toMatchObject({
    raised: { entryId: high.id, at: at('10:00'), by: 'Ama Mensah' },
    seen: null,
    acted: [],
    settled: null,
    risesAt: at('10:15'),
  })
})

test('minutes count from when it was written down', () => {
  const late = anEntry(cuffChecks, '10:00', pressure(36), { recordedAt: at('11:30') })
  const [life] = warningLives(aContext([tube, late], '11:40'))
  expect(life?.risesAt).toEqual(at('11:45'))
})

test('once somebody has seen it, it no longer rises', () => {
  const seen = answer('10:04', { answer: 'seen' })
  expect(lifeAt('10:20', seen)).toMatchObject({ seen: { entryId: seen.id, by: 'Ama Mensah' }, risesAt: null })
})

test('what was done is kept with it, and counts as seen', () => {
  const done = answer('10:06', { answer: 'acted on', done: 'Air let out to 26 cmH2O' })
  expect(lifeAt('10:20', done)).toMatchObject({ acted: [{ words: 'Air let out to 26 cmH2O' }], risesAt: null })
  expect(lifeAt('10:20', done)?.seen).toMatchObject({ entryId: done.id })
})

test('a person settles it with a reason, and it stands again with the next finding', () => {
  const settled = answer('10:06', { answer: 'settled', why: 'Needed for the seal until theatre, Dr A. Haddad' })
  expect(lifeAt('10:20', settled)?.settled).toMatchObject({ words: 'Needed for the seal until theatre, Dr A. Haddad' })
  const again = anEntry(cuffChecks, '12:00', pressure(35))
  expect(lifeAt('12:01', settled, again)).toMatchObject({ settled: null, seen: null, raised: { entryId: again.id } })
})

test('a later finding ends it', () => {
  expect(lifeAt('10:40', anEntry(cuffChecks, '10:30', pressure(26)))).toBeUndefined()
})

test('an answer that was corrected or retracted counts as it says now', () => {
  const seen = answer('10:04', { answer: 'seen' })
  const retracted = aCorrection(
    seen,
    warningAnswers,
    '10:04',
    { warning: 'cuff-high', answer: 'seen' },
    { status: 'retracted' },
  )
  expect(lifeAt('10:20', seen, retracted)).toMatchObject({ seen: null, risesAt: at('10:15') })
})

test('an answer to another warning is none to this one', () => {
  const other = anEntry(warningAnswers, '10:04', { warning: 'cuff-low', answer: 'seen' })
  expect(lifeAt('10:20', other)?.seen).toBeNull()
})

const oldTube = anEntry(tubeChanges, '2026-01-20 10:00', aTube())
const pastLimit = (now: string, ...entries: readonly StoredEntry[]) =>
  warningLives(aContext([oldTube, ...entries], now, { admittedAt: '2026-01-20 08:00' })).find(
    ({ warning }) => warning.name === 'tube-past-limit',
  )

test('what no act raised asks to be seen once in the hours of the policy', () => {
  const seen = anEntry(warningAnswers, '08:00', { warning: 'tube-past-limit', answer: 'seen' })
  expect(pastLimit('09:00')).toMatchObject({ raised: null, risesAt: at('09:00') })
  expect(pastLimit('2026-03-11 07:59', seen)).toMatchObject({ risesAt: null })
  expect(pastLimit('2026-03-11 08:01', seen)).toMatchObject({ seen: null })
})

test('the same moment can be replayed from what was known then', () => {
  const seen = answer('10:04', { answer: 'seen' })
  expect(lifeAt('10:03')).toMatchObject({ seen: null })
  expect(lifeAt('10:03')).toEqual(lifeAt('10:03'))
  expect(lifeAt('10:05', seen)).toMatchObject({ seen: { at: at('10:04') } })
})

test('warnings that stand can be answered, and those answered before can be corrected', () => {
  const before = anEntry(warningAnswers, '09:00', { warning: 'cuff-low', answer: 'seen' })
  const names = Object.keys(answerableWarnings(aContext([tube, high, before], '10:05')))
  expect(names).toEqual(expect.arrayContaining(['cuff-high', 'cuff-low']))
})

test('a pressure injury is raised by the check that found it new: seen again at later checks, it stays answered', () => {
  const injury = { skin: 'pressure injury', stage: 'stage-2', findingSite: 'flange left' } as const
  const check = (when: string, skin: Partial<StomaData> = injury) =>
    anEntry(stomaChecks, when, { ...usualCheck, ...skin })
  const found = check('2026-03-09 21:00')
  const seen = anEntry(warningAnswers, '2026-03-09 21:10', { warning: 'pressure-injury', answer: 'seen' })
  const livesAt = (now: string, ...entries: readonly StoredEntry[]) =>
    warningLives(aContext([tube, found, seen, ...entries], now)).filter(({ warning }) => warning.level === 'amber')
  expect(livesAt('14:00', check('09:00'))).toMatchObject([
    { warning: { name: 'pressure-injury' }, raised: { entryId: found.id }, seen: { entryId: seen.id }, risesAt: null },
  ])
  const worse = check('12:00', { ...injury, stage: 'stage-3' })
  expect(livesAt('14:00', worse)).toMatchObject([{ raised: { entryId: worse.id }, seen: null, risesAt: at('12:15') }])
  expect(livesAt('14:00', check('13:00', { skin: 'intact' }))).toEqual([])
})
