import { coughChecks } from '../cough-strength/schema.ts'
import { coughFlowMouth, coughFlowTube, coughFlowValve } from '../cough-strength/settings.ts'
import { coughOf, type MeasuredRoute } from '../cough-strength/verdict.ts'
import { type Criterion, readinessOf } from '../decannulation-readiness/readiness.ts'
import { readinessChecks } from '../decannulation-readiness/schema.ts'
import type { CareContext } from '../kind.ts'
import { readFrom, type StepCriterion, stateOf } from './criterion.ts'

const routes: Readonly<Record<MeasuredRoute, { readonly words: string; readonly setting: typeof coughFlowMouth }>> = {
  mouth: { words: 'at the mouth', setting: coughFlowMouth },
  valve: { words: 'through tube and valve', setting: coughFlowValve },
  tube: { words: 'at the tube', setting: coughFlowTube },
}

/** The cough is strong enough, by the latest peak flow and the limit of its route. */
export function strongCough(context: CareContext): StepCriterion {
  const found = coughOf(context)
  const settings = found ? [routes[found.route].setting] : Object.values(routes).map(({ setting }) => setting)
  const words = found && `${found.peakFlow} L/min ${routes[found.route].words}, more than ${found.limit} needed`
  return {
    name: 'cough flow',
    label: 'Cough strong enough by peak flow',
    state: stateOf(found && found.verdict === 'met'),
    isAsked: true,
    ...readFrom(found?.entry, words),
    chartedBy: coughChecks,
    ...(found?.verdict === 'not met' ? { unmet: 'the cough is too weak by peak flow' } : {}),
    rule: 'By the latest peak flow. Where it was measured decides how much is enough.',
    settings,
    source: settings.map(({ source }) => source.says).join('; '),
  }
}

const CHECKLIST = "Royal Marsden Manual, procedure 12.13, and St George's NHS: readiness for removal"
const CERIANA = 'Ceriana: what it adds to the core set'

/** The checklist of readiness, each by its latest answer. What it adds up to is said by `notReady`. */
export function readinessCriteria({ record }: CareContext): readonly StepCriterion[] {
  return readinessOf(record).map(({ name, label, isCore, answer, reason, entry }) => ({
    name: `ready ${name}`,
    label,
    state: answer === 'not assessed' ? answer : stateOf(answer === 'yes'),
    isAsked: isCore,
    ...readFrom(entry, answerWords(answer, reason)),
    chartedBy: readinessChecks,
    rule: 'By the latest checklist that has an answer to it.',
    settings: [],
    source: isCore ? CHECKLIST : CERIANA,
  }))
}

function answerWords(answer: Criterion['answer'], reason: string | undefined): string | undefined {
  return answer === 'not assessed' ? reason : answer === 'yes' ? 'Yes' : 'No'
}

/** What the core set shows as not ready, in a few words for all of it. */
export function notReady({ record }: CareContext): readonly string[] {
  const criteria = readinessOf(record).filter(({ isCore }) => isCore)
  if (criteria.every(({ entry }) => entry === undefined)) return ['readiness for removal was not charted']
  const words = (answer: 'no' | 'not assessed') =>
    criteria.filter(one => one.answer === answer).map(({ label }) => label.toLowerCase())
  const [no, open] = [words('no'), words('not assessed')]
  return [
    ...(no.length > 0 ? [`answered no: ${no.join(', ')}`] : []),
    ...(open.length > 0 ? [`not assessed: ${open.join(', ')}`] : []),
  ]
}
