import { aboveCuffRate } from '../above-cuff-suction/rate.ts'
import { coughOf } from '../cough-strength/verdict.ts'
import { readinessOf } from '../decannulation-readiness/readiness.ts'
import type { CareContext } from '../kind.ts'
import { observationSets } from '../observations/schema.ts'
import { passedTrial } from '../weaning-trial/verdict.ts'
import type { PlannedStep } from './schema.ts'
import { weaningFio2AtMost } from './settings.ts'

/** Criteria of a step that the record shows as not met, or not assessed where it needs them, in short words. */
export function unmetCriteria(step: PlannedStep, context: CareContext): readonly string[] {
  if (step === 'none') return []
  return [...stability(context), ...ofStep[step](context)]
}

const ofStep: Readonly<Record<Exclude<PlannedStep, 'none'>, (context: CareContext) => readonly string[]>> = {
  cuff: muchAboveCuff,
  valve: context => [...muchAboveCuff(context), ...airwayNotKnown(context)],
  cap: context => [...airwayNotKnown(context), ...notPassed('valve', context)],
  removal: context => [
    ...airwayNotKnown(context),
    ...notPassed('cap', context),
    ...weakCough(context),
    ...notReady(context),
  ],
}

function stability({ record, values }: CareContext): readonly string[] {
  const last = record.latest(observationSets)?.data
  const most = values.of(weaningFio2AtMost)
  return [
    ...(record.patient.ventilated ? ['the patient is ventilated'] : []),
    ...(last?.fio2 !== undefined && last.fio2 > most ? [`FiO2 ${last.fio2}%, at most ${most}`] : []),
  ]
}

function muchAboveCuff(context: CareContext): readonly string[] {
  const rate = aboveCuffRate(context)
  return rate && !rate.isLow ? [`${rate.mlPerHour.toFixed(1)} mL an hour above the cuff`] : []
}

function airwayNotKnown({ record }: CareContext): readonly string[] {
  return record.patient.upperAirway === 'not known' ? ['whether the upper airway is open is not known'] : []
}

function notPassed(trial: 'valve' | 'cap', context: CareContext): readonly string[] {
  if (passedTrial(trial, context)) return []
  return [trial === 'valve' ? 'no one-way valve trial was passed' : 'no cap trial was passed']
}

function weakCough(context: CareContext): readonly string[] {
  return coughOf(context)?.verdict === 'not met' ? ['the cough is too weak by peak flow'] : []
}

function notReady(context: CareContext): readonly string[] {
  const criteria = readinessOf(context.record).filter(({ isCore }) => isCore)
  if (criteria.every(({ at }) => at === undefined)) return ['readiness for removal was not charted']
  const words = (answer: 'no' | 'not assessed') =>
    criteria.filter(one => one.answer === answer).map(({ label }) => label.toLowerCase())
  const [no, open] = [words('no'), words('not assessed')]
  return [
    ...(no.length > 0 ? [`answered no: ${no.join(', ')}`] : []),
    ...(open.length > 0 ? [`not assessed: ${open.join(', ')}`] : []),
  ]
}
