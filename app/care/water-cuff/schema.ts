import type { z } from 'zod'
import { careFields, choice, note, quantity, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

const ml = { unit: 'mL', min: 0, max: 20, step: 0.1 } as const

/** One emptying and filling of a water cuff: by volume, since its pressure says nothing of the seal. */
export const waterCuffSchema = careFields({
  prescribedMl: quantity({ label: 'Water prescribed', ...ml }),
  removedMl: quantity({ label: 'Water removed', hint: 'All that came out', ...ml }),
  instilledMl: quantity({ label: 'Water put in', hint: '0 when the cuff is left empty on purpose', ...ml }),
  leak: choice({ label: 'Leak or voice with the cuff up', options: yesNo }),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Fillings of a water cuff: ask a record with this. */
export const waterCuffs = charted({ slug: 'water-cuff', schema: waterCuffSchema })

export type WaterCuffData = z.output<typeof waterCuffSchema>
