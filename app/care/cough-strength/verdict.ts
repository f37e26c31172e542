import type { CareContext, Entry } from '../kind.ts'
import type { Setting, Values } from '../policy.ts'
import { type CoughData, coughChecks } from './schema.ts'
import { coughFlowMouth, coughFlowTube, coughFlowValve } from './settings.ts'

export type MeasuredRoute = Exclude<CoughData['route'], 'not measured'>

const limits: Readonly<Record<MeasuredRoute, Setting<number>>> = {
  mouth: coughFlowMouth,
  valve: coughFlowValve,
  tube: coughFlowTube,
}

/** A peak flow held against the limit of its route. */
export interface CoughVerdict {
  readonly verdict: 'met' | 'not met'
  readonly route: MeasuredRoute
  readonly peakFlow: number
  /** It must be above this (L/min). */
  readonly limit: number
}

/** Whether a peak flow is above the limit of the route it was measured by; undefined when none was measured. */
export function coughVerdict({ route, peakFlow }: CoughData, values: Values): CoughVerdict | undefined {
  if (route === 'not measured' || peakFlow === undefined) return undefined
  const limit = values.of(limits[route])
  return { verdict: peakFlow > limit ? 'met' : 'not met', route, peakFlow, limit }
}

/** The latest measured cough of the stay, with its entry. */
export function coughOf({
  record,
  values,
}: Pick<CareContext, 'record' | 'values'>): (CoughVerdict & { readonly entry: Entry<CoughData> }) | undefined {
  const entry = record.latest(coughChecks, ({ peakFlow }) => peakFlow !== undefined)
  const verdict = entry && coughVerdict(entry.data, values)
  return entry && verdict && { ...verdict, entry }
}
