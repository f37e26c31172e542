import type { CareContext } from '../kind.ts'
import { awareness, type ObservationData, observationSets } from '../observations/schema.ts'
import { type SecretionGradeData, scoreColumns, secretionGrades } from '../secretion-grade/schema.ts'
import { readFrom, type StepCriterion, stateOf } from './criterion.ts'

const PRYOR =
  'Pryor 2016, with a first deflation that succeeded: suction every 1 to 2 hours at most, thin clear sputum, at least a moderate cough, eyes open to voice'

const informs = { isAsked: false, settings: [], source: PRYOR } as const

/** Further signs at a first deflation; a plan is not held against them. */
export function furtherSigns(context: CareContext): readonly StepCriterion[] {
  return [...secretionSigns(context), awake(context)]
}

/** Secretions and cough by the latest grading. */
export function secretionSigns({ record }: CareContext): readonly StepCriterion[] {
  const last = record.latest(secretionGrades)
  const sign = (
    about: Pick<StepCriterion, 'name' | 'label'>,
    isMet: (seen: SecretionGradeData) => boolean,
    words: (seen: SecretionGradeData) => string,
  ): StepCriterion => ({
    ...about,
    ...informs,
    state: stateOf(last && isMet(last.data)),
    ...readFrom(last, last && words(last.data)),
    chartedBy: secretionGrades,
    rule: 'By the latest grading of secretions.',
  })
  return [
    sign(
      { name: 'suction interval', label: 'Suction every 1 to 2 hours at most' },
      ({ interval }) => interval !== 'often',
      ({ interval }) => scoreColumns.interval[interval],
    ),
    sign(
      { name: 'secretions', label: 'Secretions thin and clear' },
      ({ colour, viscosity }) => colour === 'clear' && (viscosity === 'watery' || viscosity === 'frothy'),
      ({ colour, viscosity }) => `${scoreColumns.colour[colour]}, ${scoreColumns.viscosity[viscosity].toLowerCase()}`,
    ),
    sign(
      { name: 'cough', label: 'Cough at least moderate' },
      ({ cough }) => cough === 'vigorous' || cough === 'moderate',
      ({ cough }) => scoreColumns.cough[cough],
    ),
  ]
}

const awakeBy: readonly ObservationData['awareness'][] = ['alert', 'confused', 'voice']

/** Awake enough to take part. */
export function awake({ record }: CareContext): StepCriterion {
  const last = record.latest(observationSets)
  return {
    name: 'awake',
    label: 'Awake, or eyes open to voice',
    ...informs,
    state: stateOf(last && awakeBy.includes(last.data.awareness)),
    ...readFrom(last, last && awareness[last.data.awareness]),
    chartedBy: observationSets,
    rule: 'By the latest observations.',
  }
}
