import { showDateTime } from '../time/display.ts'
import type { Zone } from '../time/zone.ts'
import { isPrintedAlike } from './printed.ts'
import type { Warning } from './warning.ts'

/** A lot that is not to be used any more: of one line or, with null, of any; who said so, when (UTC) and why. */
export interface Recall {
  readonly lot: string
  readonly line: string | null
  readonly reason: string
  readonly recalledAt: Date
  readonly recalledByName: string
}

/** What a device says of itself, as far as it is known. */
export interface Labelled {
  readonly lot?: string | null | undefined
  readonly line?: string | null | undefined
}

/** A decision about a lot: recalled, or the recall before it lifted. */
export interface LotDecision extends Recall {
  readonly isRecalled: boolean
}

/**
 * The recalls in force: of each lot and line the latest decision, where it was not to lift one. `names`: for each line that was
 * renamed all of its names, of which a recall may have one and a charted device another.
 */
export function recallsInForce(
  latestFirst: readonly LotDecision[],
  names: readonly (readonly string[])[],
): readonly Recall[] {
  const namesOf = (line: string) => names.find(known => known.some(name => isPrintedAlike(name, line))) ?? [line]
  const keyOf = ({ lot, line }: Recall) => JSON.stringify([lot, line && namesOf(line)[0]]).toLowerCase()
  const latest = new Map(latestFirst.toReversed().map(decision => [keyOf(decision), decision]))
  return [...latest.values()]
    .filter(({ isRecalled }) => isRecalled)
    .flatMap(recall => (recall.line === null ? [recall] : namesOf(recall.line).map(line => ({ ...recall, line }))))
}

/** The recall that a device falls under; undefined for none, and where its lot is not known. */
export function recallOf({ lot, line }: Labelled, recalls: readonly Recall[]): Recall | undefined {
  if (lot == null) return undefined
  return recalls.find(
    recall =>
      isPrintedAlike(recall.lot, lot) && (recall.line === null || line == null || isPrintedAlike(recall.line, line)),
  )
}

/** `Lot 7B-204 was recalled on 01-Dec-2026 14:06 by M. Osei: leaking pilot line` */
export function recallWords({ lot, reason, recalledAt, recalledByName }: Recall, zone: Zone): string {
  return `Lot ${lot} was recalled on ${showDateTime(recalledAt, zone)} by ${recalledByName}: ${reason}`
}

/** The warning that a device of a recalled lot is in place. `what`: `tube`, `inner cannula`. */
export function recalledInPlace(
  what: string,
  device: Labelled,
  { recalls = [], zone }: { readonly recalls?: readonly Recall[]; readonly zone: Zone },
): readonly Warning[] {
  const recall = recallOf(device, recalls)
  if (!recall) return []
  return [
    {
      name: `${what.replaceAll(' ', '-')}-recalled`,
      level: 'amber',
      action: `Ask the tracheostomy team now whether the ${what} in place has to be changed.`,
      cause: `${recallWords(recall, zone)}${recall.reason.endsWith('.') ? '' : '.'}`,
      source: 'The recall of the lot, as entered in this hospital',
    },
  ]
}
