import { below, type PolicyCheck } from '../policy-check.ts'
import { cuffLower, cuffUpper, cuffVeryHigh, cuffVeryLow } from './settings.ts'

/** Bands that do not overlap. */
export const cuffChecksOfPolicy: readonly PolicyCheck[] = [
  below(cuffVeryLow, cuffLower),
  below(cuffLower, cuffUpper),
  below(cuffUpper, cuffVeryHigh),
]
