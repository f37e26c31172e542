import type { z } from 'zod'
import { careFields, choice, note, quantity } from '../field.ts'
import { charted } from '../kind.ts'
import { bloodField, colourField } from '../suction/secretions.ts'

/** One emptying of the space above the cuff, through the port of the tube. */
export const aboveCuffSchema = careFields({
  volumeMl: quantity({ label: 'Volume drawn', unit: 'mL', min: 0, max: 200, step: 0.5, large: true }),
  port: choice({
    label: 'Port',
    options: { open: 'Open', cleared: 'Blocked, cleared now', blocked: 'Blocked' },
  }),
  colour: colourField({ hint: 'Leave empty when nothing came' }).optional(),
  blood: bloodField({}),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Suction above the cuff with its volume: ask a record with this. `suctions` may hold the same route without one. */
export const aboveCuffSuctions = charted({ slug: 'above-cuff-suction', schema: aboveCuffSchema })

export type AboveCuffData = z.output<typeof aboveCuffSchema>

/** Whether the space was emptied: through a blocked port nothing comes, whatever lies there. */
export function isEmptied({ port }: AboveCuffData): boolean {
  return port !== 'blocked'
}
