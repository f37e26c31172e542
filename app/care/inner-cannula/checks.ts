import { atMost, type PolicyCheck } from '../policy-check.ts'
import { earlyInterval, inspectionInterval, recheckWithin } from './settings.ts'

/** A new tube and a blocked cannula are looked at no later than any other. */
export const innerCannulaChecks: readonly PolicyCheck[] = [
  atMost(earlyInterval, inspectionInterval),
  atMost(recheckWithin, inspectionInterval),
]
