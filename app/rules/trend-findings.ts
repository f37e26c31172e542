import type { Entry } from '../care/kind.ts'
import type { FindingsTrend, SeenFinding } from '../care/trend.ts'
import { showTime } from '../time/display.ts'
import { addDays, type LocalDay, localDay } from '../time/zone.ts'
import type { TrendsAsked } from './trend-time.ts'

/** Findings by day, as plain data. */
export interface FindingsView {
  readonly shape: 'findings'
  readonly name: string
  readonly title: string
  readonly says: string
  /** Every day of the span, oldest first, with its looks. */
  readonly days: readonly DayOfLooks[]
  /** What was seen at least once: for each day its level, 0 when it was looked for and not seen, null without a look. */
  readonly rows: readonly {
    readonly name: string
    readonly label: string
    readonly levels: readonly (number | null)[]
  }[]
  /** What was looked for and never seen. */
  readonly notSeen: readonly string[]
}

export interface DayOfLooks {
  readonly day: LocalDay
  readonly looks: readonly { readonly entryId: string; readonly time: string }[]
  /** The worst of the day, in words; empty when nothing was found. */
  readonly found: readonly string[]
}

interface Day {
  readonly day: LocalDay
  readonly entries: readonly Entry[]
  readonly worst: ReadonlyMap<string, SeenFinding>
}

/** The matrix of a kind of findings, from its acts of the span. */
export function findingsView(
  // biome-ignore lint/suspicious/noExplicitAny: acts of one kind, asked by the kind that declares the trend
  trend: FindingsTrend<any>,
  entries: readonly Entry[],
  { ward: { zone }, from, to }: TrendsAsked,
): FindingsView {
  const days = daysOf(localDay(from, zone), localDay(to, zone)).map((day): Day => {
    const looks = entries.filter(({ performedAt }) => localDay(performedAt, zone) === day)
    return { day, entries: looks, worst: worstOf(looks.flatMap(({ data }) => trend.seen(data))) }
  })
  const names = Object.keys(trend.rows)
  const isSeen = (name: string) => days.some(({ worst }) => worst.has(name))
  return {
    shape: 'findings',
    name: trend.name,
    title: trend.title,
    says: trend.says,
    days: days.map(({ day, entries: looks, worst }) => ({
      day,
      looks: looks.map(({ id, performedAt }) => ({ entryId: id, time: showTime(performedAt, zone) })),
      found: names.flatMap(name => worst.get(name)?.words ?? []),
    })),
    rows: names.filter(isSeen).map(name => ({
      name,
      label: trend.rows[name] ?? name,
      levels: days.map(({ entries: looks, worst }) => (looks.length === 0 ? null : (worst.get(name)?.level ?? 0))),
    })),
    notSeen: names.filter(name => !isSeen(name)).map(name => trend.rows[name] ?? name),
  }
}

function worstOf(seen: readonly SeenFinding[]): ReadonlyMap<string, SeenFinding> {
  const worst = new Map<string, SeenFinding>()
  for (const finding of seen) {
    if (finding.level > (worst.get(finding.row)?.level ?? 0)) worst.set(finding.row, finding)
  }
  return worst
}

function daysOf(first: LocalDay, last: LocalDay): readonly LocalDay[] {
  const days: LocalDay[] = []
  for (let day = first; day <= last; day = addDays(day, 1)) days.push(day)
  return days
}
