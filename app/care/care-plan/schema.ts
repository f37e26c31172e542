import type { z } from 'zod'
import { careFields, choice, date, nameOf, note, quantity } from '../field.ts'
import { charted } from '../kind.ts'

const own = { field: 'step', is: ['set own value'] }

const schema = careFields({
  setting: nameOf('setting', { label: 'Setting' }),
  step: choice({
    label: 'Step',
    options: { 'set own value': 'Set an own value', 'back to ward policy': 'Back to ward policy' },
  }),
  // Wide enough for every setting; `problems` holds the value against the range of the one that is chosen.
  value: quantity({
    label: 'Own value',
    unitField: 'setting',
    min: 0.5,
    max: 400,
    step: 0.5,
    large: true,
    when: own,
    neededThen: true,
  }).optional(),
  reviewOn: date({
    label: 'Review date',
    hint: 'The day by which the team looks at it again',
    when: own,
    neededThen: true,
  }).optional(),
  reason: note({ label: 'Reason', maxLength: 500 }),
})

export type CarePlanData = z.output<typeof schema>

/** A patient's own values and their end: ask a record with this, or `personalValues`. */
export const carePlans = charted({ slug: 'care-plan', schema })
