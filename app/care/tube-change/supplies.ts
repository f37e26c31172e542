import type { Used } from '../supply.ts'
import type { TubeData } from './schema.ts'

/** The tube, with its disposable inner cannula; also where it failed, since its pack is open. One that came with the patient is not ours. */
export function tubeUse({ reason, line, size, innerCannula }: TubeData): readonly Used[] {
  if (reason === 'on arrival') return []
  return [
    { item: { device: 'tube', line, size }, quantity: 1 },
    ...(innerCannula === 'disposable'
      ? [{ item: { device: 'inner cannula of a tube', line, size } as const, quantity: 1 }]
      : []),
  ]
}
