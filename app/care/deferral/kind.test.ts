import { expect, test } from 'vitest'
import { minutes } from '../../time/duration.ts'
import type { Clock } from '../clock.ts'
import { noClock, promptClock, suspended } from '../clock.ts'
import type { KnownNames } from '../form-problem.ts'
import { aContext, anEntry, at } from '../make.ts'
import { deferral } from './kind.ts'
import { type DeferralData, deferralReasons, deferrals, deferredUntil } from './schema.ts'

const minimal: DeferralData = {
  task: 'inner-cannula-change',
  minutes: '60',
  reason: 'off ward',
  agreedWith: 'M. Larsen',
}

test('a deferral reads as what, how long, why and with whom', () => {
  expect(deferral.summary(minimal)).toBe(
    'Inner cannula change deferred by 1 h: patient off ward. Agreed with M. Larsen.',
  )
})

test('another reason is said in its own words', () => {
  expect(deferral.summary({ ...minimal, reason: 'other', why: 'ENT asks for the first dressing to stay' })).toContain(
    'by 1 h: ENT asks for the first dressing to stay. Agreed',
  )
})

test.each([
  ['30', '14:36', '30 min'],
  ['60', '15:06', '1 h'],
  ['120', '16:06', '2 h'],
  ['240', '18:06', '4 h'],
  ['480', '22:06', '8 h'],
] as const)('deferred at 14:06 by %s min, the new time is %s', (delay, until, words) => {
  const [entry] = aContext([anEntry(deferrals, '14:06', { ...minimal, minutes: delay })], '15:00').record.of(deferrals)
  expect(entry && deferredUntil(entry)).toEqual(at(until))
  expect(deferral.summary({ ...minimal, minutes: delay })).toContain(`deferred by ${words}:`)
})

test('the new time is elapsed time across the change of clocks', () => {
  const stored = anEntry(deferrals, '2026-03-28 23:30', { ...minimal, minutes: '240' })
  const [entry] = aContext([stored], '12:00').record.of(deferrals)
  expect(entry && deferredUntil(entry)).toEqual(at('2026-03-29 04:30'))
})

const issuesOf = (data: Readonly<Record<string, unknown>>) =>
  deferrals.schema.safeParse(data).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`)

test.each(Object.keys(deferralReasons).filter(reason => reason !== 'other'))('%s needs no further words', reason => {
  expect(issuesOf({ ...minimal, reason })).toBeUndefined()
})

test('another reason must be said, and only then', () => {
  expect(issuesOf({ ...minimal, reason: 'other' })).toEqual(['why: Enter the other reason'])
  expect(issuesOf({ ...minimal, why: 'Visitors' })).toEqual(['why: Leave out the other reason here'])
})

test('a deferral without someone who agreed is sent back', () => {
  expect(issuesOf({ ...minimal, agreedWith: ' ' })).toEqual(['agreedWith: Enter the person who agreed'])
})

/** One task of that name whose clock always answers the same. */
function known(name: string, clock: Clock): KnownNames {
  const rule = { name, airway: true, settings: [], says: () => 'Every 12 hours.', clock: () => clock }
  return { settings: [], tasks: [{ rule }] }
}

const { values } = aContext([], '12:00')
const running = promptClock({ values, event: at('12:00'), within: minutes(15), last: undefined, because: 'inflated' })

test.each<[string, KnownNames, readonly string[]]>([
  ['is due', known('inner-cannula-change', running), []],
  [
    'is not due for this patient',
    known('inner-cannula-change', noClock),
    ['Inner cannula change is not due for this patient'],
  ],
  [
    'is suspended',
    known('inner-cannula-change', suspended('single-cannula tube')),
    ['Inner cannula change is suspended: single-cannula tube'],
  ],
  ['is not on the list', known('cuff-pressure-check', running), ['Choose the care that is deferred from the list']],
])('care that %s, asked to be deferred', (_, names, messages) => {
  const problems = deferral.problems?.(minimal, aContext([], '12:00'), names)
  expect(problems).toEqual(messages.map(message => ({ field: 'task', message })))
})
