import { sentence } from '../sentence.ts'
import { awareness, type ObservationData, onTubes, oxygenDevices, redFlags } from './schema.ts'

const breathing: Readonly<Record<ObservationData['effort'], string>> = {
  easy: 'Breathing easy',
  increased: 'Breathing harder than usual',
  distress: 'Breathing in distress',
  none: 'Not breathing',
}

/** The sentence of a set of observations: breathing and oxygen first, then heart and consciousness. */
export function observationSentence(data: ObservationData): string {
  const { respiratoryRate, spo2, effort, heartRate, systolic, temperature, note } = data
  return [
    `Respiratory rate ${respiratoryRate} a min, SpO2 ${spo2}% ${oxygenWords(data)}.`,
    `${breathing[effort]}.`,
    `Heart rate ${heartRate} a min${systolic === undefined ? '' : `, systolic ${systolic} mmHg`}.`,
    ...(temperature === undefined ? [] : [`Temperature ${temperature} °C.`]),
    `${awareness[data.awareness]}.`,
    ...(data.onTube ? [`On the tube: ${onTubes[data.onTube].toLowerCase()}.`] : []),
    ...flagWords(data),
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}

function flagWords({ redFlags: seen }: ObservationData): readonly string[] {
  if (!seen) return []
  const words = seen.map(flag => redFlags[flag].toLowerCase()).join('; ')
  return [seen.includes('none') ? 'No red flags.' : `Red flags: ${words}.`]
}

function oxygenWords({ oxygen, fio2, flow }: ObservationData): string {
  if (oxygen === 'air') return 'on air'
  const given = [...(fio2 === undefined ? [] : [`FiO2 ${fio2}%`]), ...(flow === undefined ? [] : [`${flow} L/min`])]
  return `on oxygen (${[oxygenDevices[oxygen].toLowerCase(), ...given].join(', ')})`
}
