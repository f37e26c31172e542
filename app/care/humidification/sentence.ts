import { sentence } from '../sentence.ts'
import type { HumidificationData } from './schema.ts'

const on: Readonly<Record<HumidificationData['method'], string>> = {
  hme: 'Heat and moisture exchanger on',
  'cold aerosol': 'Cold aerosol on',
  heated: 'Heated humidifier on',
  nebuliser: 'Nebuliser given',
  bib: 'Bib over the opening',
  none: 'No humidification',
}

const water: Readonly<Record<NonNullable<HumidificationData['waterLevel']>, string>> = {
  ok: 'water between the marks',
  filled: 'water filled up',
  low: 'water low',
}

/** The sentence of a look at humidification: what is on and how it stands, then the secretions. */
export function humidificationSentence(data: HumidificationData): string {
  const state = [
    ...(data.hmeChanged ? [data.hmeChanged === 'yes' ? 'changed' : 'not changed'] : []),
    ...(data.waterLevel ? [water[data.waterLevel]] : []),
    ...(data.temperature === undefined ? [] : [`${data.temperature} °C`]),
  ]
  return [
    `${[on[data.method], ...state].join(', ')}.`,
    ...(data.consistency ? [`Secretions ${data.consistency}.`] : []),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}
