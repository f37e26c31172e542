import type { z } from 'zod'
import { codes, decidedItem, itemOf } from '../carried-field.ts'
import { careFields, choice, date, note, quantity, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'
import { amountField, bloodField, colourField, consistencyField } from '../suction/secretions.ts'

const backIn = { field: 'act', is: ['inspected', 'cleaned', 'replaced', 'swapped'] }

/** The cannula in place was taken out, or somebody tried to. */
const touched = {
  when: { field: 'act', is: ['inspected', 'cleaned', 'replaced', 'swapped', 'unable'] },
  neededThen: true,
}

/** Where the cannula of a reusable pair is that is not in the tube. */
export const otherPlaces = { ready: 'Clean and ready', cleaning: 'Being cleaned', lost: 'Lost or broken' } as const

const fields = careFields({
  act: choice({
    label: 'Care given',
    options: {
      inspected: 'Looked at, clean, put back',
      cleaned: 'Cleaned and put back',
      replaced: 'Replaced with new',
      swapped: 'Swapped for the clean spare',
      'other only': 'Left in; only the other of the pair',
      unable: 'Could not be done',
    },
  }),
  whyUnable: choice({
    label: 'Reason it could not be done',
    options: {
      stuck: 'Would not come out',
      'not back': 'Would not go back in',
      'none to fit': 'Taken out, no matching one to fit',
      'not tolerated': 'Stopped: not tolerated',
      other: 'Other, see note',
    },
    when: { field: 'act', is: ['unable'] },
    neededThen: true,
  }).optional(),
  condition: choice({
    label: 'Condition found',
    hint: 'Of the cannula that was in',
    options: {
      clear: 'Clear',
      light: 'Light coating',
      moderate: 'Less than half blocked',
      heavy: 'Half blocked or more',
      blocked: 'Blocked',
      none: 'None was in place',
      'not seen': 'Not seen',
    },
    ...touched,
  }).optional(),
  line: text({
    label: 'Line of the inner cannula',
    section: 'In place now',
    hint: 'As printed on the cannula or its pack',
  }).optional(),
  size: text({ label: 'Size of the inner cannula', maxLength: 12 }).optional(),
  locked: choice({
    label: 'Lock',
    options: { yes: 'Locked in place', no: 'Not locked' },
    when: backIn,
    neededThen: true,
  }).optional(),
  spare: choice({ label: 'Matching spare at the bedside', options: yesNo }),
  other: choice({
    label: 'Other one of the pair',
    hint: 'Of a reusable pair: the one that is not in',
    options: otherPlaces,
  }).optional(),
  foundReused: choice({
    label: 'Single-use cannula found cleaned and used again',
    options: yesNo,
    more: true,
  }).optional(),
  tolerance: choice({
    label: 'Tolerance',
    section: 'The patient',
    options: { well: 'Well', cough: 'Cough', desaturation: 'SpO2 fell', distress: 'Distress' },
    ...touched,
  }).optional(),
  spo2Low: quantity({
    label: 'Lowest SpO2',
    unit: '%',
    min: 40,
    max: 100,
    when: { field: 'tolerance', is: ['desaturation'] },
    neededThen: true,
  }).optional(),
  amount: amountField({ more: true }).optional(),
  colour: colourField({ more: true }).optional(),
  consistency: consistencyField({ more: true }).optional(),
  blood: bloodField({ more: true }).optional(),
  preOxygenated: choice({ label: 'Oxygen given before', options: yesNo, more: true }).optional(),
  assistant: text({ label: 'Assistant', more: true }).optional(),
  lot: text({ label: 'Lot', maxLength: 20, more: true }).optional(),
  expiresOn: date({ label: 'Expiry date', more: true }).optional(),
  item: itemOf({
    label: 'Scanned inner cannula',
    of: 'inner cannula',
    prints: { line: 'line', size: 'size' },
  }).optional(),
  scanned: codes({ label: 'Codes of the inner cannula' }).optional(),
  madeFor: decidedItem({ label: 'Tube in place, which it is made for' }).optional(),
  notMadeFor: decidedItem({ label: 'Tube in place, which it is not made for' }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** One look at the inner cannula: what was found, what was done, what is in place now. */
export const innerCannulaSchema = fields.superRefine((data, context) => {
  if (data.condition === 'none' && (data.act === 'inspected' || data.act === 'cleaned')) {
    context.addIssue({
      code: 'custom',
      path: ['act'],
      message: 'None was in place: choose what was fitted, or why not',
    })
  }
  if (data.act === 'other only' && data.other === undefined) {
    context.addIssue({ code: 'custom', path: ['other'], message: 'Choose where the other one of the pair is' })
  }
  if (data.act !== 'replaced' && data.act !== 'swapped') return
  for (const name of ['line', 'size'] as const) {
    if (data[name] === undefined) {
      context.addIssue({ code: 'custom', path: [name], message: `Enter the ${name} of the inner cannula` })
    }
  }
})

/** Acts on the inner cannula: ask a record with this. */
export const innerCannulaActs = charted({ slug: 'inner-cannula', schema: innerCannulaSchema })

export type InnerCannulaData = z.output<typeof innerCannulaSchema>
