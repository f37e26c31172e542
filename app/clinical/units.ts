/** Units that a cuff manometer may be marked in. */
export const pressureUnits = ['cmH2O', 'mmHg', 'kPa'] as const

export type PressureUnit = (typeof pressureUnits)[number]

// Conventional values, exact by definition: 1 cmH2O of water at 1000 kg/m3 and 9.80665 m/s2; 1 mmHg at 13,595.1 kg/m3.
const PASCALS: Readonly<Record<PressureUnit, number>> = { cmH2O: 98.0665, mmHg: 133.322387415, kPa: 1000 }

/** A pressure in another unit, unrounded: limits are compared on this, never on what is shown. */
export function convertPressure(value: number, from: PressureUnit, to: PressureUnit): number {
  return from === to ? value : (value * PASCALS[from]) / PASCALS[to]
}

/** A pressure in cmH2O, unrounded. */
export function toCmH2O(value: number, unit: PressureUnit): number {
  return convertPressure(value, unit, 'cmH2O')
}

/** A pressure given in cmH2O, in another unit, unrounded. */
export function fromCmH2O(cmH2O: number, unit: PressureUnit): number {
  return convertPressure(cmH2O, 'cmH2O', unit)
}

/** A pressure with its unit for reading: whole cmH2O or mmHg, kPa to one decimal, no trailing zero (ISMP list). Not for comparing. */
export function showPressure(value: number, unit: PressureUnit): string {
  const steps = unit === 'kPa' ? 10 : 1
  return `${Math.round(value * steps) / steps} ${unit}`
}

/** The outside diameter in mm of a catheter by its French size: 1 Fr is a third of a millimetre. */
export function frenchToMm(fr: number): number {
  return fr / 3
}
