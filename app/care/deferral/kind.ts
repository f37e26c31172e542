import type { FormProblem, KnownNames } from '../form-problem.ts'
import { type CareContext, careKind, wordsOf } from '../kind.ts'
import { sentence } from '../sentence.ts'
import { type DeferralData, deferralReasons, deferrals, delays } from './schema.ts'

/** Due care put off, with the reason, the new time and who agreed. The care stays due. */
export const deferral = careKind({
  ...deferrals,
  title: 'Deferral',
  chartWords: 'Defer care',
  lane: 'Tube',
  chapter: 'Events and plans',
  examples: [
    { task: 'inner-cannula-change', minutes: '60', reason: 'off ward', agreedWith: 'M. Larsen' },
    {
      task: 'dressing-change',
      minutes: '480',
      reason: 'other',
      why: 'ENT asks for the first dressing to stay',
      agreedWith: 'Dr A. Haddad',
    },
  ],
  summary: data =>
    `${wordsOf(data.task)} deferred by ${delays[data.minutes]}: ${reasonWords(data)} ${sentence(`Agreed with ${data.agreedWith}`)}`,
  marksAs: 'deferred',
  problems: taskProblems,
})

function reasonWords({ reason, why }: DeferralData): string {
  return sentence(reason === 'other' && why !== undefined ? why : deferralReasons[reason].toLowerCase())
}

/** Only care that is due for this patient, now or later, can be put off. */
function taskProblems(data: DeferralData, context: CareContext, known: KnownNames): readonly FormProblem[] {
  const rule = known.tasks.find(task => task.rule.name === data.task)?.rule
  if (!rule) return [{ field: 'task', message: 'Choose the care that is deferred from the list' }]
  const clock = rule.clock(context)
  if (clock.state === 'running') return []
  const why = clock.state === 'suspended' ? `is suspended: ${clock.because}` : 'is not due for this patient'
  return [{ field: 'task', message: `${wordsOf(rule.name)} ${why}` }]
}
