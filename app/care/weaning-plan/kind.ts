import { showDay } from '../../time/display.ts'
import { cuffState } from '../cuff-pressure/cuff.ts'
import { type CareContext, careKind } from '../kind.ts'
import { sentence } from '../sentence.ts'
import type { Warning } from '../warning.ts'
import { isUp, planProblems } from './refusals.ts'
import { plannedSteps, type WeaningPlanData, weaningPlans } from './schema.ts'
import { weaningFio2AtMost } from './settings.ts'
import { plannedStep } from './tasks.ts'

/** The next step out of the tube, planned by the team. The place where what is contraindicated is refused. */
export const weaningPlan = careKind({
  ...weaningPlans,
  title: 'Weaning plan',
  chartWords: 'Chart weaning plan',
  lane: 'Tube',
  chapter: 'Weaning and removal',
  act: 'set care plans',
  cautions: [
    'It informs and does not decide: criteria come from what is charted.',
    'Cuff must be fully deflated before any valve or cap. Never use a valve with a foam cuff.',
  ],
  examples: [
    { step: 'valve', plannedOn: '2026-12-02', cuffThen: 'down', agreedWith: 'R. Oseitutu, speech-language therapist' },
    {
      step: 'removal',
      plannedOn: '2026-12-03',
      cuffThen: 'none',
      agreedWith: 'Tracheostomy team',
      seniorName: 'Dr N. Abarinde, ENT',
      seniorReason: 'Cap not borne for comfort only; scope shows an open airway',
    },
    { step: 'none', note: 'Chest infection: again next week' },
  ],
  summary: planSentence,
  settings: [weaningFio2AtMost],
  problems: planProblems,
  warnings: planWarnings,
  standing: context => {
    const plan = plannedStep(context.record)
    return plan ? againstCriteria(plan.data) : []
  },
})

function planSentence(data: WeaningPlanData): string {
  const { step, plannedOn, cuffThen, agreedWith, seniorName, seniorReason, note } = data
  const cuff = { down: ', cuff fully down', none: ', no cuff', up: ', cuff up' }
  return [
    step === 'none'
      ? 'Weaning plan taken back.'
      : `Planned: ${plannedSteps[step].toLowerCase()} on ${plannedOn ? showDay(plannedOn) : 'no day'}${cuffThen ? cuff[cuffThen] : ''}.`,
    ...(agreedWith ? [sentence(`Agreed with ${agreedWith}`)] : []),
    ...(seniorName
      ? [sentence(`Against a criterion, decided by ${seniorName}: ${seniorReason ?? 'no reason given'}`)]
      : []),
    ...(note ? [sentence(note)] : []),
  ].join(' ')
}

function planWarnings(data: WeaningPlanData, context: CareContext): readonly Warning[] {
  const isClosed = data.step === 'valve' || data.step === 'cap'
  const first = isClosed && isUp(cuffState(context.record)) ? [cuffDownFirst] : []
  return [...againstCriteria(data), ...first]
}

function againstCriteria({ seniorName, seniorReason }: WeaningPlanData): readonly Warning[] {
  if (seniorName === undefined) return []
  return [
    {
      name: 'planned-against-criterion',
      level: 'amber',
      action: 'Read the reason before this step is begun, and stay with the patient.',
      cause: `A criterion is not met; decided by ${sentence(`${seniorName}: ${seniorReason ?? 'no reason given'}`)}`,
      source: 'Product proposal: a decision against a criterion needs name and reason',
    },
  ]
}

const cuffDownFirst: Warning = {
  name: 'plan-cuff-down-first',
  level: 'blue',
  action: 'Let the cuff down fully, with suction first, before anything closes the tube.',
  cause: 'The cuff is charted as up.',
  source: 'National Tracheostomy Safety Project, speaking valve trials',
}
