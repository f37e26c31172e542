import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { fitWarnings } from './fit.ts'
import { lastTieLook } from './looks.ts'
import { type TieData, tieChecks } from './schema.ts'

/** What a look at the ties asks people to notice. Silent when no tube is in. */
export function tieWarnings(data: TieData, context: CareContext): readonly Warning[] {
  return tubeInPlace(context.record) ? [...fitWarnings(data.fingers, context), ...skinWarnings(data)] : []
}

function skinWarnings({ skin }: TieData): readonly Warning[] {
  if (skin === 'staying redness' || skin === 'broken') {
    return [
      {
        name: 'ties-skin-damage',
        level: 'amber',
        action: 'Take the pressure off, and chart the skin with its stage under stoma and skin this shift.',
        cause: skin === 'broken' ? 'The skin under the ties is broken.' : 'Redness under the ties stays when pressed.',
        source: 'NPUAP (now NPIAP) 2016 stages',
      },
    ]
  }
  if (skin !== 'wet') return []
  return [
    {
      name: 'ties-skin-wet',
      level: 'amber',
      action: 'Change what is wet, and protect the skin with a barrier.',
      cause: 'The skin under the ties is wet or macerated.',
      source: 'Moisture damage is not a pressure injury and has no stage (NPUAP 2016)',
    },
  ]
}

/**
 * What stands until a later look: the fit as last left, on either form, unless the tube has been changed since; and the skin, until it
 * was seen again here or at the back of the neck with stoma and skin.
 */
export function standingTieWarnings(context: CareContext): readonly Warning[] {
  const { record } = context
  if (!tubeInPlace(record)) return []
  const fit = lastTieLook(context)
  const neck = record.latest(stomaChecks, ({ sites }) => sites.includes('back of neck'))
  const looks = record.of(tieChecks).filter(look => !neck || look.performedAt > neck.performedAt)
  return [
    ...(fit ? fitWarnings(fit.fingers, context) : []),
    ...standsSince(looks, { isSettledBy: () => true, warns: skinWarnings }, context),
  ]
}
