import { cuffState } from '../cuff-pressure/cuff.ts'
import { leakWarnings } from '../cuff-pressure/leak.ts'
import { BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import type { Warning } from '../warning.ts'
import { closedTube } from '../weaning-trial/closed-tube.ts'
import { onTheHub } from '../weaning-trial/trials.ts'
import { type CuffStateData, cuffStates, isUp } from './schema.ts'

/** What a cuff let down or inflated asks people to notice, most urgent first. */
export function cuffStateWarnings(data: CuffStateData, context: CareContext): readonly Warning[] {
  return [
    ...onValve(data, context),
    ...distress(data, context),
    ...leak(data, context),
    ...noSuchCuff(data, context),
    ...ventilated(data, context),
    ...notSuctioned(data),
    ...aspiration(data),
  ]
}

/** Inflated under a valve or cap that is on. */
function onValve(data: CuffStateData, { record }: CareContext): readonly Warning[] {
  const on = onTheHub(record)
  if (!on || !isUp(data)) return []
  return closedTube(on, { state: 'inflated', upperAirway: record.patient.upperAirway })
}

function distress({ tolerance }: CuffStateData, { record }: CareContext): readonly Warning[] {
  if (tolerance !== 'distress') return []
  return [
    {
      name: 'cuff-state-distress',
      level: 'red',
      action: breathingAction(record.patient),
      cause: 'Distress as the cuff was let down or inflated.',
      source: BREATHING_SOURCE,
    },
  ]
}

function leak({ leak }: CuffStateData, context: CareContext): readonly Warning[] {
  return leak === 'yes' ? leakWarnings({ unit: 'cmH2O', method: 'not measured', leak }, context) : []
}

function noSuchCuff({ act }: CuffStateData, { record }: CareContext): readonly Warning[] {
  const state = cuffState(record)
  if (state !== 'no cuff' && state !== 'foam' && state !== 'no tube') return []
  const about = { name: 'cuff-state-no-such-cuff', level: 'amber', source: 'Device instructions' } as const
  if (state === 'foam') {
    const action = 'Put no valve or cap on, and call the tracheostomy team before this cuff is touched.'
    return [{ ...about, action, cause: 'A foam cuff fills itself: it is neither inflated nor surely let down.' }]
  }
  const cause = `The record shows ${state === 'no cuff' ? 'a tube without a cuff' : 'no tube'}; this was charted as ${act === 'down' || act === 'seen down' ? 'down' : 'up'}.`
  return [{ ...about, action: 'Check which tube is in and correct the record.', cause }]
}

function ventilated(data: CuffStateData, { record }: CareContext): readonly Warning[] {
  if (isUp(data) || !record.patient.ventilated) return []
  return [
    {
      name: 'cuff-down-ventilated',
      level: 'amber',
      action: 'Stay with the patient, and check with whoever looks after the ventilator.',
      cause: 'With the cuff down part of each breath is lost past the tube.',
      source: 'Common practice',
    },
  ]
}

function notSuctioned({ suctionFirst }: CuffStateData): readonly Warning[] {
  if (suctionFirst !== 'none') return []
  return [
    {
      name: 'cuff-down-not-suctioned',
      level: 'amber',
      action: 'Suction through the tube now, and watch for cough and wet breathing.',
      cause: 'Mouth and space above the cuff were not suctioned first: what lay there has run down.',
      source: 'Pryor 2016; National Tracheostomy Safety Project, speaking valve trials',
    },
  ]
}

function aspiration({ tolerance }: CuffStateData): readonly Warning[] {
  if (tolerance !== 'wet voice') return []
  return [
    {
      name: 'cuff-state-wet-voice',
      level: 'amber',
      action: 'Suction now, and ask the speech-language therapist to see the patient this shift.',
      cause: 'Wet voice or signs of aspiration with the cuff down.',
      source: 'Stop sign of weaning trials; product proposal',
    },
  ]
}

/** What is red or amber stands until the cuff is charted anew. */
export function standingCuffStateWarnings(context: CareContext): readonly Warning[] {
  const tubeless = cuffState(context.record) === 'no tube'
  if (tubeless) return []
  return standsSince(context.record.of(cuffStates), { isSettledBy: () => true, warns: cuffStateWarnings }, context)
}
