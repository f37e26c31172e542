import { oneOf, type SupplyName, supplyItems, type Used } from '../supply.ts'
import { catheterFr, type SuctionData } from './schema.ts'

/** One catheter for an episode through the open tube. A closed system keeps its own. */
export function suctionUse(data: SuctionData): readonly Used[] {
  const fr = catheterFr(data)
  if (data.route !== 'tube open' || fr === undefined) return []
  const name = `catheter-${fr}-fr`
  return isSupply(name) ? [oneOf(name)] : []
}

function isSupply(name: string): name is SupplyName {
  return Object.hasOwn(supplyItems, name)
}
