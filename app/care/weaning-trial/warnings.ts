import { showDuration } from '../../time/display.ts'
import { type CuffState, cuffState } from '../cuff-pressure/cuff.ts'
import { BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { observationSets } from '../observations/schema.ts'
import { standsSince } from '../standing.ts'
import type { Warning } from '../warning.ts'
import { closedTube } from './closed-tube.ts'
import { type TrialName, trialNames, type WeaningTrialData, weaningTrials } from './schema.ts'
import { lengthOf, onTheHub, runningTrials } from './trials.ts'
import { targetOf } from './verdict.ts'

const NTSP = 'National Tracheostomy Safety Project, speaking valve trials'

/** What a step of a trial asks people to notice. What is contraindicated is charted all the same, and red. */
export function weaningTrialWarnings(data: WeaningTrialData, context: CareContext): readonly Warning[] {
  if (data.step === 'end') return [...unsettled(data, context), ...stoppedEarly(data, context)]
  return [
    ...closed(data, context),
    ...atOnce(data, context),
    ...doubtfulCuff(data, context),
    ...notChecked(data),
    ...notPrepared(data),
  ]
}

function closed({ trial, cuffNow }: WeaningTrialData, { record }: CareContext): readonly Warning[] {
  if (trial === 'cuff') return []
  const isFoam = cuffNow === 'foam' || cuffState(record) === 'foam'
  const state: CuffState = isFoam ? 'foam' : cuffNow === 'up' ? 'inflated' : 'deflated'
  return closedTube(trial, { state, upperAirway: record.patient.upperAirway })
}

/** A valve and a cap sit in the same place. */
function atOnce({ trial }: WeaningTrialData, { record }: CareContext): readonly Warning[] {
  const other = runningTrials(record).find(({ name }) => trial !== 'cuff' && name !== 'cuff' && name !== trial)
  return other ? [twoAtOnce(trial, other.name)] : []
}

function twoAtOnce(one: TrialName, other: TrialName): Warning {
  return {
    name: 'trials-at-once',
    level: 'amber',
    action: 'See now which of them is on the tube, and chart the other as stopped.',
    cause: `${trialNames[other]} and ${trialNames[one].toLowerCase()} trial are charted as running at once; only one can be on the tube.`,
    source: 'Product proposal',
  }
}

function doubtfulCuff({ trial, cuffNow }: WeaningTrialData, { record }: CareContext): readonly Warning[] {
  const state = cuffState(record)
  const cause =
    trial === 'cuff' && cuffNow !== 'down'
      ? 'A cuff deflation trial with a cuff that is not down.'
      : cuffNow === 'none' && !['no cuff', 'no tube'].includes(state)
        ? 'The record shows a tube with a cuff.'
        : undefined
  if (cause === undefined) return []
  const action = 'Look at pilot balloon and flange again, and correct what is charted.'
  return [{ name: 'trial-cuff-doubtful', level: 'amber', action, cause, source: NTSP }]
}

function notChecked({ trial, airflow }: WeaningTrialData): readonly Warning[] {
  if (trial === 'cuff' || airflow === undefined || airflow === 'yes') return []
  return [
    {
      name: 'trial-no-airflow',
      level: 'amber',
      action: `Take the ${trial} off and check with a finger that air passes the tube before it goes on again.`,
      cause: airflow === 'no' ? 'No airflow past the tube was felt.' : 'Airflow past the tube was not checked.',
      source: NTSP,
    },
  ]
}

function notPrepared({ suctionFirst, supervised }: WeaningTrialData): readonly Warning[] {
  const missing = [
    ...(suctionFirst === 'no' ? ['mouth and space above the cuff were not suctioned first'] : []),
    ...(supervised === 'no' ? ['nobody skilled stays with the patient'] : []),
  ].join(', and ')
  if (missing === '') return []
  return [
    {
      name: 'trial-not-prepared',
      level: 'amber',
      action: 'Put this right now, or stop the trial.',
      cause: `${missing.charAt(0).toUpperCase()}${missing.slice(1)}.`,
      source: `${NTSP}; Pryor 2016`,
    },
  ]
}

function unsettled({ afterwards, trial }: WeaningTrialData, { record }: CareContext): readonly Warning[] {
  if (afterwards !== 'not settled') return []
  return [
    {
      name: 'trial-not-settled',
      level: 'red',
      action: breathingAction(record.patient),
      cause: `Breathing has not settled after the ${trialNames[trial].toLowerCase()} trial.`,
      source: BREATHING_SOURCE,
    },
  ]
}

function stoppedEarly({ trial, reasons = [] }: WeaningTrialData, context: CareContext): readonly Warning[] {
  const running = runningTrials(context.record).find(({ name }) => name === trial)
  if (!running || reasons.every(reason => reason === 'planned')) return []
  const target = targetOf(trial, context.values)
  return [
    {
      name: 'trial-stopped-early',
      level: 'blue',
      action: 'Tell the tracheostomy team, and plan when to try again.',
      cause: `Stopped after ${showDuration(lengthOf(running, context.now))} of ${showDuration(target)}.`,
      source: 'Product proposal',
    },
  ]
}

/** What stands while trials run: a valve or cap that must not be on, two at once, a cuff that went up; and breathing after one. */
export function standingTrialWarnings(context: CareContext): readonly Warning[] {
  const { record } = context
  const on = onTheHub(record)
  const names = runningTrials(record).map(({ name }) => name)
  const state = cuffState(record)
  const isUp = names.includes('cuff') && state === 'inflated'
  return [
    ...(on ? closedTube(on, { state, upperAirway: record.patient.upperAirway }) : []),
    ...(names.includes('cap') && names.includes('valve') ? [twoAtOnce('valve', 'cap')] : []),
    ...(isUp ? [cuffUpAgain] : []),
    ...stillUnsettled(context),
  ]
}

const cuffUpAgain: Warning = {
  name: 'trial-cuff-up',
  level: 'amber',
  action: 'Chart the cuff deflation trial as stopped, or look at the cuff again.',
  cause: 'The cuff is charted as up while a cuff deflation trial runs.',
  source: 'Product proposal',
}

/** Until somebody charted that the patient breathes easily, or another step of a trial. */
function stillUnsettled(context: CareContext): readonly Warning[] {
  const { record } = context
  const last = record.latest(weaningTrials)
  const easy = record.latest(observationSets, ({ effort }) => effort === 'easy')
  if (last && easy && easy.performedAt > last.performedAt) return []
  return standsSince(record.of(weaningTrials), { isSettledBy: () => true, warns: unsettledAtEnd }, context)
}

function unsettledAtEnd(data: WeaningTrialData, context: CareContext): readonly Warning[] {
  return data.step === 'end' ? unsettled(data, context) : []
}
