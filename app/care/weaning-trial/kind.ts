import { later } from '../../time/duration.ts'
import { cuffState } from '../cuff-pressure/cuff.ts'
import { type CareContext, careKind } from '../kind.ts'
import { observationTaskName } from '../observations/task-name.ts'
import type { RunningAct } from '../running-act.ts'
import { plannedTrial } from '../weaning-plan/tasks.ts'
import { weaningTrialExamples } from './examples.ts'
import { weaningTrials } from './schema.ts'
import { weaningTrialSentence } from './sentence.ts'
import { weaningTrialSettings } from './settings.ts'
import { trialTrends } from './trends.ts'
import { onTheHub, runningTrials } from './trials.ts'
import { targetOf } from './verdict.ts'
import { standingTrialWarnings, weaningTrialWarnings } from './warnings.ts'

/** Trials on the way out of the tube: cuff down, one-way valve, cap. A start without an end is a trial that runs. */
export const weaningTrial = careKind({
  ...weaningTrials,
  title: 'Weaning trial',
  chartWords: 'Chart trial',
  lane: 'Tube',
  chapter: 'Weaning and removal',
  needsCompetence: 'valve and cap',
  cautions: [
    'Cuff must be fully deflated before any valve or cap. Never use a valve with a foam cuff.',
    'With distress, stridor or falling SpO2 a valve or cap comes off at once.',
  ],
  examples: weaningTrialExamples,
  summary: weaningTrialSentence,
  settings: weaningTrialSettings,
  tasks: [plannedTrial],
  running: runningActs,
  trends: trialTrends,
  warnings: weaningTrialWarnings,
  standing: standingTrialWarnings,
  outOfRange: (data, context) => weaningTrialWarnings(data, context).some(({ level }) => level !== 'blue'),
})

const runningTitles = { cuff: 'Cuff trial', valve: 'Valve trial', cap: 'Cap trial' } as const

function runningActs({ record, values }: CareContext): readonly RunningAct[] {
  return runningTrials(record).map(({ name, startedAt }) => ({
    name,
    title: runningTitles[name],
    since: startedAt,
    until: later(startedAt, targetOf(name, values)),
    watchedBy: observationTaskName,
    stopWords: 'Stop the trial',
    stopsWith: { step: 'end', trial: name },
    says: cuffWords(record),
  }))
}

function cuffWords(record: CareContext['record']): string {
  const state = cuffState(record)
  const on = onTheHub(record)
  const cuff = { deflated: 'Cuff down', 'no cuff': 'No cuff', inflated: 'Cuff up', water: 'Cuff up', foam: 'Foam cuff' }
  return `${state === 'no tube' ? 'No tube charted' : cuff[state]}${on ? `, ${on} on` : ''}.`
}
