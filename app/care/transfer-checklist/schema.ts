import type { z } from 'zod'
import { careFields, choice, choices, note, text } from '../field.ts'
import { charted, type Entry } from '../kind.ts'

export const transferMoments = { leaving: 'Before leaving', arrived: 'On arrival' } as const

/** What must be there for a move: with the patient, or waiting where they go. */
export const transferItems = {
  tube: 'Tube passport: type, sizes, last change, next change',
  kit: 'Whole bedside kit travels along, with spare tubes',
  sign: 'Bed-head sign for this airway',
  plan: 'Care plan, and plan for an emergency',
  suction: 'Suction and oxygen that work, on the way and there',
  staff: 'Staff there can care for a tracheostomy',
} as const

/** One look at what goes along on a move to another ward or unit. */
export const transferSchema = careFields({
  moment: choice({ label: 'Moment', options: transferMoments }),
  place: text({ label: 'Ward or unit moved to' }),
  complete: choice({
    label: 'All of it there',
    hint: Object.values(transferItems).join('; '),
    options: { yes: 'Yes, each looked at', no: 'Something is missing' },
  }),
  missing: choices({
    label: 'Missing',
    options: transferItems,
    when: { field: 'complete', is: ['no'] },
    neededThen: true,
  }).optional(),
  handedTo: text({ label: 'Person taking over' }),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Moves of a patient with a tube: ask a record with this. */
export const transfers = charted({ slug: 'transfer-checklist', schema: transferSchema })

export type TransferData = z.output<typeof transferSchema>

/** Whether it tells that the patient has come to the new place. */
export function isArrival({ data }: Entry<TransferData>): boolean {
  return data.moment === 'arrived'
}
