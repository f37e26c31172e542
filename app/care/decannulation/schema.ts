import type { z } from 'zod'
import { careFields, choice, choices, note, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

export const breathing = { comfortable: 'Comfortable', laboured: 'Laboured', stridor: 'Stridor' } as const

/** What lies at the bedside before a tube is taken out (Royal Marsden Manual, St George's NHS). */
export const removalKit = {
  same: 'Tube of the same size',
  smaller: 'Tube one size smaller',
  dilators: 'Tracheal dilators',
  suction: 'Suction that works',
  stethoscope: 'Stethoscope',
  resuscitation: 'Resuscitation kit',
} as const

/** Removals of the tube for good: ask a record with this. */
export const decannulations = charted({
  slug: 'decannulation',
  schema: careFields({
    agreed: choice({ label: 'Agreement of the team', options: yesNo }),
    operator: text({ label: 'Operator' }),
    helper: text({ label: 'Helper', hint: 'Two staff take a tube out' }),
    kit: choice({
      label: 'Kit at the bedside',
      hint: Object.values(removalKit).join(', '),
      options: { complete: 'Complete', incomplete: 'Something was missing', 'not asked': 'Not asked' },
    }),
    kitMissing: choices({
      label: 'Missing from the kit',
      options: removalKit,
      when: { field: 'kit', is: ['incomplete'] },
      neededThen: true,
    }).optional(),
    breathing: choice({ label: 'Breathing afterwards', options: breathing }),
    dressing: choice({ label: 'Airtight dressing', options: yesNo }),
    note: note({ label: 'Note', more: true }).optional(),
  }),
  upgrades: [withKit],
})

export type DecannulationData = z.output<typeof decannulations.schema>

/** Version 1 had no question about the kit. */
function withKit(old: Readonly<Record<string, unknown>>): unknown {
  return { ...old, kit: 'not asked' }
}
