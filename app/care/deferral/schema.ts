import type { z } from 'zod'
import { later, minutes } from '../../time/duration.ts'
import { careFields, choice, nameOf, text } from '../field.ts'
import { charted, type Entry } from '../kind.ts'

export const deferralReasons = {
  'patient refused': 'Patient refused',
  unstable: 'Patient unstable',
  'off ward': 'Patient off ward',
  procedure: 'Procedure',
  'not available': 'Staff or equipment not available',
  other: 'Other',
} as const

/** How long care may be put off, in minutes. */
export const delays = { '30': '30 min', '60': '1 h', '120': '2 h', '240': '4 h', '480': '8 h' } as const

const schema = careFields({
  task: nameOf('task', { label: 'Care that is deferred' }),
  minutes: choice({ label: 'Delay', hint: 'Counted from the time given above', options: delays }),
  reason: choice({ label: 'Reason', options: deferralReasons }),
  why: text({ label: 'Other reason', when: { field: 'reason', is: ['other'] }, neededThen: true }).optional(),
  agreedWith: text({ label: 'Person who agreed' }),
})

export type DeferralData = z.output<typeof schema>

/** Care put off to a new time: ask a record with this. A deferral never counts as done. */
export const deferrals = charted({ slug: 'deferral', schema })

/** The new target time of the deferred care (UTC). */
export function deferredUntil(entry: Entry<DeferralData>): Date {
  return later(entry.performedAt, minutes(Number(entry.data.minutes)))
}
