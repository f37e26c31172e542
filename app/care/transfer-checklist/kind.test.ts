import { expect, test } from 'vitest'
import { bedsideKit } from '../bedside-kit/kind.ts'
import { cuffPressure } from '../cuff-pressure/kind.ts'
import { aContext, anEntry, aTube, at, windowOf } from '../make.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { transferChecklist } from './kind.ts'
import { type TransferData, transfers } from './schema.ts'

const all: TransferData = { moment: 'arrived', place: 'Birch ward', complete: 'yes', handedTo: 'T. Okafor' }
const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const kit = anEntry(bedsideKit, '08:00', { complete: 'yes', suctionTested: 120, suctionUnit: 'mmHg' })
const cuff = anEntry(cuffPressure, '08:00', { found: 25, unit: 'cmH2O', method: 'manometer' })

test('an arrival asks for a kit check within 30 minutes and a cuff pressure within 15', () => {
  const arrived = aContext([tube, kit, cuff, anEntry(transfers, '11:00', all)], '11:05')
  expect(windowOf(bedsideKit, 'bedside-kit-check', arrived).dueAt).toEqual(at('11:30'))
  expect(windowOf(cuffPressure, 'cuff-pressure-check', arrived).dueAt).toEqual(at('11:15'))
})

test('a look before leaving asks for neither', () => {
  const leaving = aContext([tube, kit, cuff, anEntry(transfers, '11:00', { ...all, moment: 'leaving' })], '11:05')
  expect(windowOf(bedsideKit, 'bedside-kit-check', leaving).dueAt).toEqual(at('23:00'))
  expect(windowOf(cuffPressure, 'cuff-pressure-check', leaving).dueAt).toEqual(at('16:00'))
})

test.each([
  ['leaving', 'Do not leave until it is there, and tell the charge nurse.'],
  ['arrived', 'Get it now, stay with the patient until it is there, and tell the charge nurse.'],
] as const)('something missing, %s', (moment, action) => {
  const data: TransferData = { ...all, moment, complete: 'no', missing: ['sign'] }
  expect(transferChecklist.warnings?.(data, aContext([tube], '12:00'))).toMatchObject([
    { name: 'transfer-incomplete', level: 'amber', action },
  ])
})
