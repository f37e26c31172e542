import type { z } from 'zod'
import { type PressureInjuryStage, pressureInjuryTexts } from '../../clinical/pressure-injury.ts'
import { careFields, choice, choices, note, quantity, text, yesNo } from '../field.ts'
import { charted } from '../kind.ts'
import { photographs } from '../photographs.ts'

export const openingFindings = {
  clean: 'Clean and healthy',
  redness: 'Redness',
  swelling: 'Swelling at the opening',
  warmth: 'Warmth',
  pus: 'Pus',
  odour: 'Bad odour',
  crusting: 'Crusting',
  granulation: 'Granulation',
  maceration: 'Macerated skin edge',
  breakdown: 'Wound breakdown',
  'air leak': 'Enlarged, or air leaks around the tube',
  'neck swelling': 'New swelling of the neck',
  'surgical emphysema': 'Surgical emphysema (air under the skin)',
  closed: 'Closed, after the tube came out for good',
} as const

export const exudateAmounts = { none: 'None', scant: 'Scant', moderate: 'Moderate', copious: 'Copious' } as const
export const exudateTypes = { clear: 'Clear', cloudy: 'Cloudy', coloured: 'Yellow or green', bloody: 'Bloody' } as const
export const bleedings = {
  none: 'None',
  spotting: 'Spotting',
  'fresh ooze': 'Fresh ooze',
  active: 'Active bleeding',
} as const
export const dressingTypes = {
  foam: 'Foam',
  hydrocolloid: 'Hydrocolloid',
  absorbent: 'Absorbent pad',
  antimicrobial: 'Antimicrobial',
  other: 'Other',
} as const

export const skinSites = {
  'flange left': 'Under flange, left',
  'flange right': 'Under flange, right',
  'flange top': 'Under flange, top',
  'flange bottom': 'Under flange, bottom',
  'under sutures': 'Under sutures',
  'back of neck': 'Back of neck, under ties',
  'around opening': 'Around the opening',
} as const
export type SkinSite = keyof typeof skinSites

export const skinFindings = {
  intact: 'Intact',
  'blanching redness': 'Redness that blanches',
  'pressure injury': 'Pressure injury',
  'moisture damage': 'Moisture damage',
  'skin tear': 'Skin tear',
  fungal: 'Fungal rash',
} as const

/** Stages of the 2016 classification, by their titles. */
export const stageTitles = {
  'stage-1': pressureInjuryTexts['stage-1'].title,
  'stage-2': pressureInjuryTexts['stage-2'].title,
  'stage-3': pressureInjuryTexts['stage-3'].title,
  'stage-4': pressureInjuryTexts['stage-4'].title,
  unstageable: pressureInjuryTexts.unstageable.title,
  'deep-tissue': pressureInjuryTexts['deep-tissue'].title,
} as const satisfies Readonly<Record<PressureInjuryStage, string>>

export const fingersThatFit = {
  none: '0, too tight',
  one: '1',
  two: '2',
  'more than two': 'More than 2',
  'no ties': 'No ties',
} as const

const found = {
  field: 'skin',
  is: ['blanching redness', 'pressure injury', 'moisture damage', 'skin tear', 'fungal'],
}

