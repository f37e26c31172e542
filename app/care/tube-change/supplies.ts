import type { CareContext } from '../kind.ts'
import type { PlannedUse, Used, UsedTube } from '../supply.ts'
import type { TubeData } from './schema.ts'
import { dwellLimit, tubeInPlace } from './tube.ts'

/** A tube as the stock knows it. */
export function usedTube({ item: id, line, size, cuff, fenestrated }: TubeData): UsedTube {
  return { device: 'tube', id, line, size, cuff, fenestrated }
}

/** The tube, with its disposable inner cannula; also where it failed, since its pack is open. One that came with the patient is not ours. */
export function tubeUse(tube: TubeData): readonly Used[] {
  if (tube.reason === 'on arrival') return []
  const { line, size } = tube
  const ofTube = usedTube(tube)
  const cannula = { device: 'inner cannula', line, size, ofTube } as const
  return [
    { item: ofTube, quantity: 1 },
    ...(tube.innerCannula === 'disposable' ? [{ item: cannula, quantity: 1 }] : []),
  ]
}

/** The same tube again by the end of its dwell. */
export function plannedTubes(context: CareContext): readonly PlannedUse[] {
  const tube = tubeInPlace(context.record)
  return tube ? [{ item: usedTube(tube.data), perDay: 1 / dwellLimit(tube, context).days }] : []
}
