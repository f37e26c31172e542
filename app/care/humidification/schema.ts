import type { z } from 'zod'
import { careFields, choice, note, quantity } from '../field.ts'
import { charted } from '../kind.ts'
import { consistencyField } from '../suction/secretions.ts'

export const methods = {
  hme: 'Heat and moisture exchanger',
  'cold aerosol': 'Cold aerosol',
  heated: 'Heated humidifier',
  nebuliser: 'Nebuliser, in between',
  bib: 'Bib over the opening',
  none: 'None',
} as const

/** One look at how the air is warmed and moistened on its way to the tube. */
export const humidificationSchema = careFields({
  method: choice({ label: 'Method', hint: 'As you leave it', options: methods }),
  hmeChanged: choice({
    label: 'Exchanger',
    hint: 'Changed whenever it is wet or soiled',
    options: { yes: 'Changed now', no: 'Left on' },
    when: { field: 'method', is: ['hme'] },
    neededThen: true,
  }).optional(),
  waterLevel: choice({
    label: 'Water level',
    hint: 'As you leave it',
    options: { ok: 'Between the marks', filled: 'Filled up now', low: 'Low' },
    when: { field: 'method', is: ['heated'] },
    neededThen: true,
  }).optional(),
  temperature: quantity({
    label: 'Temperature of the air',
    unit: '°C',
    min: 15,
    max: 45,
    step: 0.5,
    when: { field: 'method', is: ['heated'] },
  }).optional(),
  consistency: consistencyField({ section: 'Secretions' }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Looks at humidification: ask a record with this. */
export const humidifications = charted({ slug: 'humidification', schema: humidificationSchema })

export type HumidificationData = z.output<typeof humidificationSchema>
