import { actsOnTube } from '../above-cuff-suction/acts.ts'
import { aboveCuffRate } from '../above-cuff-suction/rate.ts'
import { aboveCuffSuctions, isEmptied } from '../above-cuff-suction/schema.ts'
import { aboveCuffRateLimit } from '../above-cuff-suction/settings.ts'
import type { CareContext } from '../kind.ts'
import { type ObservationData, observationSets } from '../observations/schema.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { readFrom, type StepCriterion, stateOf } from './criterion.ts'
import { weaningFio2AtMost } from './settings.ts'

const AIR = 21 // % of oxygen

/** Stable enough to begin: breathing on one's own, and little oxygen. */
export function stability(context: CareContext): readonly StepCriterion[] {
  return [ownBreathing(context), littleOxygen(context)]
}

function ownBreathing({ record: { patient } }: CareContext): StepCriterion {
  return {
    name: 'own breathing',
    label: 'Breathes without a ventilator',
    state: stateOf(!patient.ventilated),
    isAsked: true,
    value: `${patient.ventilated ? 'Ventilated' : 'Not ventilated'}, by the patient's details`,
    ...(patient.ventilated ? { unmet: 'the patient is ventilated' } : {}),
    rule: 'No step is planned while the patient is ventilated.',
    settings: [],
    source: 'Pryor 2016: medical and respiratory stability',
  }
}

function littleOxygen({ record, values }: CareContext): StepCriterion {
  const last = record.latest(observationSets)
  const most = values.of(weaningFio2AtMost)
  const fio2 = last && shareOf(last.data)
  const isMet = fio2 === undefined ? undefined : fio2 <= most
  return {
    name: 'oxygen',
    label: `FiO2 at most ${most}%`,
    state: stateOf(isMet),
    isAsked: true,
    ...readFrom(last, last && oxygenWords(last.data)),
    chartedBy: observationSets,
    ...(isMet === false ? { unmet: `FiO2 ${fio2}%, at most ${most}` } : {}),
    rule: 'By the latest observations. A flow without a share of oxygen tells nothing.',
    settings: [weaningFio2AtMost],
    source: weaningFio2AtMost.source.says,
  }
}

function shareOf({ oxygen, fio2 }: ObservationData): number | undefined {
  return oxygen === 'air' ? AIR : fio2
}

function oxygenWords({ oxygen, fio2, flow }: ObservationData): string {
  if (oxygen === 'air') return 'Air'
  return fio2 === undefined ? `${flow ?? 0} L/min, FiO2 not charted` : `FiO2 ${fio2}%`
}

/** Little gathers above the cuff. Does not arise with a tube that has none. */
export function littleAboveCuff(context: CareContext): readonly StepCriterion[] {
  if (tubeInPlace(context.record)?.data.cuff === 'none') return []
  const rate = aboveCuffRate(context)
  const last = actsOnTube(context.record).find(({ data }) => isEmptied(data))
  const limit = context.values.of(aboveCuffRateLimit)
  const words = rate && `${rate.mlPerHour.toFixed(1)} mL an hour`
  return [
    {
      name: 'above cuff',
      label: `At most ${limit} mL an hour above the cuff`,
      state: stateOf(rate?.isLow),
      isAsked: true,
      ...readFrom(last, words ?? (last && 'One volume, and none before it')),
      chartedBy: aboveCuffSuctions,
      ...(rate && !rate.isLow ? { unmet: `${words} above the cuff` } : {}),
      rule: 'The volume of the latest emptying over the time since the one before it.',
      settings: [aboveCuffRateLimit],
      source: aboveCuffRateLimit.source.says,
    },
  ]
}
