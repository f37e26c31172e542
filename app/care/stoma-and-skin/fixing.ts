import type { CareContext } from '../kind.ts'
import { fitWarnings } from '../ties/fit.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import type { StomaData } from './schema.ts'

/** What holds the tube: ties too tight or too loose, sutures loose. Silent when no tube is in. */
export function fixingWarnings(data: StomaData, context: CareContext): readonly Warning[] {
  return tubeInPlace(context.record) ? [...fitWarnings(data.ties, context), ...looseSutures(data)] : []
}

/** Sutures that no longer hold the flange. */
export function looseSutures(data: StomaData): readonly Warning[] {
  if (data.sutures !== 'loose') return []
  return [
    {
      name: 'sutures-loose',
      level: 'amber',
      action: 'Check that the ties hold the tube, and ask ENT or the tracheostomy team about the sutures now.',
      cause: 'Loose flange sutures do not hold the tube.',
      source: 'Product proposal',
    },
  ]
}
