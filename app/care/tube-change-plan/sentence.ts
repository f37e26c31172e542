import { showDay } from '../../time/display.ts'
import { sentence } from '../sentence.ts'
import { openPoints } from './readiness.ts'
import { consents, contraindications, indications, type TubePlanData } from './schema.ts'

/** The sentence of a plan: when, why, by whom, what speaks against it, what is not ready. */
export function tubePlanSentence(data: TubePlanData): string {
  if (data.step === 'call off') return joined('Planned tube change called off', data.calledOffBecause, data.note)
  return [
    `Tube change planned for ${data.plannedOn ? showDay(data.plannedOn) : 'a day not said'}: ${indicationWords(data)}.`,
    ...(data.newTube ? [sentence(`Tube to go in: ${data.newTube}`)] : []),
    sentence(`Operator ${data.operator}, helper ${data.helper}`),
    ...against(data),
    ...(data.consent ? [`Consent: ${consents[data.consent].toLowerCase()}.`] : []),
    ...readyWords(data),
    ...(data.ifItFails ? [sentence(`If it fails: ${data.ifItFails}`)] : []),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}

function joined(words: string, because: string | undefined, note: string | undefined): string {
  return [sentence(`${words}${because ? `: ${because}` : ''}`), ...(note ? [sentence(note)] : [])].join(' ')
}

/** `first change`, or the indication that was written in. */
export function indicationWords({ indication, otherIndication }: TubePlanData): string {
  if (indication === undefined) return 'indication not said'
  return (indication === 'other' && otherIndication) || lower(indications[indication])
}

function against({ contraindications: found = [], senior, seniorReason }: TubePlanData): readonly string[] {
  const words = found.filter(one => one !== 'none').map(one => lower(contraindications[one]))
  return [
    words.length === 0 ? 'No contraindication.' : `Contraindications: ${words.join('; ')}.`,
    ...(senior && seniorReason ? [sentence(`${senior} decided to go ahead: ${seniorReason}`)] : []),
  ]
}

function readyWords(data: TubePlanData): readonly string[] {
  const open = openPoints(data)
  return [open.length === 0 ? 'All is ready.' : `Not ready yet: ${open.join(', ')}.`]
}

function lower(words: string): string {
  return words.charAt(0).toLowerCase() + words.slice(1)
}
