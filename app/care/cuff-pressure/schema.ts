import type { z } from 'zod'
import { type PressureUnit, toCmH2O } from '../../clinical/units.ts'
import { careFields, choice, note, quantity, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'

const measured = { field: 'method', is: ['manometer', 'controller', 'occlusive volume', 'minimal leak'] }

/** Values seen in studies exceed 100 cmH2O; past this the unit is doubtful (domain R-406). */
const MOST_CMH2O = 120

const fields = careFields({
  found: quantity({
    label: 'Pressure found',
    unitField: 'unit',
    min: 0,
    max: 120,
    step: 0.1,
    large: true,
    when: measured,
    neededThen: true,
  }).optional(),
  unit: choice({ label: 'Unit on the gauge', options: { cmH2O: 'cmH2O', mmHg: 'mmHg', kPa: 'kPa' } }),
  leftAt: quantity({
    label: 'Left at, if adjusted',
    unitField: 'unit',
    min: 0,
    max: 120,
    step: 0.1,
    hint: 'Leave empty if the pressure was not changed',
    when: measured,
  }).optional(),
  method: choice({
    label: 'Method',
    options: {
      manometer: 'Manometer',
      controller: 'Continuous controller',
      'occlusive volume': 'Minimal occlusive volume',
      'minimal leak': 'Minimal leak',
      'not measured': 'Not measured',
    },
  }),
  whyNot: text({
    label: 'Reason it was not measured',
    when: { field: 'method', is: ['not measured'] },
    neededThen: true,
  }).optional(),
  cuffNow: choice({
    label: 'Cuff now',
    hint: 'When it was let down or inflated',
    options: { inflated: 'Inflated', deflated: 'Let down' },
  }).optional(),
  position: choice({
    label: 'Position',
    options: {
      'head up': 'Head up 30° or more',
      flat: 'Lying flat',
      side: 'On the side',
      prone: 'Prone',
      sitting: 'Sitting out',
    },
  }).optional(),
  reason: choice({
    label: 'Reason for the check',
    options: {
      scheduled: 'Scheduled',
      turned: 'Turned',
      transfer: 'After transfer',
      inflation: 'After inflation',
      leak: 'Leak heard',
      other: 'Other',
    },
    more: true,
  }).optional(),
  airMl: quantity({
    label: 'Air added (minus: removed)',
    unit: 'mL',
    min: -20,
    max: 20,
    step: 0.5,
    more: true,
  }).optional(),
  leak: choice({ label: 'Leak or voice with the cuff up', options: yesNo, more: true }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** One look at the cuff: what was found and what it was left at, in the unit of the gauge. */
export const cuffSchema = fields.superRefine((cuff, context) => {
  for (const name of ['found', 'leftAt'] as const) {
    const value = cuff[name]
    if (value !== undefined && toCmH2O(value, cuff.unit) > MOST_CMH2O) {
      context.addIssue({
        code: 'custom',
        path: [name],
        message: `Check the unit: ${value} ${cuff.unit} is more than ${MOST_CMH2O} cmH2O`,
      })
    }
  }
})

/** Cuff checks: ask a record with this. */
export const cuffChecks = charted({ slug: 'cuff-pressure', schema: cuffSchema })

export type CuffData = z.output<typeof cuffSchema>

/** The pressure found, in cmH2O, not rounded; undefined when it was not measured. */
export function foundCmH2O(data: CuffData): number | undefined {
  return data.found === undefined ? undefined : toCmH2O(data.found, data.unit satisfies PressureUnit)
}

/** The pressure the cuff was left at, in cmH2O, not rounded: the found one when it was not adjusted. */
export function leftCmH2O(data: CuffData): number | undefined {
  return data.leftAt === undefined ? foundCmH2O(data) : toCmH2O(data.leftAt, data.unit)
}
