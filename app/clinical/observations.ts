/** SpO2 readings that can be believed, in %; others are asked about again (product proposal). */
export const spo2Range = { min: 40, max: 100 } as const

/** A fall of SpO2, in percentage points, that calls for a look at the patient even within target (BTS 2017). */
export const SPO2_FALL = 3

/** Whether an SpO2 reading in % can be believed. */
export function isPlausibleSpo2(percent: number): boolean {
  return percent >= spo2Range.min && percent <= spo2Range.max
}

/** Whether an SpO2 in % is below the lower end of the prescribed target. */
export function isBelowTarget(percent: number, lowestOfTarget: number): boolean {
  return percent < lowestOfTarget
}

/** Whether SpO2 has fallen by at least `by` percentage points from the patient's usual value. */
export function hasFallen(from: number, to: number, by: number = SPO2_FALL): boolean {
  return from - to >= by
}
