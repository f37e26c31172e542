import type { CareContext } from '../kind.ts'
import { tiesMostFingers } from '../stoma-and-skin/settings.ts'
import type { Warning } from '../warning.ts'
import type { TieLook } from './looks.ts'

const count: Readonly<Record<TieLook['fingers'], number | undefined>> = {
  none: 0,
  one: 1,
  two: 2,
  'more than two': 3,
  'no ties': undefined,
}

/** Ties that no finger fits under, or more fingers than the policy allows. */
export function fitWarnings(fingers: TieLook['fingers'], { values }: Pick<CareContext, 'values'>): readonly Warning[] {
  const fit = count[fingers]
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
