import type { Duration } from '../time/duration.ts'
import type { CareContext, PatientRecord, WardFacts } from './kind.ts'
import type { AnySetting } from './policy.ts'

/** Lowest and highest of a plot or of a target, in the unit of the plot. A target without an upper end is open. */
export interface TrendBand {
  readonly lower: number
  readonly upper?: number
}

/**
 * Something measured over time, whoever charts it: kinds that measure the same name the same object, and share its plot.
 * Numbers are in the unit that the ward reads.
 */
export interface Measure {
  readonly name: string
  readonly title: string
  /** What is drawn and what it is held against, in a sentence or two. */
  readonly says: string
  readonly unit: (ward: WardFacts) => string
  /** What the plot reaches over at least; a value beyond it is drawn at the edge and said. */
  readonly range: (ward: WardFacts) => { readonly from: number; readonly to: number }
  /** The sorts of value in one reading: the first is drawn hollow, the second full. */
  readonly marks: Readonly<Record<string, string>>
  /** Whether one reading is joined with the next. */
  readonly isJoined: boolean
  /** The numbers of the target, where it is by rule; without any it is a fact of the patient. */
  readonly settings: readonly AnySetting[]
  /** The target in force at the moment of `context`. */
  readonly band?: (context: CareContext) => TrendBand | undefined
  /** Said of the target, where it is not by rule: `as prescribed now`. */
  readonly bandSays?: string
  readonly show: (value: number, ward: WardFacts) => string
}

export interface ReadingValue {
  /** A name of `marks`. */
  readonly mark: string
  readonly value: number
  /** Absent when it is not held against a target. */
  readonly isOut?: boolean
}

/** The numbers of one act, and what its table row says beside them. */
export interface Reading {
  readonly values: readonly ReadingValue[]
  readonly remark?: string
}

export interface MeasureTrend<Data> {
  readonly shape: 'measure'
  readonly measure: Measure
  /** What an act measured; `before` is the moment before it, under the policy and the own values of that moment. */
  readonly reading: (data: Data, before: CareContext) => Reading | undefined
}

/** Something seen at a look, from 1 (little, or simply there) to 3 (most). */
export interface SeenFinding {
  readonly row: string
  readonly level: 1 | 2 | 3
  readonly words: string
}

/** What looks found, as a row for each finding and a column for each day. */
export interface FindingsTrend<Data> {
  readonly shape: 'findings'
  readonly name: string
  readonly title: string
  readonly says: string
  /** Short names of what is looked for, in their order. */
  readonly rows: Readonly<Record<string, string>>
  readonly seen: (data: Data) => readonly SeenFinding[]
}

/** How something that lasts came to its end, which decides how it is drawn. */
export type LengthEnd = 'reached' | 'failed' | 'short' | 'running' | 'not judged'

export interface TrendLength {
  /** A name of `groups`. */
  readonly group: string
  /** The act that began it. */
  readonly entryId: string
  readonly startedAt: Date
  readonly endedAt?: Date
  /** How long it should last, by the rule of its time. */
  readonly target?: Duration
  readonly end: LengthEnd
  /** The same in a word or two. */
  readonly verdict: string
  /** Why it ended, in words. */
  readonly because?: string
}

/** A record with what rules decided from at any moment of it. */
export interface RecordInTime {
  readonly record: PatientRecord
  readonly now: Date
  readonly at: (moment: Date) => CareContext
}

/** How long something lasted each time, by sort. */
export interface LengthsTrend {
  readonly shape: 'lengths'
  readonly name: string
  readonly title: string
  readonly says: string
  readonly groups: Readonly<Record<string, string>>
  readonly lengths: (given: RecordInTime) => readonly TrendLength[]
}

/** What a kind shows of its acts over time. */
export type Trend<Data> = MeasureTrend<Data> | FindingsTrend<Data> | LengthsTrend
