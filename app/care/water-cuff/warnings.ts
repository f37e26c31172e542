import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { type WaterCuffData, waterCuffs } from './schema.ts'
import { waterCuffDifference } from './settings.ts'

/** What a filling asks people to notice. Silent when no tube is in. */
export function waterCuffWarnings(data: WaterCuffData, context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  if (!tube) return []
  if (tube.data.cuff !== 'water') return [wrongCuff(tube.data.cuff)]
  return findings(data, context)
}

function findings(data: WaterCuffData, context: CareContext): readonly Warning[] {
  return [...leak(data), ...difference(data, context), ...notAsPrescribed(data)]
}

function leak(data: WaterCuffData): readonly Warning[] {
  if (data.leak === 'no') return []
  return [
    {
      name: 'water-cuff-leak',
      level: 'amber',
      action: 'Check the position of the tube and the pilot line now. Add no more than prescribed; ask for a review.',
      cause: 'Leak or voice with the cuff up: the tube or the cuff may have moved or failed.',
      source: 'Red flag in teaching texts (NHS Wales, RCEM learning)',
    },
  ]
}

/** What came out against what goes in. A cuff left empty on purpose has nothing to be held against. */
function difference({ removedMl, instilledMl }: WaterCuffData, { values }: CareContext): readonly Warning[] {
  const by = tenths(removedMl - instilledMl)
  if (instilledMl === 0 || Math.abs(by) <= values.of(waterCuffDifference)) return []
  return [
    {
      name: 'water-cuff-difference',
      level: 'amber',
      action:
        by < 0
          ? 'Check cuff and pilot line for a leak, and tell the tracheostomy team today.'
          : 'Ask the tracheostomy team how much water this cuff is to have.',
      cause: `${removedMl} mL came out and ${instilledMl} mL went in.`,
      source: waterCuffDifference.source.says,
    },
  ]
}

/** Too much water presses on the wall of the windpipe, too little does not seal. */
function notAsPrescribed({ prescribedMl, instilledMl }: WaterCuffData): readonly Warning[] {
  if (instilledMl === 0 || instilledMl === prescribedMl) return []
  return [
    {
      name: 'water-cuff-not-as-prescribed',
      level: 'amber',
      action: `Fill the cuff with ${prescribedMl} mL, or ask for a new prescription.`,
      cause: `${instilledMl} mL put in; prescribed ${prescribedMl} mL.`,
      source: 'Teaching page of a hospital: refill with the same prescribed volume',
    },
  ]
}

function wrongCuff(cuff: 'air' | 'foam' | 'none'): Warning {
  return {
    name: 'water-cuff-other-cuff',
    level: 'amber',
    action: 'Check which tube is in and correct the record.',
    cause: `The record shows ${cuff === 'none' ? 'a tube without a cuff' : `${cuff === 'air' ? 'an air' : 'a foam'} cuff`}.`,
    source: 'Device instructions; common practice',
  }
}

/** Without binary noise: 5.1 less 4.1 is 1. */
function tenths(ml: number): number {
  return Math.round(ml * 10) / 10
}

/** The same until the next filling of the tube in place. */
export function standingWaterCuffWarnings(context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  if (tube?.data.cuff !== 'water') return []
  const fillings = context.record.since(waterCuffs, tube.performedAt)
  return standsSince(fillings, { isSettledBy: () => true, warns: findings }, context)
}
