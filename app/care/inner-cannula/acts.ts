import type { Entry, PatientRecord } from '../kind.ts'
import { type TubeEntry, tubeInPlace } from '../tube-change/tube.ts'
import { type InnerCannulaData, innerCannulaActs } from './schema.ts'

export type InnerCannulaEntry = Entry<InnerCannulaData>

/** Acts on the inner cannula that is in the tube in place, latest first; none while no tube is in. */
export function actsOnTube(record: PatientRecord): readonly InnerCannulaEntry[] {
  const tube = tubeInPlace(record)
  return tube ? record.since(innerCannulaActs, tube.performedAt).filter(({ data }) => data.act !== 'other only') : []
}

/** Half of the lumen or more was gone. */
export function isNarrowed({ condition }: InnerCannulaData): boolean {
  return condition === 'heavy' || condition === 'blocked'
}

/** Part of the lumen was gone, or all of it. */
export function isPartlyBlocked(data: InnerCannulaData): boolean {
  return data.condition === 'moderate' || isNarrowed(data)
}

/** Whether the act says how the cannula looked: only then does it follow or lift an earlier finding. */
export function wasSeen({ condition }: InnerCannulaData): boolean {
  return condition !== undefined && condition !== 'not seen'
}

/** Taken out, looked at, and a patent cannula is back in. A narrowed one that was put back as it was does not count. */
export function isInspection(data: InnerCannulaData): boolean {
  return data.act !== 'unable' && wasSeen(data) && !(data.act === 'inspected' && isNarrowed(data))
}

/** A new cannula is in: what a disposable one needs. */
export function isRenewal({ act }: InnerCannulaData): boolean {
  return act === 'replaced'
}

/** A clean cannula is in: what a reusable one needs. */
export function isCleaning({ act }: InnerCannulaData): boolean {
  return act === 'cleaned' || act === 'swapped' || act === 'replaced'
}

/** The tube was left without an inner cannula. */
export function isLeftOut({ act, whyUnable }: InnerCannulaData): boolean {
  return act === 'unable' && (whyUnable === 'not back' || whyUnable === 'none to fit')
}

/**
 * Whether the cannula in place is thrown away or cleaned. A dual tube that went in without one takes it from the
 * first act that fitted one; undefined until then.
 */
export function cannulaType(tube: TubeEntry, record: PatientRecord): 'disposable' | 'reusable' | undefined {
  if (tube.data.innerCannula && tube.data.innerCannula !== 'none') return tube.data.innerCannula
  const fitted = actsOnTube(record).findLast(({ data }) => isCleaning(data))
  return fitted && (isRenewal(fitted.data) ? 'disposable' : 'reusable')
}
