import { atMost, below, type PolicyCheck } from '../policy-check.ts'
import { bleedWindowFrom, bleedWindowTo } from './bleeding-settings.ts'
import {
  copiousInterval,
  needInterval,
  passLimit,
  passWarn,
  vacuumLow,
  vacuumVeryHigh,
  vacuumWarn,
} from './settings.ts'

/** Limits in their order, and closer looks after copious secretions. */
export const suctionChecks: readonly PolicyCheck[] = [
  atMost(copiousInterval, needInterval),
  below(vacuumLow, vacuumWarn),
  atMost(vacuumWarn, vacuumVeryHigh),
  below(passWarn, passLimit),
  below(bleedWindowFrom, bleedWindowTo),
]
