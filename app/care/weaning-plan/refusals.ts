import { localDay } from '../../time/zone.ts'
import { type CuffState, cuffState } from '../cuff-pressure/cuff.ts'
import type { FormProblem } from '../form-problem.ts'
import type { CareContext } from '../kind.ts'
import { trialNames } from '../weaning-trial/schema.ts'
import { runningTrials } from '../weaning-trial/trials.ts'
import { unmetCriteria } from './criteria.ts'
import type { WeaningPlanData } from './schema.ts'

/**
 * Why a step may not be planned so. What can kill (cuff up, foam cuff, a laryngectomy) is refused whoever asks; a criterion that
 * is not met may be decided against by a senior, by name and with a reason.
 */
export function planProblems(data: WeaningPlanData, context: CareContext): readonly FormProblem[] {
  if (data.step === 'none') return []
  return [...never(data, context), ...wrongDay(data, context), ...notAtOnce(data, context), ...unmet(data, context)]
}

function never({ step, cuffThen }: WeaningPlanData, { record }: CareContext): readonly FormProblem[] {
  const state = cuffState(record)
  const at = (field: string, message: string): readonly FormProblem[] => [{ field, message }]
  if (state === 'no tube') return at('step', 'No tube is charted')
  if (step !== 'cuff' && record.patient.upperAirway === 'not open') {
    return at('step', 'Never after a laryngectomy: the mouth does not connect to the lungs')
  }
  if (state === 'foam') return at('step', 'Not with a foam cuff: it cannot be fully emptied. Plan another tube first')
  if (step === 'cuff' && state === 'no cuff') return at('step', 'This tube has no cuff to let down')
  if (cuffThen === 'up') return at('cuffThen', 'The cuff must be fully down before and during this')
  if (cuffThen === 'none' && state !== 'no cuff') return at('cuffThen', 'The record shows a tube with a cuff')
  return step === 'removal' && isUp(state)
    ? at('step', 'The cuff is up: removal follows after time with the cuff down')
    : []
}

/** Whether air cannot pass beside the tube. */
export function isUp(state: CuffState): boolean {
  return state === 'inflated' || state === 'water'
}

function wrongDay({ plannedOn }: WeaningPlanData, { now, ward }: CareContext): readonly FormProblem[] {
  if (plannedOn === undefined || plannedOn >= localDay(now, ward.zone)) return []
  return [{ field: 'plannedOn', message: 'The planned day must not be in the past' }]
}

/** Valve and cap sit in the same place; a trial that runs cannot be started again. */
function notAtOnce({ step, plannedOn }: WeaningPlanData, { record, now, ward }: CareContext): readonly FormProblem[] {
  if (plannedOn !== localDay(now, ward.zone)) return []
  const other = runningTrials(record).find(({ name }) => name === step || (name !== 'cuff' && step !== 'cuff'))
  if (!other) return []
  const message = `${trialNames[other.name]} trial runs: stop it first, or plan this for another day`
  return [{ field: 'step', message }]
}

function unmet(data: WeaningPlanData, context: CareContext): readonly FormProblem[] {
  const criteria = unmetCriteria(data.step, context)
  if (criteria.length === 0) return []
  const { seniorName, seniorReason } = data
  if (seniorName !== undefined && seniorReason !== undefined) return []
  return [
    seniorName === undefined
      ? { field: 'seniorName', message: `Not met: ${criteria.join('; ')}. To plan it all the same, name the senior` }
      : { field: 'seniorReason', message: 'Enter why the senior decides against the criterion' },
  ]
}
