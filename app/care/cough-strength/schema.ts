import type { z } from 'zod'
import { careFields, choice, note, quantity, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

/** The semiquantitative grades 0 to 5 of Duan 2015, in own words. */
export const coughGrades = {
  '0': '0: none on command',
  '1': '1: air moves, no sound',
  '2': '2: weak, just heard',
  '3': '3: clearly heard',
  '4': '4: strong',
  '5': '5: strong, several in a row',
} as const

export const coughRoutes = {
  mouth: 'At mouth or mask',
  valve: 'Through tube and one-way valve',
  tube: 'At the tube',
  'not measured': 'Not measured',
} as const

const measured = { when: { field: 'route', is: ['mouth', 'valve', 'tube'] }, neededThen: true } as const

const fields = careFields({
  grade: choice({ label: 'Cough on command', options: coughGrades }).optional(),
  route: choice({ label: 'Peak flow', hint: 'Where the meter was held: each has its own limit', options: coughRoutes }),
  peakFlow: quantity({ label: 'Best peak flow', unit: 'L/min', min: 5, max: 900, ...measured }).optional(),
  assisted: choice({ label: 'Assisted cough', hint: 'By hands or device', options: yesNo, ...measured }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** A look at the cough: graded, measured, or both. */
export const coughSchema = fields.superRefine((seen, context) => {
  if (seen.grade !== undefined || seen.route !== 'not measured') return
  context.addIssue({ code: 'custom', path: ['grade'], message: 'Choose the cough on command, or enter a peak flow' })
})

/** Strength of the cough: ask a record with this. */
export const coughChecks = charted({ slug: 'cough-strength', schema: coughSchema })

export type CoughData = z.output<typeof coughSchema>
