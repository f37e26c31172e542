import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import { isLaryngectomy } from '../stoma-and-skin/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { careFrom } from './runs.ts'
import { type HumidificationData, humidifications } from './schema.ts'
import { THICK_SOURCE } from './settings.ts'

/** What a look at humidification asks people to notice. */
export function humidificationWarnings(data: HumidificationData, context: CareContext): readonly Warning[] {
  const breathes = tubeInPlace(context.record) !== undefined || isLaryngectomy(context)
  return breathes ? [...dry(data), ...waterLow(data), ...thick(data)] : []
}

function dry({ method }: HumidificationData): readonly Warning[] {
  if (method !== 'none') return []
  return [
    {
      name: 'no-humidification',
      level: 'amber',
      action: 'Put on a heat and moisture exchanger or humidified air now, or ask the tracheostomy team what to use.',
      cause: 'Air that is not moistened dries secretions, and they can block the tube.',
      source: THICK_SOURCE,
    },
  ]
}

function waterLow({ waterLevel }: HumidificationData): readonly Warning[] {
  if (waterLevel !== 'low') return []
  return [
    {
      name: 'humidifier-water-low',
      level: 'amber',
      action: 'Fill the chamber with sterile water now.',
      cause: 'A heated humidifier without water blows hot dry air.',
      source: 'Device instructions; common practice',
    },
  ]
}

function thick({ method, consistency }: HumidificationData): readonly Warning[] {
  const isThick = consistency === 'thick' || consistency === 'tenacious'
  if (!isThick || method === 'heated') return []
  return [
    {
      name: 'humidification-thick-secretions',
      level: 'blue',
      action:
        method === 'nebuliser'
          ? 'Look daily whether nebulisers still help, and think about a heated humidifier.'
          : 'Ask a doctor about saline nebulisers, and think about a heated humidifier.',
      cause: `Secretions are ${consistency}.`,
      source: THICK_SOURCE,
    },
  ]
}

/** What stands until a later look shows otherwise: nothing that moistens the air, or a humidifier left with little water. */
export function standingHumidificationWarnings(context: CareContext): readonly Warning[] {
  if (!tubeInPlace(context.record) && !isLaryngectomy(context)) return []
  const looks = context.record.since(humidifications, careFrom(context))
  return standsSince(looks, { isSettledBy: () => true, warns: data => [...dry(data), ...waterLow(data)] }, context)
}
