import type { z } from 'zod'
import { careFields, choice, choices, note, quantity, yesNo } from '../field.ts'
import { charted } from '../kind.ts'
import { amountField, bloodField, colourField, consistencyField } from './secretions.ts'

const episode = { when: { field: 'act', is: ['episode'] } }
const throughTube = { when: { field: 'route', is: ['tube open', 'tube closed'] } }
const withSecretions = { when: { field: 'amount', is: ['scant', 'small', 'moderate', 'copious'] } }

/** A look at the need for suction, or an episode of it: why, how, what came, how it was borne. */
export const suctionSchema = careFields({
  act: choice({
    label: 'Care given',
    options: { 'need only': 'Looked and listened, none needed', episode: 'Suction' },
  }),
  indication: choices({
    label: 'Reason',
    options: {
      secretions: 'Secretions seen or heard',
      'coarse sounds': 'Coarse sounds',
      'saw-tooth': 'Saw-tooth trace',
      desaturation: 'SpO2 falling',
      distress: 'Distress',
      asked: 'Patient asked',
      patency: 'Patency check',
      'cuff down': 'Before the cuff is let down',
    },
    ...episode,
    neededThen: true,
  }).optional(),
  route: choice({
    label: 'Route',
    options: {
      'tube open': 'Through the tube, open',
      'tube closed': 'Through the tube, closed',
      oral: 'Mouth',
      'above cuff': 'Above-cuff port',
    },
    ...episode,
    neededThen: true,
  }).optional(),
  catheter: choice({
    label: 'Catheter',
    section: 'How',
    options: {
      '5 Fr': '5 Fr',
      '6 Fr': '6 Fr',
      '8 Fr': '8 Fr',
      '10 Fr': '10 Fr',
      '12 Fr': '12 Fr',
      '14 Fr': '14 Fr',
      '16 Fr': '16 Fr',
      '18 Fr': '18 Fr',
    },
    ...throughTube,
    neededThen: true,
  }).optional(),
  vacuum: quantity({
    label: 'Vacuum',
    unitField: 'vacuumUnit',
    min: 1,
    max: 760,
    step: 0.5,
    ...throughTube,
    neededThen: true,
  }).optional(),
  vacuumUnit: choice({
    label: 'Unit on the vacuum gauge',
    options: { mmHg: 'mmHg', kPa: 'kPa' },
    ...throughTube,
    neededThen: true,
  }).optional(),
  passes: quantity({ label: 'Passes', unit: 'times', min: 1, max: 20, ...throughTube, neededThen: true }).optional(),
  passed: choice({
    label: 'Catheter passage',
    options: { easily: 'Easy', difficult: 'With difficulty', no: 'Would not pass' },
    ...throughTube,
    neededThen: true,
  }).optional(),
  longestPassS: quantity({ label: 'Longest pass', unit: 's', min: 1, max: 120, ...throughTube }).optional(),
  innerCannula: choice({
    label: 'Inner cannula in during suction',
    hint: 'In a fenestrated tube a plain one goes in first',
    options: { plain: 'Plain', fenestrated: 'Fenestrated', none: 'None' },
    more: true,
    ...throughTube,
  }).optional(),
  depthCm: quantity({ label: 'Depth', unit: 'cm', min: 2, max: 40, step: 0.5, more: true, ...throughTube }).optional(),
  preOxygenated: choice({ label: 'Oxygen given before', options: yesNo, more: true, ...episode }).optional(),
  saline: choice({
    label: 'Saline instilled',
    hint: 'Not as a routine',
    options: yesNo,
    more: true,
    ...throughTube,
  }).optional(),
  amount: amountField({ section: 'What came', ...episode, neededThen: true }).optional(),
  colour: colourField({ ...withSecretions, neededThen: true }).optional(),
  consistency: consistencyField({ ...withSecretions, neededThen: true }).optional(),
  blood: bloodField({ ...episode, neededThen: true }).optional(),
  tolerance: choice({
    label: 'Tolerance',
    section: 'The patient',
    options: { well: 'Well', cough: 'Cough', desaturation: 'SpO2 fell', distress: 'Distress' },
    ...episode,
    neededThen: true,
  }).optional(),
  spo2Low: quantity({ label: 'Lowest SpO2', unit: '%', min: 40, max: 100, ...episode }).optional(),
  spo2After: quantity({
    label: 'SpO2 after recovery',
    hint: 'Once it has settled',
    unit: '%',
    min: 40,
    max: 100,
    ...episode,
  }).optional(),
  heartRate: choice({
    label: 'Heart rate',
    options: { 'no change': 'No change', slower: 'Slower', faster: 'Faster' },
    more: true,
    ...episode,
  }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Looks at the need and episodes of suction: ask a record with this. */
export const suctions = charted({ slug: 'suction', schema: suctionSchema })

export type SuctionData = z.output<typeof suctionSchema>

/** The size of the catheter in Fr; undefined when none went through the tube. */
export function catheterFr({ catheter }: SuctionData): number | undefined {
  return catheter === undefined ? undefined : Number.parseInt(catheter, 10)
}

/** Whether the catheter was for the tube, and not for the mouth or the port above the cuff. */
export function isThroughTube({ route }: SuctionData): boolean {
  return route === 'tube open' || route === 'tube closed'
}
