import { convertPressure } from './units.ts'

/** Units that a suction regulator may be marked in. The figures are the size of the vacuum, without a minus. */
export const vacuumUnits = ['mmHg', 'kPa'] as const

export type VacuumUnit = (typeof vacuumUnits)[number]

/** Suction above `warnAbove` is high; above `confirmAbove` it is to be confirmed. Both in mmHg. */
export interface VacuumLimits {
  readonly warnAbove: number
  readonly confirmAbove: number
}

export type VacuumClass = 'in range' | 'high' | 'to confirm'

/** A suction vacuum in mmHg, unrounded. */
export function vacuumMmHg(value: number, unit: VacuumUnit): number {
  return convertPressure(value, unit, 'mmHg')
}

/**
 * Where a suction vacuum stands, by whole mmHg: published limits equate 150 mmHg with 20 kPa, which is 150.01,
 * and no regulator is read finer than that.
 */
export function vacuumClass(mmHg: number, limits: VacuumLimits): VacuumClass {
  const whole = Math.round(mmHg)
  if (whole > limits.confirmAbove) return 'to confirm'
  return whole > limits.warnAbove ? 'high' : 'in range'
}
