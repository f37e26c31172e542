import { atMost, below, type PolicyCheck } from '../policy-check.ts'
import { dwellDual, dwellNotice, dwellSingle, dwellSingleHeavy, dwellStrongNotice } from './dwell-settings.ts'
import {
  firstChangePercutaneousEarliest,
  firstChangePercutaneousTarget,
  firstChangeSurgicalEarliest,
  firstChangeSurgicalTarget,
} from './settings.ts'

/** Days in their order: earliest before target, notices before the limit. */
export const tubeChangeChecks: readonly PolicyCheck[] = [
  atMost(dwellSingleHeavy, dwellSingle),
  atMost(dwellSingle, dwellDual),
  below(dwellStrongNotice, dwellNotice),
  atMost(dwellNotice, dwellDual),
  atMost(firstChangeSurgicalEarliest, firstChangeSurgicalTarget),
  atMost(firstChangePercutaneousEarliest, firstChangePercutaneousTarget),
]
