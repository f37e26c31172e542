import type { z } from 'zod'
import { codes, itemOf } from '../carried-field.ts'
import { careFields, choice, date, note, quantity, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

const dual = { field: 'construction', is: ['dual'] }

/** A tube put in: the first insertion or a later change. Five numbers as on label and flange, never derived from one another. */
const fields = careFields({
  reason: choice({
    label: 'Reason',
    section: 'What was done',
    options: {
      'first insertion': 'First insertion',
      'on arrival': 'In place on arrival',
      'first change': 'First change',
      routine: 'Routine, by date',
      smaller: 'To a smaller tube',
      larger: 'To a larger tube',
      'cuff change': 'Other cuff',
      fault: 'Fault',
      blocked: 'Blocked',
      displaced: 'Displaced',
      other: 'Other',
    },
  }),
  insertedOn: date({
    label: 'Date of insertion',
    hint: 'The day on which this tube went in',
    when: { field: 'reason', is: ['on arrival'] },
    neededThen: true,
  }).optional(),
  line: text({
    label: 'Tube line',
    section: 'The tube, as printed on flange and label',
    hint: 'As printed on the flange',
  }),
  sizeSystem: choice({ label: 'Size system', options: { 'ISO 5366': 'ISO 5366 (mm)', Jackson: 'Jackson' } }),
  size: text({ label: 'Size on the label', maxLength: 12 }),
  construction: choice({ label: 'Construction', options: { single: 'Single cannula', dual: 'Dual cannula' } }),
  innerCannula: choice({
    label: 'Inner cannula',
    options: { disposable: 'Disposable', reusable: 'Reusable', none: 'None in place' },
    when: dual,
    neededThen: true,
  }).optional(),
  idWithInner: quantity({
    label: 'Inside diameter, inner cannula in',
    unit: 'mm',
    min: 2,
    max: 13,
    step: 0.1,
    when: dual,
    neededThen: true,
  }).optional(),
  idWithoutInner: quantity({ label: 'Inside diameter of the outer tube', unit: 'mm', min: 2, max: 14, step: 0.1 }),
  od: quantity({ label: 'Outside diameter', unit: 'mm', min: 3, max: 18, step: 0.1 }),
  lengthMm: quantity({ label: 'Length', unit: 'mm', min: 25, max: 200, step: 0.5 }),
  cuff: choice({ label: 'Cuff', options: { none: 'None', air: 'Air', water: 'Water', foam: 'Foam' } }),
  fenestrated: choice({ label: 'Fenestration', options: yesNo }),
  connector: choice({
    label: '15 mm connector',
    options: { outer: 'On the outer tube', inner: 'On the inner cannula', none: 'None' },
  }),
  flange: choice({ label: 'Flange', options: { fixed: 'Fixed', adjustable: 'Adjustable' } }),
  flangeMarkCm: quantity({
    label: 'Mark at the flange',
    unit: 'cm',
    min: 2,
    max: 20,
    step: 0.5,
    when: { field: 'flange', is: ['adjustable'] },
    neededThen: true,
  }).optional(),
  longestUseDays: quantity({
    label: 'Longest use on the label',
    unit: 'days',
    min: 1,
    max: 90,
    hint: 'Leave empty when the label gives none',
  }).optional(),
  lot: text({ label: 'Lot', maxLength: 20, more: true }).optional(),
  expiresOn: date({ label: 'Expiry date', more: true }).optional(),
  item: itemOf({ label: 'Scanned tube', of: 'tube', prints: { line: 'line', size: 'size' } }).optional(),
  scanned: codes({ label: 'Codes of the tube' }).optional(),
  technique: choice({
    label: 'Technique',
    section: 'Opening and fixing',
    options: { surgical: 'Surgical', percutaneous: 'Percutaneous', 'not known': 'Not known' },
    when: { field: 'reason', is: ['first insertion', 'on arrival'] },
    neededThen: true,
  }).optional(),
  stomaMadeOn: date({
    label: 'Date the opening was made',
    when: { field: 'reason', is: ['on arrival'] },
    neededThen: true,
  }).optional(),
  sutures: choice({ label: 'Flange sutures', options: { none: 'None', 'in place': 'In place' } }),
  operator: text({ label: 'Operator', section: 'Who and how it went' }),
  helper: text({ label: 'Helper' }).optional(),
  difficulty: choice({
    label: 'Difficulty',
    options: {
      easy: 'Easy',
      some: 'Some difficulty',
      difficult: 'Difficult',
      failed: 'Failed',
      'not known': 'Not known',
    },
  }),
  position: choice({
    label: 'Confirmation of position',
    options: {
      capnography: 'Capnography',
      airflow: 'Airflow',
      scope: 'Scope',
      'x-ray': 'X-ray',
      'not confirmed': 'Not confirmed',
    },
  }),
  bleeding: choice({
    label: 'Bleeding',
    more: true,
    options: { none: 'None', spotting: 'Spotting', fresh: 'Fresh blood', active: 'Active' },
  }).optional(),
  spo2Low: quantity({ label: 'Lowest SpO2', unit: '%', min: 40, max: 100, more: true }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

interface Walls {
  readonly idWithInner?: number | undefined
  readonly idWithoutInner: number
  readonly od: number
}

/** The walls nest: inner cannula inside outer tube inside outside diameter. Anything else is a slip of the keys. */
export function wallsNest(tube: Walls, context: Pick<z.core.$RefinementCtx<unknown>, 'addIssue'>): void {
  if (tube.idWithInner !== undefined && tube.idWithInner >= tube.idWithoutInner) {
    context.addIssue({
      code: 'custom',
      path: ['idWithInner'],
      message: 'Inside diameter with the inner cannula in must be smaller than that of the outer tube',
    })
  }
  if (tube.od <= tube.idWithoutInner) {
    context.addIssue({
      code: 'custom',
      path: ['od'],
      message: 'Outside diameter must be larger than the inside diameter',
    })
  }
}

export const tubeChangeSchema = fields.superRefine(wallsNest)

/** Tubes put in: ask a record with this. */
export const tubeChanges = charted({ slug: 'tube-change', schema: tubeChangeSchema })

export type TubeData = z.output<typeof tubeChangeSchema>
