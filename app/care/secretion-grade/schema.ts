import type { z } from 'zod'
import { careFields, choice, choices, note } from '../field.ts'
import { charted } from '../kind.ts'

/** Columns and grades of the Airway Care Score (Critical Care 2008, table 1), best first. */
export const scoreColumns = {
  cough: { vigorous: 'Vigorous', moderate: 'Moderate', weak: 'Weak', none: 'None' },
  passes: { none: 'None', one: '1 pass', two: '2 passes', three: '3 passes or more' },
  colour: { clear: 'Clear', tan: 'Tan', yellow: 'Yellow', green: 'Green' },
  viscosity: { watery: 'Watery', frothy: 'Frothy', thick: 'Thick', tenacious: 'Tenacious' },
  interval: {
    rare: 'More than 3 hours apart',
    'two to three': 'Every 2 to 3 hours',
    'one to two': 'Every 1 to 2 hours',
    often: 'More often than hourly',
  },
} as const
export type ScoreColumn = keyof typeof scoreColumns

export const colourFlags = {
  none: 'None of these',
  streaks: 'Pink, or streaks of blood',
  fresh: 'Fresh blood',
  old: 'Brown, old blood',
  feed: 'Like feed or food',
} as const

/** One grading of the secretions. Blood and feed are asked for beside the score, which has no place for them. */
export const secretionGradeSchema = careFields({
  cough: choice({ label: 'Cough at suction', options: scoreColumns.cough }),
  passes: choice({ label: 'Quantity, as passes to clear', options: scoreColumns.passes }),
  colour: choice({ label: 'Colour', options: scoreColumns.colour }),
  viscosity: choice({ label: 'Viscosity', options: scoreColumns.viscosity }),
  interval: choice({ label: 'Suction needed', options: scoreColumns.interval }),
  flags: choices({ label: 'Also seen', hint: 'Outside the score', options: colourFlags }).refine(
    chosen => chosen.length === 1 || !chosen.includes('none'),
    'None of these does not go with another',
  ),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Gradings of secretions: ask a record with this. */
export const secretionGrades = charted({ slug: 'secretion-grade', schema: secretionGradeSchema })

export type SecretionGradeData = z.output<typeof secretionGradeSchema>
