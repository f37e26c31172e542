import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { type TieData, tieChecks } from './schema.ts'

/** A look at the ties, charted by itself or with stoma and skin. */
export interface TieLook {
  readonly entry: Entry
  readonly fingers: TieData['fingers'] | 'no ties'
  readonly changed: boolean
}

/** Every look at the ties, latest first, whichever form it was charted on: nobody charts it twice. */
export function tieLooks(record: PatientRecord): readonly TieLook[] {
  const own = record.of(tieChecks).map(entry => {
    return { entry, fingers: entry.data.fingers, changed: entry.data.changed === 'yes' }
  })
  const withStoma = record.of(stomaChecks).map(entry => {
    return { entry, fingers: entry.data.ties, changed: entry.data.holderChanged === 'yes' }
  })
  return [...own, ...withStoma].toSorted((a, b) => latestFirst(a.entry, b.entry))
}

/** The latest look at the ties of the tube in place; undefined until there is one. */
export function lastTieLook({ record }: Pick<CareContext, 'record'>): TieLook | undefined {
  const tube = tubeInPlace(record)
  const last = tieLooks(record)[0]
  return tube && last && last.entry.performedAt >= tube.performedAt ? last : undefined
}

function latestFirst(a: Entry, b: Entry): number {
  return b.performedAt.getTime() - a.performedAt.getTime() || (a.id < b.id ? 1 : -1)
}
