import type { CareContext } from '../care/kind.ts'
import { tubeChange } from '../care/tube-change/kind.ts'
import { dwellLimit, tubeInPlace } from '../care/tube-change/tube.ts'
import { tubeChangePlan } from '../care/tube-change-plan/kind.ts'
import { openPlan } from '../care/tube-change-plan/open-plan.ts'
import type { Warning } from '../care/warning.ts'
import { byUrgency } from '../care/warning.ts'
import { type TubeView, tubeView } from './views.ts'

/** One tube in place in a list of tubes: how long it is in, by when it is changed, for when that is planned, what it warns of. */
export interface TubeRow extends TubeView {
  readonly line: string
  /** Null where no rule is for this patient. */
  readonly changeBy: string | null
  readonly because: string
  readonly plannedOn: string | null
  readonly operator: string | null
  /** Names the tube for as long as it is in: the entry that charted it. */
  readonly tubeId: string
  readonly warnings: readonly Pick<Warning, 'name' | 'level' | 'action' | 'cause'>[]
}

/** The tube in place as a row; undefined while none is in. */
export function tubeRow(context: CareContext): TubeRow | undefined {
  const tube = tubeInPlace(context.record)
  if (!tube) return undefined
  const limit = dwellLimit(tube, context)
  const view = tubeView(tube, context)
  const plan = openPlan(context.record)
  const warnings = [...(tubeChange.standing?.(context) ?? []), ...(tubeChangePlan.standing?.(context) ?? [])]
  return {
    ...view,
    tubeId: tube.id,
    line: tube.data.line,
    changeBy: view.limit === null ? null : limit.changeBy,
    because: limit.because,
    plannedOn: plan?.plannedOn ?? null,
    operator: plan?.entry.data.operator ?? null,
    warnings: warnings.toSorted(byUrgency).map(({ name, level, action, cause }) => ({ name, level, action, cause })),
  }
}
