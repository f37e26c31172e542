import type { CareContext } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import type { StomaData } from './schema.ts'
import { tiesMostFingers } from './settings.ts'

/** What holds the tube: ties too tight or too loose, sutures loose. Silent when no tube is in. */
export function fixingWarnings(data: StomaData, context: CareContext): readonly Warning[] {
  return tubeInPlace(context.record) ? [...ties(data, context), ...looseSutures(data)] : []
}

const fingers: Readonly<Record<StomaData['ties'], number | undefined>> = {
  none: 0,
  one: 1,
  two: 2,
  'more than two': 3,
  'no ties': undefined,
}

function ties(data: StomaData, { values }: CareContext): readonly Warning[] {
  const fit = fingers[data.ties]
  const most = values.of(tiesMostFingers)
  if (fit === undefined || (fit >= 1 && fit <= most)) return []
  return [
    {
      name: fit === 0 ? 'ties-tight' : 'ties-loose',
      level: 'amber',
      action: `Re-fit ties so ${most === 1 ? 'one finger fits' : 'one to two fingers fit'}.`,
      cause: fit === 0 ? 'Tight ties press on skin and veins.' : 'Loose ties let the tube move out.',
      source: tiesMostFingers.source.says,
    },
  ]
}

function looseSutures(data: StomaData): readonly Warning[] {
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
