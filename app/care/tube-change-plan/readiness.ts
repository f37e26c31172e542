import type { TubePlanData } from './schema.ts'

/** What the gate still waits for, in words; empty when all is ready. */
export function openPoints(data: TubePlanData): readonly string[] {
  return [
    ...(data.equipment === 'no' ? ['equipment'] : []),
    ...(data.spareSame === 'no' ? ['spare tube of the same size'] : []),
    ...(data.spareSmaller === 'no' ? ['spare tube one size smaller'] : []),
    ...(data.fasted === 'arranged' ? ['fasting'] : []),
    ...(data.capnography === 'no' ? ['monitoring with capnography'] : []),
    ...(data.consent === 'not yet' ? ['consent'] : []),
  ]
}
