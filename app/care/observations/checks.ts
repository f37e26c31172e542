import { below, type PolicyCheck } from '../policy-check.ts'
import { heartHigh, heartLow, rateHigh, rateLow, systolicHigh, systolicLow } from './settings.ts'

/** Each low extreme below its high one. */
export const observationChecks: readonly PolicyCheck[] = [
  below(rateLow, rateHigh),
  below(heartLow, heartHigh),
  below(systolicLow, systolicHigh),
]
