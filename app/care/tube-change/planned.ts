import { localDay } from '../../time/zone.ts'
import type { CareContext } from '../kind.ts'
import { openPlan } from '../tube-change-plan/open-plan.ts'

/** What the plan of a change knows of it, once its day has come: an emergency before that day is not the planned change. */
export function plannedAnswers({ record, ward, now }: CareContext): Readonly<Record<string, unknown>> {
  const plan = openPlan(record)
  if (!plan || plan.plannedOn > localDay(now, ward.zone)) return {}
  const { indication, operator, helper } = plan.entry.data
  return { reason: indication, operator, helper }
}
