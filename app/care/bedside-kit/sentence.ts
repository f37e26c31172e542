import { sentence } from '../sentence.ts'
import { itemWords, type KitItem } from './items.ts'
import type { KitData } from './schema.ts'

/** The sentence of a check of the kit: what is missing and who gets it, or that nothing is; then suction and spares. */
export function kitSentence(data: KitData): string {
  return [
    `Bedside kit ${data.complete === 'yes' ? 'complete' : `not complete: no ${kitWords(data.missing ?? [])}`}.`,
    ...(data.owner
      ? [sentence(`${data.owner} gets it${data.expectedMin ? `, within ${data.expectedMin} min` : ''}`)]
      : []),
    ...(data.suctionTested === undefined ? [] : [`Suction tested at ${data.suctionTested} ${data.suctionUnit}.`]),
    ...(data.spares ? [sentence(`Held against: ${data.spares}`)] : []),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}

/** `spare tube one size smaller, no obturator`: what is missing, after "no". */
function kitWords(missing: readonly KitItem[]): string {
  return missing.map(item => itemWords[item].replace(/^(an?|the) /, '')).join(', no ')
}
