import type { z } from 'zod'
import type { CataloguedItem } from './catalogued-item.ts'
import type { Chapter } from './chapters.ts'
import type { Clock } from './clock.ts'
import type { BedMove, PatientFacts, WardFacts } from './facts.ts'
import type { FormProblem, KnownNames } from './form-problem.ts'
import type { Gauge } from './gauge.ts'
import type { Lane } from './lanes.ts'
import type { AnySetting, PolicyOverTime, Values } from './policy.ts'
import type { PolicyCheck } from './policy-check.ts'
import type { RunningAct } from './running-act.ts'
import type { SigningNeeds } from './signing-needs.ts'
import type { PlannedUse, Used } from './supply.ts'
import type { Trend } from './trend.ts'
import type { Warning } from './warning.ts'

export type { BedMove, PatientFacts, WardFacts } from './facts.ts'

/** What the act needs beyond charting care in general. */
export type ChartingAct = 'chart care' | 'set care plans'

/** One charted act. Never changed: a correction or a retraction is a new entry that supersedes this one. */
export interface Entry<Data = unknown> {
  /** UUIDv7, minted when the form was opened: the same id twice is the same act. */
  readonly id: string
  readonly stayId: string
  /** Position in the stay's chart, from 1, without gaps, in the order of recording. */
  readonly number: number
  readonly kind: string
  /** When the care was done (UTC). Clocks use this. */
  readonly performedAt: Date
  /** When it was written down (UTC). */
  readonly recordedAt: Date
  readonly recordedById: string
  readonly recordedByName: string
  readonly recordedRole: string
  readonly witnessName: string | null
  readonly supersedesId: string | null
  /** Why it corrects or retracts another, or why it was written more than a day late. */
  readonly reason: string | null
  readonly status: 'final' | 'retracted'
  readonly data: Data
}

/** An entry as stored: payload not read yet. */
export type StoredEntry = Omit<Entry, 'data'> & { readonly version: number; readonly raw: unknown }

/** One patient's effective entries, asked by kind object: a kind that is not imported cannot be asked for. */
export interface PatientRecord {
  readonly admittedAt: Date
  /** From bed to bed after the first one, oldest first. */
  readonly moves: readonly BedMove[]
  readonly patient: PatientFacts
  /** Effective entries of one kind, latest performed first. */
  of<K extends AnyCharted>(kind: K): readonly Entry<DataOf<K>>[]
  /** The latest effective entry of a kind, or the latest that satisfies `where`. */
  latest<K extends AnyCharted>(
    kind: K,
    where?: (data: DataOf<K>, entry: Entry<DataOf<K>>) => boolean,
  ): Entry<DataOf<K>> | undefined
  /** Effective entries performed at or after `from`, latest first. */
  since<K extends AnyCharted>(kind: K, from: Date): readonly Entry<DataOf<K>>[]
}

/** Everything a rule decides from. The same context gives the same answer. */
export interface CareContext {
  readonly record: PatientRecord
  readonly values: Values
  readonly ward: WardFacts
  readonly now: Date
  /** The policy of the ward at any moment of the past, where more than one is known. */
  readonly policyAt?: PolicyOverTime
}

/** A kind of due care: one clock, in words and in code. */
export interface TaskRule {
  /** `cuff-pressure-check`; deferrals refer to it. The title is these words. */
  readonly name: string
  /** Airway care comes first when seriously overdue. */
  readonly airway: boolean
  /** The numbers it reads, for "why" and for the policy page. */
  readonly settings: readonly AnySetting[]
  /** Answers that the chart form starts with when opened from this task. */
  readonly opensWith?: Readonly<Record<string, string>>
  /** The rule in words, with the values in force. */
  says(context: CareContext): string
  clock(context: CareContext): Clock
}

/** What is stored of a kind: enough to ask a record for its entries. Kept apart from rules, so that rules of two kinds can ask for each other's entries. */
export interface Charted<Slug extends string, Schema extends z.ZodObject> {
  /** Folder, URL segment and stored name; never renamed after release. */
  readonly slug: Slug
  /** Validation, storage shape and form fields in one declaration. */
  readonly schema: Schema
  /** upgrades[n] turns payload version n+1 into n+2. */
  readonly upgrades?: readonly ((old: never) => unknown)[]
  /** What the act takes from the stock. `before`: the record before the act, where it is known; without it less is identified. */
  uses?(data: z.output<Schema>, before: PatientRecord | null): readonly Used[]
}

