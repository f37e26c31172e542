import type { CareContext, Entry } from '../care/kind.ts'
import type { Measure, MeasureTrend, Reading, TrendBand } from '../care/trend.ts'
import { isTooYoung } from './due-tasks.ts'
import { niceTicks, type Scale } from './plot-scale.ts'
import { changesWithin, contextAt, contextBeforeAct, type TrendsAsked } from './trend-time.ts'
import { policyWords, type WhyValue, whyValue } from './why.ts'

export interface ReadingView {
  readonly at: number
  readonly entryId: string
  readonly values: readonly {
    readonly mark: string
    readonly value: number
    readonly words: string
    /** Null when it is not held against a target. */
    readonly isOut: boolean | null
  }[]
  readonly remark: string
}

/** A target from one moment on to another (ms). */
export interface BandView extends TrendBand {
  readonly from: number
  readonly to: number
  /** `20 to 30 cmH2O` */
  readonly words: string
  /** `Tracheostomy care, version 3`, `this patient's plan` */
  readonly origin: string
}

/** One plot of numbers with its table, as plain data; moments are milliseconds. */
export interface MeasureView {
  readonly shape: 'measure'
  readonly name: string
  readonly title: string
  readonly says: string
  readonly unit: string
  /** Labels of the axis; the first and the last are its ends. */
  readonly ticks: readonly number[]
  readonly marks: readonly { readonly name: string; readonly label: string }[]
  readonly isJoined: boolean
  /** Oldest first. */
  readonly readings: readonly ReadingView[]
  readonly bands: readonly BandView[]
  /** The numbers of the target now, where it is by rule. */
  readonly why: { readonly policy: string; readonly values: readonly WhyValue[] } | null
}

/** A kind that measures, with its acts of the span. */
export interface MeasuredBy {
  // biome-ignore lint/suspicious/noExplicitAny: acts of one kind, asked by the kind that declares the trend
  readonly trend: MeasureTrend<any>
  readonly entries: readonly Entry[]
}

/** The plot of one measure, from every kind that measures it. */
export function measureView(measure: Measure, by: readonly MeasuredBy[], asked: TrendsAsked): MeasureView {
  const { ward, to } = asked
  const bands = bandsOf(measure, asked)
  const now = contextAt(asked, to)
  const isJudged = measure.settings.length > 0 && !isTooYoung(now)
  return {
    shape: 'measure',
    name: measure.name,
    title: measure.title,
    says: measure.says,
    unit: measure.unit(ward),
    ticks: niceTicks(scaleOf(measure.range(ward), bands)),
    marks: Object.entries(measure.marks).map(([name, label]) => ({ name, label })),
    isJoined: measure.isJoined,
    readings: by
      .flatMap(({ trend, entries }) => entries.flatMap(entry => readingView(trend, entry, asked)))
      .toSorted((a, b) => a.at - b.at),
    bands,
    why: isJudged
      ? { policy: policyWords(now.values.policy), values: measure.settings.map(setting => whyValue(setting, now)) }
      : null,
  }
}

/** The range of the measure, and of every target in it. */
function scaleOf({ from, to }: Scale, bands: readonly BandView[]): Scale {
  return {
    from: Math.min(from, ...bands.map(({ lower }) => lower)),
    to: Math.max(to, ...bands.map(({ lower, upper = lower }) => upper)),
  }
}

function readingView(
  { measure, reading }: MeasuredBy['trend'],
  entry: Entry,
  asked: TrendsAsked,
): readonly ReadingView[] {
  const before = contextBeforeAct(asked, entry)
  const found: Reading | undefined = reading(entry.data, before)
  if (!found) return []
  const isUnjudged = measure.settings.length > 0 && isTooYoung(before)
  return [
    {
      at: entry.performedAt.getTime(),
      entryId: entry.id,
      values: found.values.map(({ mark, value, isOut }) => ({
        mark,
        value,
        words: measure.show(value, asked.ward),
        isOut: isUnjudged ? null : (isOut ?? null),
      })),
      remark: isUnjudged ? '' : (found.remark ?? ''),
    },
  ]
}

/** The target of a measure over the span, a part for each time that it was another. */
function bandsOf(measure: Measure, asked: TrendsAsked): readonly BandView[] {
  const moments = changesWithin(asked)
  const bands: BandView[] = []
  for (const [index, at] of moments.entries()) {
    const span = { from: at.getTime(), to: (moments[index + 1] ?? asked.to).getTime() }
    const part = bandAt(measure, contextAt(asked, at), span)
    const last = bands.at(-1)
    const isSame = last?.to === span.from && last.words === part?.words && last.origin === part.origin
    if (last && isSame) bands[bands.length - 1] = { ...last, to: span.to }
    else if (part) bands.push(part)
  }
  return bands
}

function bandAt(measure: Measure, context: CareContext, span: { from: number; to: number }): BandView | undefined {
  if (measure.settings.length > 0 && isTooYoung(context)) return undefined
  const band = measure.band?.(context)
  return band && { ...span, ...band, words: bandWords(measure, band, context), origin: originOf(measure, context) }
}

function bandWords({ show, unit }: Measure, { lower, upper }: TrendBand, { ward }: CareContext): string {
  if (upper === undefined) return `at least ${show(lower, ward)}`
  // The unit is said once: `20 to 30 cmH2O`.
  const low = show(lower, ward)
  const shared = unit(ward)
  return `${low.endsWith(shared) ? low.slice(0, -shared.length).trim() : low} to ${show(upper, ward)}`
}

function originOf({ settings, bandSays = '' }: Measure, { values }: CareContext): string {
  if (settings.length === 0) return bandSays
  const personal = settings.flatMap(setting => values.personal(setting) ?? [])[0]
  if (personal) return `This patient's plan: ${personal.reason}`
  const { name, version } = values.policy
  return `${name}, version ${version}`
}
