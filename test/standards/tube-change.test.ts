import { expect, test } from 'vitest'
import { aContext, anEntry, aTube } from '#app/care/make.ts'
import type { TubeData } from '#app/care/tube-change/schema.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { routinePlan } from '#app/care/tube-change-plan/examples.ts'
import { tubeChangePlan } from '#app/care/tube-change-plan/kind.ts'

/*
 * First change of a tube after the opening was made, as published:
 * surgical: AAO-HNS 2013, day 3 to 7; French expert panel 2018, not before day 4 (R-301; the later of the two counts).
 * percutaneous: French expert panel 2018, day 7 to 10; AAO-HNS 2013, day 10 to 14; White 2010, 1 to 2 weeks.
 * C-49: a first change planned for day 3 of a percutaneous opening needs a senior and a reason.
 */

const problemsOn = (technique: TubeData['technique'], day: number, decided: object = {}) => {
  const tube = anEntry(tubeChanges, '2026-03-01 10:00', aTube({ reason: 'first insertion', technique }))
  const plannedOn = `2026-03-${String(1 + day).padStart(2, '0')}`
  const known = { settings: [], tasks: [] }
  return tubeChangePlan.problems?.(
    { ...routinePlan, plannedOn, ...decided },
    aContext([tube], '2026-03-01 12:00'),
    known,
  )
}

test.each([
  ['surgical', 3, false],
  ['surgical', 4, true],
  ['surgical', 7, true],
  ['percutaneous', 3, false],
  ['percutaneous', 6, false],
  ['percutaneous', 7, true],
  ['percutaneous', 10, true],
  ['percutaneous', 14, true],
] as const)('a first change, %s, planned for day %i may stand by itself: %s', (technique, day, stands) => {
  expect(problemsOn(technique, day)?.length === 0).toBe(stands)
})

test('C-49: day 3 of a percutaneous opening stands once a named senior gave a reason', () => {
  expect(problemsOn('percutaneous', 3)).toMatchObject([{ field: 'plannedOn' }])
  expect(problemsOn('percutaneous', 3, { senior: 'Dr N. Abara', seniorReason: 'Cuff torn' })).toEqual([])
})
