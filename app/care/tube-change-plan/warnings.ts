import { showDay } from '../../time/display.ts'
import { localDay } from '../../time/zone.ts'
import type { CareContext } from '../kind.ts'
import { routineFirstChange } from '../tube-change/settings.ts'
import { dwellLimit, tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { openPlan } from './open-plan.ts'
import { openPoints } from './readiness.ts'
import type { TubePlanData } from './schema.ts'

const GATE = 'Royal Marsden Manual, ch. 12: before a tube change'

/** What a plan asks people to notice as it is made: a day past the limit, a first change where none is routine. */
export function planWarnings(data: TubePlanData, context: CareContext): readonly Warning[] {
  return data.step === 'plan' ? [...pastLimit(data, context), ...forIndication(data, context)] : []
}

function pastLimit({ plannedOn }: TubePlanData, context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  const limit = tube && dwellLimit(tube, context)
  if (!limit || plannedOn === undefined || plannedOn <= limit.changeBy) return []
  return [
    {
      name: 'tube-plan-past-limit',
      level: 'amber',
      action: 'Plan the change for an earlier day, or tell the tracheostomy team why not.',
      cause: `Planned for ${showDay(plannedOn)}; the tube is to be changed by ${showDay(limit.changeBy)}.`,
      source: `Limit by ${limit.because}`,
    },
  ]
}

function forIndication({ indication }: TubePlanData, { values }: CareContext): readonly Warning[] {
  if (values.of(routineFirstChange) || indication !== 'first change') return []
  return [
    {
      name: 'tube-plan-no-indication',
      level: 'blue',
      action: 'Ask whether this tube needs to be changed.',
      cause: 'By the policy of this ward a first change is made for an indication only.',
      source: routineFirstChange.source.says,
    },
  ]
}

/** What stands by the plan: that its day has passed, or what is not ready as the day comes. */
export function standingPlanWarnings(context: CareContext): readonly Warning[] {
  const plan = openPlan(context.record)
  if (!plan) return []
  const today = localDay(context.now, context.ward.zone)
  const day = showDay(plan.plannedOn)
  if (plan.plannedOn < today) {
    return [
      {
        name: 'tube-plan-passed',
        level: 'amber',
        action: 'Chart the tube change, or plan another day.',
        cause: `The tube change was planned for ${day} and is not charted.`,
        source: 'Product proposal',
      },
    ]
  }
  const open = openPoints(plan.entry.data)
  if (open.length === 0) return []
  return [
    {
      name: 'tube-plan-not-ready',
      level: plan.plannedOn === today ? 'amber' : 'blue',
      action: `Before the tube change: ${open.join(', ')}. Then chart the plan again.`,
      cause: `The tube change is planned for ${day}; not everything is ready.`,
      source: GATE,
    },
  ]
}
