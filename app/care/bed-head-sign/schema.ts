import type { z } from 'zod'
import { careFields, choice, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

/** Upper airway as the sign shows it: which of the two forms it is, or the one that is safe while nobody knows. */
export const signForms = {
  open: 'Tracheostomy, upper airway open',
  'not open': 'Laryngectomy, breathes only through the neck',
  'not known': 'Upper airway not known: oxygen to face and neck',
} as const

export const laryngoscopyGrades = {
  '1': 'Grade 1',
  '2': 'Grade 2',
  '3': 'Grade 3',
  '4': 'Grade 4',
} as const

/** What of the patient and the tube a printed sign showed, so that a later change of any of it is noticed. */
const fields = careFields({
  act: choice({
    label: 'What was done',
    options: { printed: 'Printed', downloaded: 'Made as a PDF to print', 'taken down': 'Taken down and destroyed' },
  }),
  form: choice({ label: 'Form of the sign', options: signForms }),
  tube: text({ label: 'Record of the tube that it shows', maxLength: 36 }).optional(),
  sutures: choice({ label: 'Flange sutures', options: yesNo }).optional(),
  laryngoscopy: choice({ label: 'View at laryngoscopy', options: laryngoscopyGrades }).optional(),
  airwayNotes: text({ label: 'Known problems of the airway', maxLength: 500 }).optional(),
  bed: text({ label: 'Bed' }).optional(),
  identity: text({ label: 'Name, birth and record number', maxLength: 300 }).optional(),
})

/** Bed-head signs printed or taken down: ask a record with this. */
export const bedHeadSigns = charted({ slug: 'bed-head-sign', schema: fields })

export type SignData = z.output<typeof fields>
