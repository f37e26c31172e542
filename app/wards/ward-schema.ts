import { z } from 'zod'
import { choice, text } from '../care/field.ts'
import { pressureUnits } from '../clinical/units.ts'
import { shiftTimesProblem } from '../time/shift.ts'
import { emergencyNumbers } from './emergency-numbers.ts'

const lost = 'This form has lost a part of itself. Open it again.'

/** `07:00, 15:00, 23:00`, in any spacing, as a list. */
const shiftTimes = z
  .string('Enter the shift starts')
  .max(120, 'Enter at most six shift starts')
  .transform(words => words.split(/[\s,;]+/).filter(Boolean))
  .superRefine((times, context) => {
    const says = shiftTimesProblem(times)
    if (says !== undefined) context.addIssue({ code: 'custom', message: says })
  })

/** What an administrator says about a ward. The id was minted when the form was opened: the same form twice adds one. */
export const wardSchema = z.object({
  id: z.uuid(lost),
  name: text({ label: 'Name of the ward', maxLength: 80 }),
  shiftTimes,
  pressureUnit: choice({
    label: 'Unit that the manometers show',
    options: Object.fromEntries(pressureUnits.map(unit => [unit, unit])) as Record<
      (typeof pressureUnits)[number],
      string
    >,
  }),
  emergencyNumbers,
})

/** Takes a ward out of use, or back into it. */
export const useSchema = z.object({ retired: z.enum(['yes', 'no'], lost) })

export const bedSchema = z.object({ id: z.uuid(lost), label: text({ label: 'Label of the bed', maxLength: 16 }) })

export const bedChangeSchema = z.object({
  ...bedSchema.shape,
  position: z
    .number('Enter the place on the board as a number')
    .int('Enter the place on the board as a whole number')
    .min(1, 'Places on the board count from 1')
    .max(999, 'Places on the board go up to 999'),
  retired: z.enum(['yes', 'no'], lost),
})
