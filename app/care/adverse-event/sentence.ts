import { sentence } from '../sentence.ts'
import { type AdverseEventData, events, measures, outcomes, toldPeople } from './schema.ts'

/** The sentence of an event: what happened, what was done, how it stands, who was told. */
export function adverseEventSentence(data: AdverseEventData): string {
  const { event, what, tubeNow, done, outcome, told, note } = data
  return [
    sentence(`Adverse event: ${event === 'other' && what !== undefined ? what : lower(events[event])}`),
    ...(tubeNow ? [`Tube ${tubeNow === 'in' ? 'in place' : 'out'} now.`] : []),
    `${done.map(measure => measures[measure]).join(', ')}.`,
    `${outcomes[outcome]}.`,
    `Told: ${told.map(person => lower(toldPeople[person])).join(', ')}.`,
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}

const lower = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1)
