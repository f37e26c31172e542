import { oneOf, type Used } from '../supply.ts'
import type { WaterCuffData } from './schema.ts'

/** A syringe for each emptying, and water where the cuff was filled. */
export function waterCuffUse({ instilledMl }: WaterCuffData): readonly Used[] {
  return [oneOf('syringe-10-ml'), ...(instilledMl > 0 ? [oneOf('sterile-water')] : [])]
}
