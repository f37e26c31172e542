import { addDays } from '../../time/zone.ts'
import { dayClock, noClock } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import {
  firstChangePercutaneousEarliest,
  firstChangePercutaneousTarget,
  firstChangeSurgicalEarliest,
  firstChangeSurgicalTarget,
  routineFirstChange,
} from './settings.ts'
import { insertedOn, isFirstTube, tubeInPlace } from './tube.ts'

/** The first change of the tube that was put in when the opening was made. */
export const firstChange: TaskRule = {
  name: 'first-tube-change',
  airway: true,
  settings: [
    firstChangeSurgicalEarliest,
    firstChangeSurgicalTarget,
    firstChangePercutaneousEarliest,
    firstChangePercutaneousTarget,
    routineFirstChange,
  ],
  opensWith: { reason: 'first change' },
  says(context) {
    const { earliest, target, isKnown } = firstChangeDays(context)
    const why = isKnown ? '' : ' How the opening was made is not known, so the later days count.'
    return `First change from day ${earliest}, by day ${target} after insertion.${why} An experienced operator, with airway help at hand.`
  },
  clock(context) {
    const tube = tubeInPlace(context.record)
    if (!tube || !isFirstTube(tube) || !context.values.of(routineFirstChange)) return noClock
    const { earliest, target } = firstChangeDays(context)
    return dayClock({
      values: context.values,
      dueOn: addDays(insertedOn(tube, context), target),
      soonDays: target - earliest,
      ward: context.ward,
      last: tube,
    })
  },
}

interface FirstChange {
  readonly earliest: number
  readonly target: number
  /** Whether it is known how the opening was made. */
  readonly isKnown: boolean
}

/**
 * Earliest and target day of the first change, by how the opening was made. Where that is not known the days of a percutaneous one
 * count: a change too early may lose the airway, a few days later it does no harm.
 */
export function firstChangeDays({ record, values }: CareContext): FirstChange {
  const technique = tubeInPlace(record)?.data.technique
  const surgical = technique === 'surgical'
  const earliest = values.of(surgical ? firstChangeSurgicalEarliest : firstChangePercutaneousEarliest)
  const target = values.of(surgical ? firstChangeSurgicalTarget : firstChangePercutaneousTarget)
  return { earliest: Math.min(earliest, target), target, isKnown: surgical || technique === 'percutaneous' }
}
