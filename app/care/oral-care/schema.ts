import type { z } from 'zod'
import { careFields, choices, note } from '../field.ts'
import { charted } from '../kind.ts'

export const mouthCare = {
  looked: 'Looked at',
  moistened: 'Moistened',
  brushed: 'Teeth or dentures brushed',
  suctioned: 'Mouth suctioned',
} as const

export const mouthFindings = {
  clean: 'Clean and moist',
  dry: 'Dry',
  coated: 'Coated tongue',
  sore: 'Sore or ulcer',
  thrush: 'White patches',
  bleeding: 'Bleeding',
} as const

/** One round of care of the mouth: what was done and what was seen. */
export const oralCareSchema = careFields({
  care: choices({ label: 'Care of the mouth', options: mouthCare }),
  seen: choices({ label: 'Mouth seen', hint: 'As you found it', options: mouthFindings }).refine(
    seen => seen.length === 1 || !seen.includes('clean'),
    'Clean and moist does not go with another finding',
  ),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Rounds of oral care: ask a record with this. */
export const oralCares = charted({ slug: 'oral-care', schema: oralCareSchema })

export type OralCareData = z.output<typeof oralCareSchema>

/** Looked at, moistened or brushed: suction alone is no round of care. */
export function isRound({ care }: OralCareData): boolean {
  return care.some(act => act !== 'suctioned')
}

/** Whether teeth or dentures were brushed. */
export function isBrushing({ care }: OralCareData): boolean {
  return care.includes('brushed')
}
