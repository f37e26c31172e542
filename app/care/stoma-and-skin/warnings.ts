import type { CareContext } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { fixingWarnings, looseSutures } from './fixing.ts'
import { openingWarnings } from './opening.ts'
import { type StomaData, stomaChecks } from './schema.ts'
import { skinWarnings, standingSkinWarnings } from './skin.ts'

/** Everything that one check asks people to notice. */
export function stomaWarnings(data: StomaData, context: CareContext): readonly Warning[] {
  return [...openingWarnings(data, context), ...fixingWarnings(data, context), ...skinWarnings(data, context)]
}

/**
 * What stands until a later check: the opening as last seen, skin damage not cleared since, loose sutures unless the tube has been
 * changed since. How the ties fit stands with their own kind, which knows the looks of both forms.
 */
export function standingStomaWarnings(context: CareContext): readonly Warning[] {
  const last = context.record.latest(stomaChecks)
  if (!last) return []
  const then = { ...context, now: last.performedAt }
  const tube = tubeInPlace(context.record)
  const tubeInPlaceSince = tube !== undefined && tube.performedAt <= last.performedAt
  return [
    ...openingWarnings(last.data, then),
    ...(tubeInPlaceSince ? looseSutures(last.data) : []),
    ...standingSkinWarnings(context),
  ]
}

/** Whether a check found something out of the ordinary: skin damage, or anything that warns above a note. */
export function isOutOfRange(data: StomaData, context: CareContext): boolean {
  const damaged = data.skin !== 'intact' && data.skin !== 'blanching redness'
  return damaged || stomaWarnings(data, context).some(({ level }) => level !== 'blue')
}
