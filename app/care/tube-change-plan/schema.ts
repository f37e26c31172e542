import type { z } from 'zod'
import { itemOf } from '../carried-field.ts'
import { careFields, choice, choices, date, note, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

const planned = { when: { field: 'step', is: ['plan'] } }
const neededPlan = { ...planned, neededThen: true }

export const indications = {
  'first change': 'First change',
  routine: 'Routine, by date',
  smaller: 'To a smaller tube',
  larger: 'To a larger tube',
  'cuff change': 'Other cuff',
  fault: 'Fault',
  other: 'Other',
} as const

/** What speaks against a change now (Royal Marsden Manual, ch. 12). */
export const contraindications = {
  none: 'None',
  early: 'Too early after the opening was made',
  view: 'Poor view or light',
  kit: 'Kit not complete',
  staff: 'Nobody experienced at hand',
  support: 'High ventilator or oxygen need',
  radiotherapy: 'Radiotherapy of the neck within 2 weeks',
  'end of life': 'End of life',
  refusal: 'Patient refuses',
} as const

export const consents = {
  given: 'Given',
  interests: 'Decided in the patient’s interest',
  'not yet': 'Not asked yet',
  refused: 'Refused',
} as const

const ready = { yes: 'Ready', no: 'Not yet' } as const

/** The gate before a change of tube: every question is answered before the plan stands; or a plan called off. */
const fields = careFields({
  step: choice({ label: 'Step', options: { plan: 'Plan a tube change', 'call off': 'Call off the plan' } }),
  calledOffBecause: text({
    label: 'Reason for calling it off',
    when: { field: 'step', is: ['call off'] },
    neededThen: true,
  }).optional(),
  plannedOn: date({ label: 'Planned date', ...neededPlan }).optional(),
  indication: choice({ label: 'Indication', options: indications, ...neededPlan }).optional(),
  otherIndication: text({
    label: 'Other indication',
    when: { field: 'indication', is: ['other'] },
    neededThen: true,
  }).optional(),
  newTube: text({
    label: 'Tube to go in',
    hint: 'Line and size as printed, or scanned; "same" for the same again',
    ...neededPlan,
  }).optional(),
  newItem: itemOf({ label: 'Scanned tube', of: 'tube', prints: { both: 'newTube' }, ...planned }).optional(),
  tract: text({
    label: 'Opening and tube now',
    hint: 'From the record: hold it against what you see',
    maxLength: 240,
    ...planned,
  }).optional(),
  contraindications: choices({
    label: 'Contraindications',
    section: 'Gate before the change',
    options: contraindications,
    ...neededPlan,
  })
    .refine(chosen => chosen.length === 1 || !chosen.includes('none'), 'None does not go with another contraindication')
    .optional(),
  operator: text({ label: 'Operator', ...neededPlan }).optional(),
  helper: text({ label: 'Helper skilled in airways', ...neededPlan }).optional(),
  equipment: choice({ label: 'Equipment at the bedside', options: ready, ...neededPlan }).optional(),
  spareSame: choice({ label: 'Spare tube, same size', options: ready, ...neededPlan }).optional(),
  spareSmaller: choice({ label: 'Spare tube, one size smaller', options: ready, ...neededPlan }).optional(),
  fasted: choice({
    label: 'Fasting, feed stopped',
    options: { yes: 'Done as policy says', arranged: 'Arranged', 'not needed': 'Not needed' },
    ...neededPlan,
  }).optional(),
  capnography: choice({ label: 'Monitoring, with capnography', options: ready, ...neededPlan }).optional(),
  consent: choice({ label: 'Consent', options: consents, ...neededPlan }).optional(),
  ifItFails: note({
    label: 'Plan if it fails',
    hint: 'Who is called, how oxygen is given, which tube is next',
    maxLength: 500,
    ...neededPlan,
  }).optional(),
  senior: text({
    label: 'Senior who decides to go ahead',
    section: 'Only if it is early or contraindicated',
    ...planned,
  }).optional(),
  seniorReason: note({ label: 'Reason to go ahead', maxLength: 500, ...planned }).optional(),
  informed: choice({ label: 'Family or carers told', options: yesNo, more: true, ...planned }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** A plan to change the tube, with its gate, or the end of one. */
export const tubePlanSchema = fields

/** Plans of tube changes: ask a record with this, or `openPlan`. */
export const tubePlans = charted({ slug: 'tube-change-plan', schema: tubePlanSchema })

export type TubePlanData = z.output<typeof tubePlanSchema>
