import { showDay } from '../../time/display.ts'
import { sentence } from '../sentence.ts'
import { secretionSentences } from '../suction/secretions.ts'
import { isLeftOut } from './acts.ts'
import { type InnerCannulaData, otherPlaces } from './schema.ts'

const done: Readonly<Record<InnerCannulaData['act'], string>> = {
  'other only': 'Inner cannula left in; the other one of the pair seen to',
  inspected: 'Inner cannula looked at and put back',
  cleaned: 'Inner cannula cleaned and put back',
  replaced: 'Inner cannula replaced with new',
  swapped: 'Inner cannula swapped for the clean spare',
  unable: 'Inner cannula care could not be done',
}

const why: Readonly<Record<NonNullable<InnerCannulaData['whyUnable']>, string>> = {
  stuck: 'it would not come out',
  'not back': 'it would not go back in',
  'none to fit': 'no matching one to fit',
  'not tolerated': 'stopped, not tolerated',
  other: 'other reason',
}

const found: Readonly<Record<NonNullable<InnerCannulaData['condition']>, string>> = {
  clear: 'Found clear.',
  light: 'Found with a light coating.',
  moderate: 'Found less than half blocked.',
  heavy: 'Found half blocked or more.',
  blocked: 'Found blocked.',
  none: 'None was in place.',
  'not seen': 'Condition not seen.',
}

const borne: Readonly<Record<NonNullable<InnerCannulaData['tolerance']>, string>> = {
  well: 'Tolerated well.',
  cough: 'Coughed.',
  desaturation: 'SpO2 fell',
  distress: 'Distress.',
}

/** The sentence of an act on the inner cannula: what was done, what was found, what is in place now. */
export function innerCannulaSentence(data: InnerCannulaData): string {
  return [
    `${done[data.act]}${data.whyUnable ? `: ${why[data.whyUnable]}` : ''}.`,
    ...(data.condition ? [found[data.condition]] : []),
    ...(data.foundReused === 'yes' ? ['Found cleaned and used again, though single use.'] : []),
    ...inPlace(data),
    ...borneWords(data),
    ...secretionSentences(data),
    ...(data.preOxygenated === 'yes' ? ['Oxygen given before.'] : []),
    ...(data.assistant ? [`With ${data.assistant}.`] : []),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}

function borneWords({ tolerance, spo2Low }: InnerCannulaData): readonly string[] {
  if (tolerance === undefined) return []
  return [tolerance === 'desaturation' ? `SpO2 fell to ${spo2Low}%.` : borne[tolerance]]
}

function inPlace(data: InnerCannulaData): readonly string[] {
  const printed = [
    data.line,
    data.size,
    data.lot && `lot ${data.lot}`,
    data.expiresOn && `expires ${showDay(data.expiresOn)}`,
  ]
  const cannula = printed.filter(Boolean).join(', ')
  return [
    ...(isLeftOut(data) ? ['None in place now.'] : cannula ? [`${cannula}.`] : []),
    ...(data.locked ? [data.locked === 'yes' ? 'Locked.' : 'Not locked.'] : []),
    data.spare === 'yes' ? 'Spare at the bedside.' : 'No spare at the bedside.',
    ...(data.other ? [`Other one of the pair: ${otherPlaces[data.other].toLowerCase()}.`] : []),
  ]
}
