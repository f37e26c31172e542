import type { z } from 'zod'
import { careFields, choice, note, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

export const holders = {
  padded: 'Padded, hook and loop',
  tape: 'Cotton tape',
  elastic: 'Elastic',
  other: 'Other',
} as const

export const fingersUnder = {
  none: '0, too tight',
  one: '1',
  two: '2',
  'more than two': 'More than 2, too loose',
} as const

export const skinUnderTies = {
  intact: 'Intact',
  'blanching redness': 'Redness that blanches',
  'staying redness': 'Redness that stays',
  broken: 'Broken',
  wet: 'Wet or macerated',
} as const

/** One look at the ties or the holder: how they fit, what they are, whether they were changed, and the skin under them. */
export const tieSchema = careFields({
  fingers: choice({ label: 'Fingers under the ties', hint: 'As you leave them', options: fingersUnder }),
  skin: choice({ label: 'Skin under the ties', hint: 'All round, with the back of the neck', options: skinUnderTies }),
  changed: choice({ label: 'Ties or holder changed', hint: 'Whenever soiled or wet', options: yesNo }),
  secondPerson: text({
    label: 'Second person',
    hint: 'Holds the tube while ties are changed; write "alone" if nobody did',
    when: { field: 'changed', is: ['yes'] },
    neededThen: true,
  }).optional(),
  holder: choice({ label: 'Holder now', options: holders }),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Looks at the ties: ask a record with this. The fit is charted with stoma and skin as well; `tieLooks` knows both. */
export const tieChecks = charted({ slug: 'ties', schema: tieSchema })

export type TieData = z.output<typeof tieSchema>
