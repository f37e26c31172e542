import { daysBetween, type LocalDay } from '../time/zone.ts'

export type TractState = 'fresh' | 'non-established' | 'established' | 'laryngectomy stoma'

/** What is known of the way from the skin to the windpipe. Changes before the opening was made or after `today` do not count. */
export interface Tract {
  readonly madeOn: LocalDay
  readonly changes: readonly { readonly on: LocalDay; readonly uncomplicated: boolean }[]
  readonly laryngectomy: boolean
  readonly today: LocalDay
}

const CHANGES_TO_ESTABLISH = 2

/**
 * Fresh until the first uncomplicated tube change; established once older than `establishedAfterDays` with two of them; between, not.
 * A change with complications moves nothing on. Source: Saskatoon Health Region policy 1184 (2013).
 */
export function tractState(tract: Tract & { readonly establishedAfterDays: number }): TractState {
  if (tract.laryngectomy) return 'laryngectomy stoma'
  const changes = uncomplicatedChanges(tract)
  if (changes === 0) return 'fresh'
  const isOldEnough = daysBetween(tract.madeOn, tract.today) > tract.establishedAfterDays
  return isOldEnough && changes >= CHANGES_TO_ESTABLISH ? 'established' : 'non-established'
}

/**
 * Whether a tube that came out must not be pushed back blindly: the tract is fresh, or younger than `blindDays` (Bontempo & Manning: 7).
 * Never so for a laryngectomy, whose emergency text must not send anyone to the mouth.
 */
export function isNewStoma(tract: Tract & { readonly blindDays: number }): boolean {
  if (tract.laryngectomy) return false
  return uncomplicatedChanges(tract) === 0 || daysBetween(tract.madeOn, tract.today) < tract.blindDays
}

function uncomplicatedChanges({ changes, madeOn, today }: Tract): number {
  return changes.filter(change => change.uncomplicated && change.on >= madeOn && change.on <= today).length
}
