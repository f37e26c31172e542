import { careFields, choice, note, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

export const breathing = { comfortable: 'Comfortable', laboured: 'Laboured', stridor: 'Stridor' } as const

/** Removals of the tube for good: ask a record with this. */
export const decannulations = charted({
  slug: 'decannulation',
  schema: careFields({
    agreed: choice({ label: 'Team agreed to the removal', options: yesNo }),
    operator: text({ label: 'Operator' }),
    helper: text({ label: 'Helper' }),
    breathing: choice({ label: 'Breathing after', options: breathing }),
    dressing: choice({ label: 'Airtight dressing on', options: yesNo }),
    note: note({ label: 'Note', more: true }).optional(),
  }),
})
