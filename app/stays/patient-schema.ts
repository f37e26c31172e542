import { z } from 'zod'
import { laryngoscopyGrades } from '../care/bed-head-sign/schema.ts'
import { careFields, choice, date, fieldsOf, quantity, text } from '../care/field.ts'

const identifiers = {
  recordNumber: text({ label: 'Record number', section: 'Who', hint: 'As on the wristband', maxLength: 32 }),
  bornOn: date({ label: 'Date of birth' }),
}

/** Somebody who was here before is found by two identifiers, so that one slip does not open another person's stay. */
export const knownPerson = careFields(identifiers)

/** Who a patient is, and what everybody at the bed must know of them. */
export const person = careFields({
  ...identifiers,
  familyName: text({ label: 'Family name', maxLength: 80 }),
  givenName: text({ label: 'Given name', maxLength: 80 }),
  sex: choice({
    label: 'Sex',
    options: { female: 'Female', male: 'Male', other: 'Other', 'not known': 'Not known' },
  }),
  upperAirway: choice({
    label: 'Upper airway',
    section: 'What everybody must know',
    hint: 'Not open after a laryngectomy: they breathe only through the neck',
    options: { open: 'Open', 'not open': 'Not open: laryngectomy', 'not known': 'Not known' },
  }),
  laryngoscopy: choice({
    label: 'View at laryngoscopy',
    hint: 'As the anaesthetist graded it: 1 all of the opening seen, 4 none of it',
    options: laryngoscopyGrades,
  }).optional(),
  airwayNotes: text({
    label: 'Known problems of the airway',
    hint: 'Printed on the bed-head sign: what makes intubation, oxygen or a tube change difficult',
    maxLength: 500,
  }).optional(),
  ventilated: choice({ label: 'Ventilation', options: { yes: 'Through the tube', no: 'None' } }),
  allergies: text({
    label: 'Allergies',
    hint: 'Write None known when you have asked and there are none',
    maxLength: 500,
  }).optional(),
  oxygen: text({ label: 'Oxygen', hint: 'As prescribed, such as 28 % humidified', maxLength: 120 }).optional(),
  spo2Low: quantity({ label: 'SpO2 target from', unit: '%', min: 50, max: 100 }).optional(),
  spo2High: quantity({ label: 'SpO2 target to', unit: '%', min: 50, max: 100 }).optional(),
})

export type PersonAnswers = z.output<typeof person>

/** The form that edits a patient. `version` is the one that was read when it was opened. */
export const detailsSchema = z.object({
  version: z.number('This form has lost a part of itself. Open it again.').int().positive(),
  person,
})

/** The names under which a part of a form sends its fields: `person.bornOn`. */
export function namesIn(part: string, schema: z.ZodObject): readonly string[] {
  return fieldsOf(schema).map(({ name }) => `${part}.${name}`)
}

const EARLIEST_BIRTH = '1900-01-01'

/** What is wrong with answers that are each in order, by field: a birth that cannot be, half a target range. */
export function personProblem(
  answers: Partial<PersonAnswers> & Pick<PersonAnswers, 'bornOn'>,
  today: string,
): { readonly field: string; readonly says: string } | undefined {
  const { bornOn, spo2Low, spo2High } = answers
  if (bornOn < EARLIEST_BIRTH) return { field: 'person.bornOn', says: 'Check the year of birth' }
  if (bornOn > today) return { field: 'person.bornOn', says: 'The date of birth has not come yet' }
  if (spo2Low !== undefined && spo2High === undefined) {
    return { field: 'person.spo2High', says: 'Enter the upper end of the target too' }
  }
  if (spo2Low === undefined && spo2High !== undefined) {
    return { field: 'person.spo2Low', says: 'Enter the lower end of the target too' }
  }
  if (spo2Low !== undefined && spo2High !== undefined && spo2Low > spo2High) {
    return { field: 'person.spo2High', says: 'The upper end of the target must be at least the lower end' }
  }
  return undefined
}

/** The answers as they are stored: what was left empty is null. */
export function detailsOf(answers: PersonAnswers) {
  const { allergies = null, oxygen = null, spo2Low = null, spo2High = null, ventilated, ...rest } = answers
  const airway = { laryngoscopy: answers.laryngoscopy ?? null, airwayNotes: answers.airwayNotes ?? null }
  return { ...rest, ...airway, allergies, oxygen, spo2Low, spo2High, ventilated: ventilated === 'yes' }
}

/** A patient as they are stored; who was stored before a question was asked has no answer to it. */
type PatientAnswers = Omit<ReturnType<typeof detailsOf>, 'laryngoscopy' | 'airwayNotes'> &
  Partial<Pick<ReturnType<typeof detailsOf>, 'laryngoscopy' | 'airwayNotes'>>

/** A patient as the form shows them: what is null is left empty. */
export function answersOf(patient: PatientAnswers) {
  const { recordNumber, bornOn, familyName, givenName, sex, upperAirway, allergies, oxygen, spo2Low, spo2High } =
    patient
  const airway = { laryngoscopy: patient.laryngoscopy, airwayNotes: patient.airwayNotes }
  const who = { recordNumber, bornOn, familyName, givenName, sex, upperAirway, ...airway }
  return { ...who, ventilated: patient.ventilated ? 'yes' : 'no', allergies, oxygen, spo2Low, spo2High }
}
