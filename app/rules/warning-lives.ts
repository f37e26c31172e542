import { type AnyCareKind, type CareContext, type Entry, wordsOf } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import type { Warning } from '../care/warning.ts'
import { type WarningAnswerData, warningAnswers } from '../care/warning-answer/schema.ts'
import { amberSeenWithin, answerHolds, redSeenWithin } from '../care/warning-answer/settings.ts'
import { earlier, hours, later, minutes } from '../time/duration.ts'
import { contextBefore } from './context.ts'
import { entryWarnings, standingWarnings } from './warnings.ts'

/** One answer of one person. */
export interface WarningAnswer {
  readonly entryId: string
  readonly by: string
  readonly at: Date
  readonly words?: string
}

/**
 * A warning that stands, from the act that raised it to what people did about it. Computed from entries, never stored, so it can
 * be replayed for any moment; it ends with the finding that takes the warning away.
 */
export interface WarningLife {
  readonly warning: Warning
  /** The latest act that raised it; null where none did, as for a date that has passed. */
  readonly raised: { readonly entryId: string; readonly at: Date; readonly by: string } | null
  readonly seen: WarningAnswer | null
  readonly acted: readonly WarningAnswer[]
  /** Somebody says with a reason that it needs nothing more. */
  readonly settled: WarningAnswer | null
  /** From when it rises on the board, because nobody has seen it; null once somebody has, and for blue ones. */
  readonly risesAt: Date | null
}

/**
 * Warnings that can be answered, by name, with what they ask: those that stand, what the acts of the last hour asked to do at once
 * even where it no longer stands, and what was answered before, for corrections.
 */
export function answerableWarnings(context: CareContext): Readonly<Record<string, string>> {
  const answered = context.record.of(warningAnswers).map(({ data }) => [data.warning, wordsOf(data.warning)])
  const asks = [...urgentOfLate(context), ...standingWarnings(context)].map(({ name, action }) => [
    name,
    `${wordsOf(name)}: ${action}`,
  ])
  return Object.fromEntries([...answered, ...asks])
}

function urgentOfLate(context: CareContext): readonly Warning[] {
  const from = earlier(context.now, hours(1))
  return careKinds.flatMap((kind: AnyCareKind) => {
    const acts: readonly Entry[] = context.record.since(kind, from)
    return acts.flatMap(act =>
      entryWarnings(kind, act.data, contextBefore(act, context)).filter(({ level }) => level === 'red'),
    )
  })
}

/** How many acts of a kind are looked through for the one that raised a warning. */
const MOST_ACTS = 12

/** Every warning that stands, with its life, most urgent first. */
export function warningLives(context: CareContext, kinds: readonly AnyCareKind[] = careKinds): readonly WarningLife[] {
  const standing = standingWarnings(context, kinds)
  if (standing.length === 0) return []
  const said = kinds.map(kind => ({ kind, names: new Set(kind.standing?.(context).map(({ name }) => name)) }))
  return standing.map(warning => {
    const speaking = said.filter(({ names }) => names.has(warning.name)).map(({ kind }) => kind)
    return lifeOf(warning, raiserOf(warning, context, speaking), context)
  })
}

function lifeOf(warning: Warning, raiser: Entry | undefined, context: CareContext): WarningLife {
  const from = raiser?.performedAt ?? earlier(context.now, hours(context.values.of(answerHolds)))
  const given = context.record.since(warningAnswers, from).filter(({ data }) => data.warning === warning.name)
  const [settled] = given.filter(({ data }) => data.answer === 'settled')
  // Whoever acts on it, or settles it, has seen it.
  const first = given.at(-1)
  return {
    warning,
    raised: raiser ? { entryId: raiser.id, at: raiser.performedAt, by: raiser.recordedByName } : null,
    seen: first ? answerOf(first) : null,
    acted: given.filter(({ data }) => data.answer === 'acted on').map(answerOf),
    settled: settled ? answerOf(settled) : null,
    risesAt: first || warning.level === 'blue' ? null : risesAt(warning, raiser, context),
  }
}

function answerOf({ id, recordedByName, performedAt, data }: Entry<WarningAnswerData>): WarningAnswer {
  const words = data.done ?? data.why
  return { entryId: id, by: recordedByName, at: performedAt, ...(words === undefined ? {} : { words }) }
}

/** Counted from when it was written down: before that nobody could have seen it. */
function risesAt({ level }: Warning, raiser: Entry | undefined, { values, now }: CareContext): Date {
  if (!raiser) return now
  return later(raiser.recordedAt, minutes(values.of(level === 'red' ? redSeenWithin : amberSeenWithin)))
}

/** The latest act that raised this very warning, among the last acts of the kinds that speak of it. */
function raiserOf(warning: Warning, context: CareContext, kinds: readonly AnyCareKind[]): Entry | undefined {
  const raisers = kinds.flatMap(kind => lastRaiser(warning, kind, context) ?? [])
  return raisers.toSorted((a, b) => b.performedAt.getTime() - a.performedAt.getTime())[0]
}

function lastRaiser({ name }: Warning, kind: AnyCareKind, context: CareContext): Entry | undefined {
  const acts: readonly Entry[] = context.record.of(kind).slice(0, MOST_ACTS)
  return acts.find(act => entryWarnings(kind, act.data, contextBefore(act, context)).some(own => own.name === name))
}