export interface CareKind<Slug extends string, Schema extends z.ZodObject>
  extends Charted<Slug, Schema>,
    SigningNeeds<z.output<Schema>> {
  readonly title: string
  /** The words on the button: "Chart pressure". */
  readonly chartWords: string
  readonly lane: Lane
  readonly chapter: Chapter
  /** Drive tests and demo data; each must pass the schema. */
  readonly examples: readonly z.output<Schema>[]
  /** The sentence on the timeline and before charting. */
  summary(data: z.output<Schema>): string
  readonly act?: ChartingAct
  /** Charted by doing it on a page of its own, at this address below the patient's, and not on a form. */
  readonly page?: string
  /** What must be read wherever this is charted. Short sentences. */
  readonly cautions?: readonly string[]
  readonly settings?: readonly AnySetting[]
  /** Settings that must fit together, held against a policy before it is published. */
  readonly checks?: readonly PolicyCheck[]
  readonly tasks?: readonly TaskRule[]
  /** What the record already says, filled in as the form opens: facts, never findings. */
  startsWith?(context: CareContext): Readonly<Record<string, unknown>>
  /** The usual act as one tap; it leaves out what must be looked at each time. */
  usual?(
    context: CareContext,
  ): { readonly words: string; readonly answers: Readonly<Record<string, unknown>> } | undefined
  /** What runs now. */
  running?(context: CareContext): readonly RunningAct[]
  /**
   * Options that the form of this patient does not offer, by field; a field with none left is not asked. Only the form: what was
   * found so is taken and warned of.
   */
  notOffered?(context: CareContext): Readonly<Record<string, readonly string[]>>
  gauges?(context: CareContext): readonly Gauge[]
  /** What the page of trends shows of these acts. */
  readonly trends?: readonly Trend<z.output<Schema>>[]
  /** Warnings about this act; `context.record` does not hold it yet, `context.now` is when it was done. */
  warnings?(data: z.output<Schema>, context: CareContext): readonly Warning[]
  /** Warnings that stand for as long as the record says so. */
  standing?(context: CareContext): readonly Warning[]
  /**
   * Mistakes of this form that only the record or the registry shows, such as a value outside the range of the chosen setting.
   * For plans and orders; never clinical judgement, and never a refusal to record care that was given.
   */
  problems?(data: z.output<Schema>, context: CareContext, known: KnownNames): readonly FormProblem[]
  /** What the catalogue answers as an act with a scanned item is charted; `context`: the moment before it. */
  catalogued?(data: z.output<Schema>, context: CareContext, item: CataloguedItem): Partial<z.output<Schema>>
  /** What this patient is going to take, by the intervals in force. */
  plannedUse?(context: CareContext): readonly PlannedUse[]
  /** A deferral is not care done: the strip shows it with a note instead of a dot. */
  readonly marksAs?: 'deferred'
  /** Drawn as a triangle instead of a dot; `context` is that of the moment before the act, as for `warnings`. */
  outOfRange?(data: z.output<Schema>, context: CareContext): boolean
}

// biome-ignore lint/suspicious/noExplicitAny: the one place where a payload type is erased; records are asked by kind object
export type AnyCareKind = CareKind<string, any>

export type AnyCharted = Charted<string, z.ZodObject>

export type DataOf<K extends AnyCharted> = z.output<K['schema']>

/** Declares what is stored of a kind. */
export function charted<const Slug extends string, S extends z.ZodObject>(what: Charted<Slug, S>): Charted<Slug, S> {
  return what
}

/** Declares a kind of care. Keeps the literal slug and the payload type. */
export function careKind<const Slug extends string, Schema extends z.ZodObject>(
  kind: CareKind<Slug, Schema>,
): CareKind<Slug, Schema> {
  return kind
}

/** `inner-cannula-change` -> `Inner cannula change`, `hme-change` -> `HME change`: names of tasks and settings are their titles. */
export function wordsOf(name: string): string {
  const words = name.replaceAll('-', ' ').replace(/\bhme\b/, 'HME')
  return words.charAt(0).toUpperCase() + words.slice(1)
}
