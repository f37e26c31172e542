import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { tiesMostFingers } from '../stoma-and-skin/settings.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { lastTieLook, type TieLook } from './looks.ts'
import { type TieData, tieChecks } from './schema.ts'

/** What a look at the ties asks people to notice. Silent when no tube is in. */
export function tieWarnings(data: TieData, context: CareContext): readonly Warning[] {
  return tubeInPlace(context.record) ? [...fitWarnings(data.fingers, context), ...skinWarnings(data)] : []
}

const count: Readonly<Record<TieLook['fingers'], number | undefined>> = {
  none: 0,
  one: 1,
  two: 2,
  'more than two': 3,
  'no ties': undefined,
}

/** Ties that no finger fits under, or more fingers than the policy allows. */
export function fitWarnings(fingers: TieLook['fingers'], { values }: Pick<CareContext, 'values'>): readonly Warning[] {
  const fit = count[fingers]
  const most = values.of(tiesMostFingers)
  if (fit === undefined || (fit >= 1 && fit <= most)) return []
  return [
    {
      name: fit === 0 ? 'ties-tight' : 'ties-loose',
      level: 'amber',
      action: `Re-fit ties so ${most === 1 ? 'one finger fits' : 'one to two fingers fit'}.`,
      cause: fit === 0 ? 'Tight ties press on skin and veins.' : 'Loose ties let the tube move out.',
      source: tiesMostFingers.source.says,
    },
  ]
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
