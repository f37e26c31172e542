import { expect, test } from 'vitest'
import { replacedWithNew } from './inner-cannula/examples.ts'
import { innerCannulaActs } from './inner-cannula/schema.ts'
import { standingInnerCannulaWarnings } from './inner-cannula/warnings.ts'
import { aContext, anEntry, aTube, at } from './make.ts'
import { type LotDecision, recallOf, recallsInForce } from './recall.ts'
import { tubeChanges } from './tube-change/schema.ts'
import { standingTubeWarnings } from './tube-change/standing.ts'

const recall = { lot: 'H26-0192', line: null, reason: 'Leaks', recalledAt: at('09:00'), recalledByName: 'M. Osei' }
const ofAlder = { ...recall, line: 'Alder' }

test.each([
  [{ lot: 'H26-0192', line: 'Alder' }, recall, true],
  [{ lot: ' h26-0192', line: 'Alder' }, recall, true],
  [{ lot: 'H26-0192', line: 'alder' }, ofAlder, true],
  [{ lot: 'H26-0192' }, ofAlder, true],
  [{ lot: 'H26-0192', line: 'Corvane' }, ofAlder, false],
  [{ lot: 'H26-019', line: 'Alder' }, recall, false],
  [{ line: 'Alder' }, recall, false],
])('%o falls under %o: %s', (device, given, falls) => {
  expect(recallOf(device, [given]) !== undefined).toBe(falls)
})

const decided = (line: string | null, isRecalled = true): LotDecision => ({ ...recall, line, isRecalled })
const corvane = ['Corvane Dual', 'Corvne', 'Quill Dual']

// Decisions are given the latest first.
test.each<[string, readonly LotDecision[], readonly (string | null)[]]>([
  ['of every line', [decided(null)], [null]],
  ['of a line that was never renamed', [decided('Alder')], ['Alder']],
  ['of a line under an earlier name', [decided('corvne')], corvane],
  ['lifted under a later name', [decided('Corvane Dual', false), decided('Quill Dual')], []],
  ['lifted, and recalled again', [decided('Alder'), decided('Alder', false), decided('Alder')], ['Alder']],
  ['lifted for another line', [decided('Alder', false), decided('Corvne')], corvane],
])('a recall %s is in force where it should be', (_, latestFirst, lines) => {
  expect(recallsInForce(latestFirst, [corvane]).map(({ line }) => line)).toEqual(lines)
})

const tubeIn = anEntry(tubeChanges, '2026-03-09 10:00', aTube({ lot: 'H26-0192' }))
const replaced = (when: string, lot: string) =>
  anEntry(innerCannulaActs, when, { ...replacedWithNew, line: 'Alder', lot })
const names = (entries: Parameters<typeof aContext>[0], recalls = [recall]) => {
  const context = aContext(entries, '12:00', { ward: { recalls } })
  return [...standingTubeWarnings(context), ...standingInnerCannulaWarnings(context)].map(({ name }) => name)
}

test('a recalled tube in place is a standing warning, until another is in', () => {
  expect(names([tubeIn])).toContain('tube-recalled')
  expect(names([tubeIn], [])).not.toContain('tube-recalled')
  expect(names([tubeIn, anEntry(tubeChanges, '11:00', aTube())])).not.toContain('tube-recalled')
})

test('so is a recalled inner cannula, until another is in', () => {
  expect(names([tubeIn, replaced('08:00', 'H26-0192')])).toContain('inner-cannula-recalled')
  expect(names([tubeIn, replaced('08:00', 'H26-0192'), replaced('10:00', 'X1')])).not.toContain(
    'inner-cannula-recalled',
  )
})
