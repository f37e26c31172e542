/** Red: act now. Amber: act this hour and tell the charge nurse. Blue: note and plan. */
export type WarningLevel = 'red' | 'amber' | 'blue'

/** What the record asks people to notice: action first, cause second. Computed, never stored. */
export interface Warning {
  /** Stable name of the rule behind it, such as `cuff-high`. */
  readonly name: string
  readonly level: WarningLevel
  readonly action: string
  readonly cause: string
  readonly source: string
}

const order: Readonly<Record<WarningLevel, number>> = { red: 0, amber: 1, blue: 2 }

/** Most urgent first; equal levels keep their order. */
export function byUrgency(a: Warning, b: Warning): number {
  return order[a.level] - order[b.level]
}

/** Every red warning ends with this sentence. */
export const LOCAL_PLAN = 'Follow your local emergency plan.'
