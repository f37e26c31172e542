import { expect, test } from 'vitest'
import { cuffChecks } from '../care/cuff-pressure/schema.ts'
import { deferrals } from '../care/deferral/schema.ts'
import type { StoredEntry } from '../care/kind.ts'
import { aContext, anEntry, aRemoval, aTube } from '../care/make.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { dueTasks } from './due-tasks.ts'
import { type WhyDue, whyDue } from './why.ts'
import { whyStanding } from './why-warnings.ts'

const tube = anEntry(tubeChanges, '2026-03-09 02:00', aTube())
const read = anEntry(cuffChecks, '06:00', { found: 26, unit: 'cmH2O', method: 'manometer' })

function whyOf(
  task: string,
  entries: readonly StoredEntry[] = [tube, read],
  policy: Readonly<Record<string, number>> = {},
): WhyDue {
  const context = aContext(entries, '12:00', { policy })
  const found = dueTasks(context).find(({ rule }) => rule.name === task)
  if (!found) throw new RangeError(`${task} is not due`)
  return whyDue(found, context)
}
const numbersOf = ({ values }: WhyDue) => values.map(({ label, value, origin }) => `${label}: ${value}, ${origin}`)

test('a task due by an interval says its window and the tolerance that made it', () => {
  const why = whyOf('cuff-pressure-check', undefined, { 'lateness-middle-tolerance': 30 })
  expect(why.last).toBe('Last on 10-Mar-2026 06:00 by Ama Mensah.')
  expect(why.rule.at(-1)).toBe('In time from 13:30 to 14:30, seriously overdue after 18:00.')
  expect(why.policy).toContain('version 1, reviewed by M. Osei')
  expect(numbersOf(why)).toEqual(
    expect.arrayContaining([
      'Cuff pressure check every: 8 h, Product default',
      'Care due every 4 h or less often, but within a day: in time when early or late by no more than: 30 min, Policy',
    ]),
  )
  expect(numbersOf(why).join()).not.toContain('more often than every 4 h')
})

test('a task due by date says from when it is shown and when it is serious', () => {
  const why = whyOf('tube-change', undefined, { 'lateness-day-serious': 3 })
  expect(why.rule.at(-1)).toBe('Shown as due soon from 30-Mar-2026, seriously overdue from 10-Apr-2026.')
})

test('a deferral is named, and moves the window', () => {
  const asked = { task: 'cuff-pressure-check', minutes: '240', reason: 'off ward', agreedWith: 'M. Osei' } as const
  const why = whyOf('cuff-pressure-check', [tube, read, anEntry(deferrals, '11:50', asked)])
  expect(why.rule.slice(-2)).toEqual([
    'Deferred to 10-Mar-2026 15:50 by Ama Mensah.',
    'In time from 15:50 to 16:50, seriously overdue after 19:50.',
  ])
})

test.each<[string, string, readonly StoredEntry[], string]>([
  ['cuff-pressure-check', 'not charted', [tube], 'Not charted yet; counted from 09-Mar-2026 02:00.'],
  [
    'observations-after-removal',
    'not charted after a removal',
    [tube, read, aRemoval('11:00')],
    'Not charted yet; counted from 10-Mar-2026 11:00.',
  ],
  ['cuff-pressure-check', 'suspended', [tube, read, aRemoval('11:00')], 'Its clock stands still.'],
])('what %s counts from, %s, is said as it is', (name, _, entries, last) => {
  expect(whyOf(name, entries).last).toBe(last)
})

test('air added twice in 12 hours is explained by both of its limits, whichever was reached', () => {
  const topUp = (when: string) =>
    anEntry(cuffChecks, when, { found: 15, leftAt: 24, airMl: 1, unit: 'cmH2O', method: 'manometer' })
  const why = whyStanding(aContext([tube, topUp('06:00'), topUp('11:00')], '12:00'))['cuff-repeated-leak']
  expect(why?.values.map(({ label, value }) => `${label}: ${value}`)).toEqual(
    expect.arrayContaining([
      'Air added this often asks for a review: 2 times',
      'Air added asks for a review above, in all: 3 mL',
      'Air added is counted over the last: 12 h',
    ]),
  )
})
