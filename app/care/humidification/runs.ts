import type { CareContext, Entry } from '../kind.ts'
import { isLaryngectomy } from '../stoma-and-skin/tasks.ts'
import { tubeCareFrom } from '../tube-care.ts'
import { type HumidificationData, humidifications } from './schema.ts'

export type HumidificationEntry = Entry<HumidificationData>

/** When there was first an opening to breathe through: one of a laryngectomy has no end. */
export function careFrom(context: CareContext): Date {
  return isLaryngectomy(context) ? context.record.admittedAt : tubeCareFrom(context)
}

/**
 * The looks since the method in use was put on, latest first. A nebuliser is given in between: what was on before goes back on,
 * so that it neither begins nor ends a run.
 */
export function currentRun(context: CareContext): readonly HumidificationEntry[] {
  const looks = context.record
    .since(humidifications, careFrom(context))
    .filter(({ data }) => data.method !== 'nebuliser')
  const method = looks[0]?.data.method
  const end = looks.findIndex(({ data }) => data.method !== method)
  return end === -1 ? looks : looks.slice(0, end)
}
