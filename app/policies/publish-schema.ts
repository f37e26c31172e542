import { z } from 'zod'
import { date, note, text } from '../care/field.ts'

const lost = 'This form has lost a part of itself. Open it again.'

/** What is said of a draft as it becomes a version. */
export const publishSchema = z.object({
  /** Minted when the form was opened: the same form twice is one version. */
  id: z.uuid(lost),
  /** The draft that the form saw. */
  rev: z.number(lost).int(lost),
  name: text({ label: 'Name of the policy', maxLength: 120 }),
  reviewer: z.uuid('Choose the reviewer from the list').optional(),
  otherReviewer: text({ label: 'Name of the reviewer', maxLength: 70 }).optional(),
  otherRole: text({ label: 'Role of the reviewer', maxLength: 45 }).optional(),
  reviewedOn: date({ label: 'Reviewed on' }),
  reason: note({ label: 'Reason', maxLength: 500 }),
  start: z.enum(['now', 'later'], 'Choose when it starts'),
  day: z.iso.date('Enter the day as a date').optional(),
  time: z
    .string('Enter one time')
    .regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'Enter the time as hours and minutes, such as 14:06')
    .optional(),
  wards: z.array(z.uuid('Choose the wards from the list')).optional(),
})

export type Publication = z.output<typeof publishSchema>

/** Takes a version back before it starts. */
export const withdrawSchema = z.object({ reason: note({ label: 'Reason', maxLength: 500 }) })
