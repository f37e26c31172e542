import type { z } from 'zod'
import { vacuumMmHg } from '../../clinical/vacuum.ts'
import { careFields, choice, choices, note, quantity, text } from '../field.ts'
import { charted } from '../kind.ts'
import { kitItems } from './items.ts'

const lacks = { when: { field: 'complete', is: ['no'] } }

const list = Object.values(kitItems)
  .map(item => item.charAt(0).toLowerCase() + item.slice(1))
  .join('; ')

/** No pump draws more than the air weighs: past this the unit is doubtful. */
const MOST_MMHG = 760

const fields = careFields({
  spares: text({
    label: 'Spares for this tube',
    hint: 'From the record: hold them against flange and packs',
    maxLength: 240,
  }).optional(),
  complete: choice({
    label: 'State of the kit',
    hint: `What does not apply counts as there: ${list}`,
    options: { yes: 'All there, in date, right size', no: 'Something is missing' },
  }),
  missing: choices({ label: 'Missing', options: kitItems, ...lacks, neededThen: true }).optional(),
  owner: text({ label: 'Person getting it', ...lacks, neededThen: true }).optional(),
  expectedMin: quantity({ label: 'Expected within', unit: 'min', min: 1, max: 240, ...lacks }).optional(),
  suctionTested: quantity({
    label: 'Suction tested at',
    hint: 'Tubing pinched off',
    unitField: 'suctionUnit',
    min: 0,
    max: 760,
    step: 0.5,
  }).optional(),
  suctionUnit: choice({ label: 'Unit on the vacuum gauge', options: { mmHg: 'mmHg', kPa: 'kPa' } }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

export type KitData = z.output<typeof fields>

/** One check of the emergency kit. Suction is tested with its gauge, unless suction is what is missing. */
export const kitSchema = fields.superRefine((kit, context) => {
  for (const [field, message] of contradictions(kit)) {
    context.addIssue({ code: 'custom', path: [field], message })
  }
})

function contradictions(kit: KitData): readonly (readonly [keyof KitData, string])[] {
  const { suctionTested: tested, suctionUnit: unit, missing = [] } = kit
  if (tested === undefined) {
    return missing.includes('suction') ? [] : [['suctionTested', 'Enter what suction was tested at']]
  }
  if (unit === undefined) return [['suctionUnit', 'Choose the unit on the vacuum gauge']]
  return vacuumMmHg(tested, unit) > MOST_MMHG
    ? [['suctionTested', `Check the unit: ${tested} ${unit} is more than ${MOST_MMHG} mmHg`]]
    : []
}

/** Checks of the bedside kit: ask a record with this. */
export const kitChecks = charted({ slug: 'bedside-kit', schema: kitSchema })

/** Whether everything lay there: only then is the check done. */
export function isComplete({ complete }: KitData): boolean {
  return complete === 'yes'
}
