/** The target of an air-filled cuff and the limits beyond which it is very far out, all in cmH2O. */
export interface CuffBand {
  /** Lowest pressure in range. */
  readonly lower: number
  /** Highest pressure in range. */
  readonly upper: number
  /** Anything below is very low. */
  readonly veryLow: number
  /** Anything above is very high. */
  readonly veryHigh: number
}

export type CuffClass = 'very low' | 'low' | 'in range' | 'high' | 'very high'

/**
 * Where a cuff pressure in cmH2O stands, on the unrounded value: 30.0 is in range of 20 to 30 and 30.1 is high.
 * The target wins over the outer limits, so that a patient's own low target is not called very low.
 * Not for deflated, foam or water-filled cuffs. Bands: published in several forms, see the policy; very low and very high are proposals.
 */
export function cuffClass(cmH2O: number, band: CuffBand): CuffClass {
  if (cmH2O >= band.lower && cmH2O <= band.upper) return 'in range'
  if (cmH2O < band.lower) return cmH2O < band.veryLow ? 'very low' : 'low'
  return cmH2O > band.veryHigh ? 'very high' : 'high'
}
