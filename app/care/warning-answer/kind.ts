import { careKind, wordsOf } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { type WarningAnswerData, warningAnswers } from './schema.ts'
import { warningAnswerSettings } from './settings.ts'

/** Somebody has seen a warning, has acted on it, or says why it needs nothing more. */
export const warningAnswer = careKind({
  ...warningAnswers,
  title: 'Answer to a warning',
  chartWords: 'Chart answer',
  lane: 'Tube',
  chapter: 'Events and plans',
  settings: warningAnswerSettings,
  examples: [
    { warning: 'cuff-high', answer: 'seen' },
    { warning: 'cuff-high', answer: 'acted on', done: 'Air let out to 26 cmH2O, Dr A. Haddad told' },
    { warning: 'tube-past-limit', answer: 'settled', why: 'ENT keeps this tube until the scan on Thursday' },
  ],
  summary: says,
})

function says({ warning, answer, done, why }: WarningAnswerData): string {
  const about = `${wordsOf(warning)}: ${answer}`
  return sentence((done ?? why) ? `${about}. ${done ?? why}` : about)
}
