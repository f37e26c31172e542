import { showDuration } from '../../time/display.ts'
import { type CuffState, cuffState } from '../cuff-pressure/cuff.ts'
import { cuffStates } from '../cuff-state/schema.ts'
import type { CareContext } from '../kind.ts'
import { trialNames, weaningTrials } from '../weaning-trial/schema.ts'
import { lengthOf, trialsOf } from '../weaning-trial/trials.ts'
import { passedTrial, trialSetting, trialVerdict } from '../weaning-trial/verdict.ts'
import { readFrom, type StepCriterion, stateOf } from './criterion.ts'

const NTSP = 'National Tracheostomy Safety Project, speaking valve trials'
const airways = { open: 'Open', 'not open': 'Not open', 'not known': 'Not known' } as const

/** Air can pass to mouth and nose. */
export function airwayOpen({ record: { patient } }: CareContext): StepCriterion {
  const isKnown = patient.upperAirway !== 'not known'
  return {
    name: 'upper airway',
    label: 'Upper airway open',
    state: stateOf(isKnown ? patient.upperAirway === 'open' : undefined),
    isAsked: true,
    value: `${airways[patient.upperAirway]}, by the patient's details`,
    ...(isKnown ? {} : { unmet: 'whether the upper airway is open is not known' }),
    rule: 'With the tube closed, the patient breathes by the upper airway.',
    settings: [],
    source: `${NTSP}: the upper airway is patent`,
  }
}

const cuffs: Readonly<Record<CuffState, string>> = {
  'no tube': 'No tube charted',
  'no cuff': 'No cuff',
  foam: 'Foam cuff: it cannot be fully emptied',
  water: 'Up, with water',
  inflated: 'Up',
  deflated: 'Down',
}

/** The cuff is down, or there is none. Refused or warned of where the step is planned or begun, so it only informs here. */
export function cuffDown({ record }: CareContext): StepCriterion {
  const state = cuffState(record)
  return {
    name: 'cuff down',
    label: 'Cuff fully down, or none',
    state: stateOf(state === 'deflated' || state === 'no cuff'),
    isAsked: false,
    value: cuffs[state],
    chartedBy: cuffStates,
    rule: 'By whatever was charted of the cuff last. It must be fully down before the step and during it.',
    settings: [],
    source: `${NTSP}: never with an inflated or foam cuff`,
  }
}

/** Air was felt past the tube at the latest trial for which it was checked. */
export function airflow({ record }: CareContext): StepCriterion {
  const last = record.latest(weaningTrials, data => data.airflow !== undefined && data.airflow !== 'not checked')
  const isFelt = last && last.data.airflow === 'yes'
  return {
    name: 'airflow',
    label: 'Airflow past the tube felt',
    state: stateOf(isFelt),
    isAsked: false,
    ...readFrom(last, last && (isFelt ? 'Felt' : 'Not felt')),
    chartedBy: weaningTrials,
    rule: 'With a finger on the tube for one breath, cuff down, at the latest start of a trial.',
    settings: [],
    source: 'Common practice before a valve or cap',
  }
}

/** The trial of the step before was passed, and not failed again since. */
export function trialPassed(name: 'valve' | 'cap', context: CareContext): StepCriterion {
  const passed = passedTrial(name, context)
  const last = passed ?? trialsOf(context.record).find(trial => trial.name === name)
  const words = last && `${capital(trialVerdict(last, context))}, ${showDuration(lengthOf(last, context.now))}`
  const setting = trialSetting(name)
  return {
    name: `${name} passed`,
    label: `${trialNames[name]} trial passed`,
    state: stateOf(last && passed !== undefined),
    isAsked: true,
    ...readFrom(last?.start, words),
    chartedBy: weaningTrials,
    ...(passed ? {} : { unmet: `no ${trialNames[name].toLowerCase()} trial was passed` }),
    rule: 'The latest that was passed or failed. One that was stopped early tells nothing either way.',
    settings: [setting],
    source: setting.source.says,
  }
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)
