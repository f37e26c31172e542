import type { CatheterRule } from '../../clinical/suction-catheter.ts'
import type { Values } from '../policy.ts'
import { catheterShare, stockedSizes, strictShare } from './settings.ts'

/** Which catheters a tube takes, by the values in force. */
export function catheterRule(values: Values): CatheterRule {
  return {
    stockedFr: values.of(stockedSizes),
    ratio: values.of(catheterShare) / 100,
    strict: values.of(strictShare),
  }
}
