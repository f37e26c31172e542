import type { z } from 'zod'
import { spo2Range } from '../../clinical/observations.ts'
import { careFields, choice, note, quantity, yesNo } from '../field.ts'
import { charted } from '../kind.ts'
import { efforts } from '../observations/schema.ts'

export const voices = { clear: 'Clear', hoarse: 'Hoarse or weak', wet: 'Wet', none: 'No voice' } as const

/** One look after the tube was taken out for good: breathing, oxygen, voice, and what lies ready. */
export const afterRemovalSchema = careFields({
  respiratoryRate: quantity({ label: 'Respiratory rate', unit: 'a min', min: 0, max: 70 }),
  spo2: quantity({ label: 'Oxygen saturation (SpO2)', unit: '%', ...spo2Range }),
  effort: choice({ label: 'Breathing', options: efforts }),
  stridor: choice({ label: 'Stridor or noisy breathing', options: yesNo }),
  voice: choice({ label: 'Voice', options: voices }),
  monitored: choice({ label: 'SpO2 watched without a break', options: yesNo }),
  spareThere: choice({ label: 'Spare tubes and dilators at the bedside', options: yesNo }),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Observations after removal: ask a record with this. */
export const afterRemovals = charted({ slug: 'after-removal', schema: afterRemovalSchema })

export type AfterRemovalData = z.output<typeof afterRemovalSchema>
