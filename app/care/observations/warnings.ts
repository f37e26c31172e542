import { cuffState } from '../cuff-pressure/cuff.ts'
import { BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import type { Warning } from '../warning.ts'
import { closedTube } from '../weaning-trial/closed-tube.ts'
import { stopWarnings } from '../weaning-trial/stop.ts'
import { redFlagWarnings } from './red-flags.ts'
import { saturationWarnings } from './saturation.ts'
import { awareness, type ObservationData, observationSets } from './schema.ts'
import { heartHigh, heartLow, rateHigh, rateLow, systolicHigh, systolicLow } from './settings.ts'

/** What a set of observations asks people to notice, most urgent first. */
export function observationWarnings(data: ObservationData, context: CareContext): readonly Warning[] {
  return [
    ...onTheTube(data, context),
    ...breathing(data, context),
    ...stopWarnings(data, context),
    ...redFlagWarnings(data, context),
    ...saturationWarnings(data, context),
    ...extremes(data, context),
    ...effortful(data),
  ]
}

/** A valve or cap seen on the tube, held against the cuff as charted. */
function onTheTube({ onTube }: ObservationData, { record }: CareContext): readonly Warning[] {
  if (onTube !== 'valve' && onTube !== 'cap') return []
  return closedTube(onTube, { state: cuffState(record), upperAirway: record.patient.upperAirway })
}

function breathing({ effort }: ObservationData, { record }: CareContext): readonly Warning[] {
  if (effort !== 'distress' && effort !== 'none') return []
  return [
    {
      name: 'observations-breathing',
      level: 'red',
      action: breathingAction(record.patient),
      cause: effort === 'none' ? 'The patient does not breathe.' : 'Breathing in distress.',
      source: BREATHING_SOURCE,
    },
  ]
}

/** Any one value that scores 3 asks for an urgent review, whatever the others are. */
function extremes(data: ObservationData, context: CareContext): readonly Warning[] {
  const found = extremesOf(data, context)
  if (found.length === 0) return []
  return [
    {
      name: 'observations-extreme',
      level: 'amber',
      action: 'Ask a doctor to see the patient within the hour, and tell the charge nurse.',
      cause: `${found.join(', ')}.`,
      source:
        context.values.policy.ruleSet === 'children'
          ? 'Limits by age of the rule set for children'
          : 'NEWS2, Royal College of Physicians: any single value that scores 3 is an urgent review',
    },
  ]
}

function extremesOf(data: ObservationData, { values }: CareContext): readonly string[] {
  const { respiratoryRate: rate, heartRate: heart, systolic, effort } = data
  const isApnoea = effort === 'none'
  const outside = (value: number, low: number, high: number): boolean => value <= low || value >= high
  return [
    ...(!isApnoea && outside(rate, values.of(rateLow), values.of(rateHigh)) ? [`Respiratory rate ${rate} a min`] : []),
    ...(outside(heart, values.of(heartLow), values.of(heartHigh)) ? [`Heart rate ${heart} a min`] : []),
    ...(systolic !== undefined && outside(systolic, values.of(systolicLow), values.of(systolicHigh))
      ? [`Systolic ${systolic} mmHg`]
      : []),
    ...(isAlert(data) ? [] : [awareness[data.awareness]]),
  ]
}

/** Sedation on purpose is no finding. */
function isAlert({ awareness }: ObservationData): boolean {
  return awareness === 'alert' || awareness === 'sedated'
}

function effortful({ effort }: ObservationData): readonly Warning[] {
  if (effort !== 'increased') return []
  return [
    {
      name: 'observations-effort',
      level: 'amber',
      action:
        'Check tube and inner cannula, and suction if it is needed. If breathing stays hard, ask a doctor to come.',
      cause: 'Breathing is harder than usual.',
      source: 'Red flag in teaching texts (NHS Wales, RCEM learning)',
    },
  ]
}

/** All of it stands until the next set. */
export function standingObservationWarnings(context: CareContext): readonly Warning[] {
  const rule = { isSettledBy: () => true, warns: observationWarnings }
  return standsSince(context.record.of(observationSets), rule, context)
}
