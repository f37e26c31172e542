import { expect, test } from 'vitest'
import { standingWarnings } from '../../rules/warnings.ts'
import type { CareContext, PatientFacts, StoredEntry } from '../kind.ts'
import { aContext, aCorrection, anEntry, aRemoval, aTube } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { changedSince, printedSign, signFacts } from './current.ts'
import { bedHeadSigns, type SignData } from './schema.ts'

const tube = anEntry(tubeChanges, '2026-03-08 10:00', aTube())

function sign(
  entries: readonly StoredEntry[],
  when: string,
  act: SignData['act'] = 'printed',
  patient = {},
): StoredEntry {
  return anEntry(bedHeadSigns, when, { act, ...signFacts(aContext(entries, when, { patient })) })
}

const outOfDate = (context: CareContext) => standingWarnings(context).find(({ name }) => name === 'sign-out-of-date')

function changes(entries: readonly StoredEntry[], patient: Partial<PatientFacts> = {}): readonly string[] {
  const context = aContext(entries, '2026-03-10 09:00', { patient })
  const printed = printedSign(context.record)
  return printed ? changedSince(printed.data, context) : ['none printed']
}

test('a sign stays current while nothing that it shows changes', () => {
  const entries = [tube, sign([tube], '2026-03-08 10:30')]
  expect(changes(entries)).toEqual([])
  expect(outOfDate(aContext(entries, '2026-03-10 09:00'))).toBeUndefined()
})

test('a tube change ends the sign: it is to be destroyed and printed anew', () => {
  const entries = [tube, sign([tube], '2026-03-08 10:30'), anEntry(tubeChanges, '2026-03-09 11:00', aTube())]
  expect(outOfDate(aContext(entries, '2026-03-10 09:00'))).toMatchObject({
    level: 'amber',
    action: 'Destroy the printed bed-head sign and print a new one.',
    cause: 'Printed 08-Mar-2026 10:30; changed since: the tube or what is charted of it.',
  })
})

test('a correction of the tube ends the sign too', () => {
  const corrected = aCorrection(tube, tubeChanges, '2026-03-08 10:00', aTube({ cuff: 'none' }))
  expect(changes([tube, sign([tube], '2026-03-08 10:30'), corrected])).toEqual(['the tube or what is charted of it'])
})

test.each<[string, Partial<PatientFacts>]>([
  ['the upper airway', { upperAirway: 'not open' }],
  ['the view at laryngoscopy', { laryngoscopy: '3' }],
  ['the known problems of the airway', { airwayNotes: 'Stiff neck' }],
])('a change of %s ends the sign', (words, patient) => {
  expect(changes([tube, sign([tube], '2026-03-08 10:30')], patient)).toEqual([words])
})

test.each<[string, Partial<PatientFacts>]>([
  ['the bed', { bed: 'A9', identity: 'Merrin, Tobias' }],
  ['the name, birth or record number', { bed: 'A4', identity: 'Merrin, Tobin' }],
])('another one of %s ends the sign, unless the sign does not know it', (words, patient) => {
  const known = sign([tube], '2026-03-08 10:30', 'printed', { bed: 'A4', identity: 'Merrin, Tobias' })
  expect(changes([tube, known], patient)).toEqual([words])
  expect(changes([tube, sign([tube], '2026-03-08 10:30')], patient)).toEqual([])
})

test('a new sign settles it', () => {
  const second = anEntry(tubeChanges, '2026-03-09 11:00', aTube())
  const entries = [tube, sign([tube], '2026-03-08 10:30'), second]
  expect(changes([...entries, sign(entries, '2026-03-09 11:20')])).toEqual([])
})

test('a tube taken out for good leaves a sign to take down, and taken down it warns no more', () => {
  const entries = [tube, sign([tube], '2026-03-08 10:30'), aRemoval('2026-03-09 11:00')]
  expect(outOfDate(aContext(entries, '2026-03-10 09:00'))?.action).toBe(
    'Take the printed bed-head sign down and destroy it.',
  )
  const down = sign(entries, '2026-03-09 12:00', 'taken down')
  expect(outOfDate(aContext([...entries, down], '2026-03-10 09:00'))).toBeUndefined()
})

test('without a printed sign nothing is out of date', () => {
  expect(outOfDate(aContext([tube], '2026-03-10 09:00'))).toBeUndefined()
})
