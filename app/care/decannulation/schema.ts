import type { z } from 'zod'
import { careFields, choice, note, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

export const breathing = { comfortable: 'Comfortable', laboured: 'Laboured', stridor: 'Stridor' } as const

/** Removals of the tube for good: ask a record with this. */
export const decannulations = charted({
  slug: 'decannulation',
  schema: careFields({
    agreed: choice({ label: 'Agreement of the team', options: yesNo }),
    operator: text({ label: 'Operator' }),
    helper: text({ label: 'Helper' }),
    breathing: choice({ label: 'Breathing afterwards', options: breathing }),
    dressing: choice({ label: 'Airtight dressing', options: yesNo }),
    note: note({ label: 'Note', more: true }).optional(),
  }),
})

export type DecannulationData = z.output<typeof decannulations.schema>
