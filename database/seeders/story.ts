import type { StomaData } from '#app/care/stoma-and-skin/schema.ts'
import type { Bedside } from './bedside.ts'
import type { Draft } from './draft.ts'
import type { DemoPatient } from './rows.ts'
import type { ShiftStanding } from './shifts.ts'
import type { TubeName } from './tubes.ts'

/** One bed of the demo hospital: who is in it, with which tube, and how their care stands at the moment of seeding. */
export interface BedStory {
  readonly bed: string
  readonly patient: Omit<DemoPatient, 'id'>
  readonly admittedHoursAgo: number
  /** The bed they came to first, when they moved since. */
  readonly movedFrom?: { readonly bed: string; readonly hoursAgo: number }
  /** Absent: an opening without a tube. */
  readonly tube?: FirstTube
  readonly change?: TubeSwap
  readonly removedHoursAgo?: number
  readonly discharged?: { readonly hoursAgo: number; readonly reason: string; readonly note: string }
  readonly secretions: 'thin' | 'moderate' | 'thick'
  readonly stands: Standing
  /** What every check of stoma and skin has found since then. */
  readonly skin?: { readonly sinceHoursAgo: number; readonly found: Partial<StomaData> }
  /** What happened beside the routine. */
  readonly extra?: readonly Happening[]
}

/** The first tube of the stay: in place on arrival since a day, or put in during the stay. */
export interface FirstTube {
  readonly name: TubeName
  readonly inserted: { readonly daysAgo: number; readonly stomaDaysAgo: number } | { readonly hoursAgo: number }
  readonly technique: 'surgical' | 'percutaneous'
  readonly sutures?: true
}

export interface TubeSwap {
  readonly hoursAgo: number
  readonly name: TubeName
  readonly reason: 'routine' | 'first change' | 'smaller' | 'cuff change'
}

/**
 * How far past its due time each clock is at the end of the routine, in hours: -3 is due in three hours, 0.5 half an hour ago.
 * Clocks that do not concern the tube are left out.
 */
export interface Standing {
  readonly inner?: number
  /** Change of a disposable, cleaning of a reusable inner cannula; left out, the last look was one. */
  readonly innerRenewal?: number
  readonly cuff?: number
  /** The patient's own interval in hours, when a plan sets one. */
  readonly cuffEvery?: number
  /** What the last reading found. */
  readonly cuffFound?: 'high' | 'low'
  readonly suction?: number
  readonly dressing?: number
  /** Suction above the cuff; left out, the tube has no port for it. */
  readonly aboveCuff?: number
  readonly stoma: ShiftStanding
  /** Of care that every bed has in time unless it is said here. */
  readonly humidification?: ShiftStanding
  readonly kit?: ShiftStanding
  readonly oralCare?: number
  readonly observations?: number
}

export type Happening = (bedside: Bedside) => readonly Draft[]
