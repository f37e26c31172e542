import { sentence } from '../sentence.ts'
import type { SuctionData } from './schema.ts'
import { secretionSentences } from './secretions.ts'

const routes: Readonly<Record<NonNullable<SuctionData['route']>, string>> = {
  'tube open': 'through the tube, open',
  'tube closed': 'through the tube, closed',
  oral: 'of the mouth',
  'above cuff': 'by the above-cuff port',
}

const reasons: Readonly<Record<NonNullable<SuctionData['indication']>[number], string>> = {
  secretions: 'secretions seen or heard',
  'coarse sounds': 'coarse sounds',
  'saw-tooth': 'saw-tooth trace',
  desaturation: 'SpO2 falling',
  distress: 'distress',
  asked: 'the patient asked',
  patency: 'patency check',
  'cuff down': 'before the cuff is let down',
}

const passed: Readonly<Record<NonNullable<SuctionData['passed']>, string>> = {
  easily: 'Catheter passed easily.',
  difficult: 'Catheter passed with difficulty.',
  no: 'Catheter would not pass.',
}

const borne: Readonly<Record<NonNullable<SuctionData['tolerance']>, string>> = {
  well: 'Tolerated well.',
  cough: 'Coughed.',
  desaturation: 'SpO2 fell.',
  distress: 'Distress.',
}

const inner: Readonly<Record<NonNullable<SuctionData['innerCannula']>, string>> = {
  plain: 'Plain inner cannula in.',
  fenestrated: 'Fenestrated inner cannula in.',
  none: 'No inner cannula in.',
}

/** The sentence of a look at the need, or of an episode: why, how, what came, how it was borne. */
export function suctionSentence(data: SuctionData): string {
  const ended = data.note ? [sentence(data.note)] : []
  if (data.act === 'need only') return ['Looked and listened: no suction needed.', ...ended].join(' ')
  const why = data.indication?.map(reason => reasons[reason]).join(', ')
  return [
    `Suction ${data.route ? routes[data.route] : ''}${why ? ` (${why})` : ''}${how(data)}.`,
    ...(data.passed ? [passed[data.passed]] : []),
    ...secretionSentences(data),
    ...(data.tolerance ? [borne[data.tolerance]] : []),
    ...saturations(data),
    ...aside(data),
    ...ended,
  ].join(' ')
}

function how(data: SuctionData): string {
  const parts = [
    data.catheter,
    data.vacuum === undefined ? undefined : `${data.vacuum} ${data.vacuumUnit}`,
    data.passes === undefined ? undefined : `${data.passes} ${data.passes === 1 ? 'pass' : 'passes'}`,
    data.longestPassS === undefined ? undefined : `longest ${data.longestPassS} s`,
    data.depthCm === undefined ? undefined : `depth ${data.depthCm} cm`,
  ].filter(part => part !== undefined)
  return parts.length > 0 ? `: ${parts.join(', ')}` : ''
}

function saturations({ spo2Low, spo2After }: SuctionData): readonly string[] {
  return [
    ...(spo2Low === undefined ? [] : [`Lowest SpO2 ${spo2Low}%.`]),
    ...(spo2After === undefined ? [] : [`SpO2 after recovery ${spo2After}%.`]),
  ]
}

function aside(data: SuctionData): readonly string[] {
  return [
    ...(data.innerCannula ? [inner[data.innerCannula]] : []),
    ...(data.preOxygenated === 'yes' ? ['Oxygen given before.'] : []),
    ...(data.saline === 'yes' ? ['Saline instilled.'] : []),
    ...(data.heartRate && data.heartRate !== 'no change' ? [`Heart rate ${data.heartRate}.`] : []),
  ]
}