const fields = careFields({
  appearance: choices({ label: 'Appearance', section: 'Opening', options: openingFindings }).refine(
    seen => seen.length === 1 || !seen.includes('clean'),
    'Clean and healthy does not go with another finding',
  ),
  exudate: choice({ label: 'Amount of exudate', options: exudateAmounts }),
  exudateType: choice({
    label: 'Kind of exudate',
    options: exudateTypes,
    when: { field: 'exudate', is: ['scant', 'moderate', 'copious'] },
    neededThen: true,
  }).optional(),
  bleeding: choice({ label: 'Bleeding', options: bleedings }),
  pain: quantity({
    label: 'Pain',
    unit: 'points',
    min: 0,
    max: 10,
    hint: '0 none, 10 worst. Leave empty when the patient cannot say',
  }).optional(),
  fever: choice({ label: 'Fever', options: yesNo, more: true }).optional(),
  swab: choice({ label: 'Swab sent', options: yesNo, more: true }).optional(),
  sites: choices({ label: 'Skin looked at', section: 'Skin', hint: 'Each place that you saw', options: skinSites }),
  skin: choice({ label: 'Worst skin finding', options: skinFindings }),
  stage: choice({
    label: 'Stage of the pressure injury',
    hint: '1: whole skin, redness stays. 2: part of the skin lost. 3: fat shows. 4: deeper tissue shows. Unstageable: depth hidden. Deep tissue: dark red or purple. Moisture damage has no stage.',
    options: stageTitles,
    when: { field: 'skin', is: ['pressure injury'] },
    neededThen: true,
  }).optional(),
  findingSite: choice({ label: 'Place of the finding', options: skinSites, when: found, neededThen: true }).optional(),
  sizeMm: quantity({ label: 'Longest side', unit: 'mm', min: 1, max: 200, when: found }).optional(),
  dressing: choice({
    label: 'Dressing',
    section: 'Dressing, sutures and ties',
    options: { 'left in place': 'Left in place', changed: 'Cleaned around and changed', none: 'None used' },
  }),
  dressingType: choice({
    label: 'New dressing',
    options: dressingTypes,
    when: { field: 'dressing', is: ['changed'] },
    more: true,
  }).optional(),
  sutures: choice({
    label: 'Flange sutures',
    options: {
      none: 'None',
      'in place': 'In place and intact',
      loose: 'Loose',
      'removed now': 'Removed now',
    },
  }),
  ties: choice({ label: 'Fingers under the ties', hint: 'As you leave them', options: fingersThatFit }),
  holderChanged: choice({ label: 'Ties or holder changed', options: yesNo }),
  secondPerson: text({
    label: 'Second person',
    hint: 'Holds the tube while dressing or ties are changed; write "alone" if nobody did',
  }).optional(),
  photographs: photographs({ label: 'Photographs of the opening and the skin', section: 'Photographs' }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

export type StomaData = z.output<typeof fields>

/** One look at the opening, the skin around it and what holds the tube. Answers that contradict each other are sent back. */
export const stomaSchema = fields.superRefine((check, context) => {
  for (const [field, message] of contradictions(check)) {
    context.addIssue({ code: 'custom', path: [field], message })
  }
})

function contradictions(check: StomaData): readonly (readonly [keyof StomaData, string])[] {
  const { appearance, bleeding, findingSite, sites, dressing, holderChanged, secondPerson } = check
  const bleeds = bleeding === 'fresh ooze' || bleeding === 'active'
  const twoNeeded = dressing === 'changed' || holderChanged === 'yes'
  return [
    ...(bleeds && appearance.includes('clean')
      ? ([['appearance', 'Clean and healthy does not go with bleeding']] as const)
      : []),
    ...(findingSite && !sites.includes(findingSite)
      ? ([['findingSite', 'Place of the finding is not among the skin looked at']] as const)
      : []),
    ...(twoNeeded && !secondPerson ? ([['secondPerson', 'Enter the second person, or "alone"']] as const) : []),
  ]
}

/** Stoma and skin checks: ask a record with this. */
export const stomaChecks = charted({ slug: 'stoma-and-skin', schema: stomaSchema })

/** Whether flange sutures were seen to be in. */
export function hasSutures({ sutures }: StomaData): boolean {
  return sutures === 'in place' || sutures === 'loose'
}

/** Whether the flange sutures came out with this act. */
export function suturesRemoved(data: StomaData): boolean {
  return data.sutures === 'removed now'
}

const underFlange = ['flange left', 'flange right', 'flange top', 'flange bottom'] as const

/** Places under tube, sutures and ties that this check left out. Without sutures or ties there is nothing to look under. */
export function sitesLeftOut(check: StomaData): readonly SkinSite[] {
  const { sites, ties } = check
  const asked: readonly SkinSite[] = [
    ...underFlange,
    ...(hasSutures(check) ? (['under sutures'] as const) : []),
    ...(ties === 'no ties' ? [] : (['back of neck'] as const)),
  ]
  return asked.filter(site => !sites.includes(site))
}
