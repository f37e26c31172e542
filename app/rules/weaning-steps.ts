import { cuffState } from '../care/cuff-pressure/cuff.ts'
import type { CareContext } from '../care/kind.ts'
import { unmetCriteria } from '../care/weaning-plan/criteria.ts'
import { plannedSteps } from '../care/weaning-plan/schema.ts'
import type { TrialName } from '../care/weaning-trial/schema.ts'
import { runningTrials } from '../care/weaning-trial/trials.ts'
import { passedTrial } from '../care/weaning-trial/verdict.ts'
import { showDateTime } from '../time/display.ts'

/** How a step of the path stands. `open`: behind, and not passed. `not needed`: it does not arise with this tube. */
export type StepState = 'done' | 'here' | 'ahead' | 'open' | 'not needed'

export interface PathStep {
  readonly name: TrialName | 'ready' | 'removal'
  readonly title: string
  readonly state: StepState
  /** How it stands, in a few words. */
  readonly says: string
  /** The act that says so. */
  readonly entryId: string | null
}

const trials = ['cuff', 'valve', 'cap'] as const

/** A step before it is known where on the path somebody is. `isDone` is null where it does not arise. */
interface Reached {
  readonly name: PathStep['name']
  readonly title: string
  readonly isDone: boolean | null
  readonly isRunning?: boolean
  readonly says: string
  readonly entryId?: string
}

/**
 * The steps out of the tube of somebody who has one in, in their order. They are at the last that runs, else at the first that is not
 * done.
 */
export function stepsOf(context: CareContext): readonly PathStep[] {
  const reached = [...trials.map(name => trialStep(name, context)), readyStep(context), removalStep]
  const running = reached.findLastIndex(({ isRunning }) => isRunning)
  const here = running === -1 ? reached.findIndex(({ isDone }) => isDone === false) : running
  return reached.map(({ name, title, isDone, says, entryId = null }, index) => {
    const state = index === here ? 'here' : stateOf(isDone, index < here)
    return { name, title, state, says: state === 'ahead' || state === 'open' ? '' : says, entryId }
  })
}

function stateOf(isDone: boolean | null, isBehind: boolean): StepState {
  if (isDone === null) return 'not needed'
  return isDone ? 'done' : isBehind ? 'open' : 'ahead'
}

/** A trial step is done once it was passed, or one after it. */
function trialStep(name: TrialName, context: CareContext): Reached {
  const about = { name, title: plannedSteps[name] }
  const when = (at: Date) => showDateTime(at, context.ward.zone)
  if (name === 'cuff' && cuffState(context.record) === 'no cuff') {
    return { ...about, isDone: null, says: 'This tube has no cuff' }
  }
  const passed = passedTrial(name, context)
  const overtaken = trials.slice(trials.indexOf(name) + 1).find(other => passedTrial(other, context))
  const running = runningTrials(context.record).find(trial => trial.name === name)
  const isDone = passed !== undefined || overtaken !== undefined
  if (running) {
    const says = `Runs since ${when(running.startedAt)}`
    return { ...about, isDone, isRunning: true, says, entryId: running.start.id }
  }
  if (passed) {
    return { ...about, isDone, says: `Passed on ${when(passed.endedAt ?? passed.startedAt)}`, entryId: passed.start.id }
  }
  return {
    ...about,
    isDone,
    says: overtaken ? `Overtaken: ${plannedSteps[overtaken].toLowerCase()} was passed` : 'Not passed yet',
  }
}

function readyStep(context: CareContext): Reached {
  const state = cuffState(context.record)
  const isDown = state === 'deflated' || state === 'no cuff'
  const isDone = isDown && unmetCriteria('removal', context).length === 0
  return {
    name: 'ready',
    title: 'Ready for removal',
    isDone,
    says: isDone ? 'Every criterion met' : 'Not every criterion met',
  }
}

const removalStep: Reached = {
  name: 'removal',
  title: plannedSteps.removal,
  isDone: false,
  says: 'For the team to decide',
}
