import { inSentence } from '../field-meta.ts'
import { sentence } from '../sentence.ts'
import { type AdverseEventData, events, measures, outcomes, toldPeople } from './schema.ts'

/** The sentence of an event: what happened, what was done, how it stands, who was told. */
export function adverseEventSentence(data: AdverseEventData): string {
  const { event, what, tubeNow, done, outcome, told, note } = data
  return [
    sentence(`Adverse event: ${event === 'other' && what !== undefined ? what : inSentence(events[event])}`),
    ...(tubeNow ? [`Tube ${tubeNow === 'in' ? 'in place' : 'out'} now.`] : []),
    `${measuresWords(done)}.`,
    `${outcomes[outcome]}.`,
    `Told: ${told.map(person => inSentence(toldPeople[person])).join(', ')}.`,
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}

function measuresWords([first, ...others]: AdverseEventData['done']): string {
  return [...(first ? [measures[first]] : []), ...others.map(other => inSentence(measures[other]))].join(', ')
}
