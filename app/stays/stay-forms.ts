import { z } from 'zod'
import { choice, text } from '../care/field.ts'
import { momentFields } from '../charting/chart-form.ts'
import { knownPerson, person } from './patient-schema.ts'

const bed = { bedId: z.uuid({ error: 'Choose a free bed' }) }

/** Admits somebody who was never charted here. */
export const newAdmission = z.object({ ...momentFields, ...bed, person })

/** Admits somebody who was here before. */
export const knownAdmission = z.object({ ...momentFields, ...bed, person: knownPerson })

export const moveSchema = z.object({ ...momentFields, ...bed })

/** How a stay ends, in words by what is stored. */
export const dischargeWords = {
  home: 'Home',
  'another ward': 'Another ward',
  'another hospital': 'Another hospital',
  rehabilitation: 'Rehabilitation',
  'care home': 'Care home',
  died: 'Died',
  other: 'Other',
} as const

export const dischargeSchema = z.object({
  ...momentFields,
  reason: choice({ label: 'Destination', options: dischargeWords }),
  note: text({ label: 'Note', maxLength: 500 }).optional(),
  careAfter: z.literal('yes', { error: 'Tick it to discharge all the same' }).optional(),
})
