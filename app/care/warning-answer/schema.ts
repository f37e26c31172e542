import type { z } from 'zod'
import { careFields, choice, nameOf, note } from '../field.ts'
import { charted } from '../kind.ts'

/** What somebody answers to a warning. */
export const answers = {
  seen: 'Seen',
  'acted on': 'Acted on',
  settled: 'Settled: it no longer needs anything',
} as const

const schema = careFields({
  warning: nameOf('warning', { label: 'Warning' }),
  answer: choice({ label: 'Answer', options: answers }),
  done: note({
    label: 'What was done',
    maxLength: 500,
    when: { field: 'answer', is: ['acted on'] },
    neededThen: true,
  }).optional(),
  why: note({
    label: 'Why it is settled',
    hint: 'It stays on record, and stands again with the next finding like it',
    maxLength: 500,
    when: { field: 'answer', is: ['settled'] },
    neededThen: true,
  }).optional(),
})

export type WarningAnswerData = z.output<typeof schema>

/** Answers to warnings: ask a record with this. An answer is part of the record like any other act, and may be corrected. */
export const warningAnswers = charted({ slug: 'warning-answer', schema })
