import { expect, test } from 'vitest'
import type { StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { type CuffData, cuffChecks } from './schema.ts'
import { cuffWarnings, standingCuffWarnings } from './warnings.ts'

const tube = (cuff: TubeData['cuff'] = 'air', when = '2026-03-09 02:00') => anEntry(tubeChanges, when, aTube({ cuff }))
const reading: CuffData = { found: 26, unit: 'cmH2O', method: 'manometer' }
const check = (when: string, more: Partial<CuffData> = {}) => anEntry(cuffChecks, when, { ...reading, ...more })
const topUp = (when: string, more: Partial<CuffData> = {}) => check(when, { found: 18, leftAt: 24, ...more })

function namesOf(more: Partial<CuffData>, before: readonly StoredEntry[] = [], about: AboutContext = {}) {
  const context = aContext([tube(), ...before], '12:00', about)
  return cuffWarnings({ ...reading, ...more }, context).map(({ name, level }) => `${name} ${level}`)
}

const again = { found: 18, leftAt: 24 } as const

test.each<[string, Partial<CuffData>, readonly StoredEntry[], readonly string[]]>([
  ['no leak, no air added', {}, [], []],
  ['a leak alone', { leak: 'yes' }, [], ['cuff-leak amber']],
  ['a leak with air added once', { ...again, leak: 'yes' }, [], ['cuff-leak amber', 'cuff-corrected blue']],
  ['a leak at the upper limit', { found: 30, leak: 'yes' }, [], ['cuff-leak-at-limit amber']],
  [
    'a leak after air was added twice',
    { leak: 'yes' },
    [topUp('09:00'), topUp('11:00')],
    ['cuff-leak-displacement red'],
  ],
  ['air added once', again, [], ['cuff-corrected blue']],
  ['air added a second time', again, [topUp('09:00')], ['cuff-repeated-leak amber', 'cuff-corrected blue']],
  ['air added more than 12 hours apart', again, [topUp('2026-03-09 23:59')], ['cuff-corrected blue']],
  ['air added exactly 12 hours apart', again, [topUp('00:00')], ['cuff-repeated-leak amber', 'cuff-corrected blue']],
  ['3 mL in all', { ...again, airMl: 3 }, [], ['cuff-corrected blue']],
  ['more than 3 mL in all', { ...again, airMl: 3.5 }, [], ['cuff-repeated-leak amber', 'cuff-corrected blue']],
  ['air added to an earlier tube', again, [topUp('09:00'), tube('air', '10:00')], ['cuff-corrected blue']],
  [
    'inflated after a trial, 6 mL',
    { found: 0, leftAt: 24, airMl: 6, cuffNow: 'inflated' },
    [topUp('09:00'), check('10:00', { found: 0, cuffNow: 'deflated' })],
    [],
  ],
  ['let down while it leaks', { leak: 'yes', cuffNow: 'deflated' }, [topUp('09:00'), topUp('11:00')], []],
])('%s', (_, more, before, expected) => {
  expect(namesOf(more, before)).toEqual(expected)
})

test('a leak with air added again is red, with what to do first', () => {
  const context = aContext([tube(), topUp('09:00', { airMl: 1 })], '12:00')
  expect(cuffWarnings({ ...reading, ...again, airMl: 1.5, leak: 'yes' }, context)[0]).toMatchObject({
    level: 'red',
    action:
      'Check the tube position now. The tube or cuff may have moved or failed. Call for help. Follow your local emergency plan.',
    cause: 'Leak or voice with the cuff up. Air added 2 times within 12 hours, 2.5 mL in all.',
  })
})

test('where no more air is to be added nothing else asks for it', () => {
  expect(namesOf({ found: 16, leftAt: 18 }, [topUp('09:00')])).toEqual(['cuff-repeated-leak amber'])
  expect(namesOf({ found: 16, leftAt: 18 })).toEqual(['cuff-low amber'])
})

test('count, volume and hours are set by policy', () => {
  expect(namesOf(again, [topUp('09:00')], { policy: { 'cuff-top-ups': 3 } })).toEqual(['cuff-corrected blue'])
  expect(namesOf({ ...again, airMl: 2 }, [], { policy: { 'cuff-top-up-volume': 1 } })[0]).toBe(
    'cuff-repeated-leak amber',
  )
  expect(namesOf(again, [topUp('07:00')], { policy: { 'cuff-top-up-window': 4 } })).toEqual(['cuff-corrected blue'])
})

test.each<[TubeData['cuff'], number]>([
  ['water', 1],
  ['foam', 0],
  ['none', 0],
])('voice past a cuff of %s', (cuff, warnings) => {
  const data: CuffData = { unit: 'cmH2O', method: 'not measured', whyNot: 'Voice heard', leak: 'yes' }
  expect(cuffWarnings(data, aContext([tube(cuff)], '12:00'))).toHaveLength(warnings)
})

test('air added twice stands for 12 hours after the second time, and a leak then is red for as long as it is heard', () => {
  const standing = (now: string, ...more: readonly StoredEntry[]) =>
    standingCuffWarnings(aContext([tube(), topUp('09:00'), topUp('11:00'), ...more], now)).map(({ name }) => name)
  expect(standing('23:00')).toEqual(['cuff-repeated-leak'])
  expect(standing('23:01')).toEqual([])
  const heard = check('11:30', { leak: 'yes' })
  expect(standing('12:00', heard)).toEqual(['cuff-leak-displacement', 'cuff-repeated-leak'])
  expect(standing('23:30', heard)).toEqual(['cuff-leak-displacement'])
  expect(standing('12:00', heard, check('11:50', { leak: 'no' }))).toEqual(['cuff-repeated-leak'])
})
