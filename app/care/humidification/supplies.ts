import type { CareContext } from '../kind.ts'
import { oneOf, type PlannedUse, timesADay, type Used } from '../supply.ts'
import { currentRun } from './runs.ts'
import type { HumidificationData } from './schema.ts'
import { hmeInterval } from './settings.ts'

/** A fresh exchanger, where it was changed. */
export function humidificationUse({ hmeChanged }: HumidificationData): readonly Used[] {
  return hmeChanged === 'yes' ? [oneOf('exchanger')] : []
}

/** An exchanger each interval, while one is what the patient breathes through. */
export function plannedExchangers(context: CareContext): readonly PlannedUse[] {
  if (currentRun(context)[0]?.data.method !== 'hme') return []
  return [{ item: { supply: 'exchanger' }, perDay: timesADay(context.values.of(hmeInterval)) }]
}
