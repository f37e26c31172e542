import type { Clock, DueWindow } from '../care/clock.ts'
import { type DeferralData, deferrals, deferredUntil } from '../care/deferral/schema.ts'
import { adultAge } from '../care/general-settings.ts'
import { type AnyCareKind, type CareContext, type Entry, type TaskRule, wordsOf } from '../care/kind.ts'
import { careTasks, type KindTask } from '../care/kinds.ts'
import { ageOn } from '../time/display.ts'
import { type LocalDay, localDay } from '../time/zone.ts'
import { statusOf, type TaskStatus } from './status.ts'

/** One due care of one patient: what charts it, how it stands, and from which act its clock counts. */
export interface DueTask {
  readonly kind: AnyCareKind
  readonly rule: TaskRule
  readonly title: string
  readonly status: TaskStatus
  /** Absent while suspended. Of a deferred task: the window from the new time on. */
  readonly window?: DueWindow
  readonly last?: Entry
  /** The moment that its clock counts from; absent while suspended. */
  readonly from?: Date
  /** Why it is due sooner than usual, or why it is suspended. */
  readonly because?: string
  readonly byDay?: LocalDay
  readonly deferral?: { readonly entry: Entry; readonly until: Date }
}

/**
 * What is due for one patient, most pressing first.
 * Pure: the same context gives the same tasks. Rules that do not concern the patient are left out, and
 * nothing is computed for somebody under the age from which the policy's rules apply.
 */
export function dueTasks(context: CareContext, tasks: readonly KindTask[] = careTasks): readonly DueTask[] {
  if (isTooYoung(context)) return []
  return tasks.flatMap(task => dueTask(task, context)).toSorted(byPress)
}

/** Whether nothing may be computed: the person is younger than the age for adults, and no rule set for children judges them. */
export function isTooYoung({ record, values, ward, now }: CareContext): boolean {
  if (values.policy.ruleSet === 'children') return false
  return ageOn(record.patient.bornOn, localDay(now, ward.zone)) < values.of(adultAge)
}

function dueTask({ kind, rule }: KindTask, context: CareContext): readonly DueTask[] {
  const clock = rule.clock(context)
  const about = { kind, rule, title: wordsOf(rule.name) }
  if (clock.state === 'none') return []
  if (clock.state === 'suspended') return [{ ...about, status: 'suspended', because: clock.because }]
  return [{ ...about, ...running(rule, clock, context) }]
}

function running(rule: TaskRule, clock: Clock & { state: 'running' }, context: CareContext) {
  const known = {
    from: clock.from,
    ...(clock.last ? { last: clock.last } : {}),
    ...(clock.because === undefined ? {} : { because: clock.because }),
    ...(clock.byDay === undefined ? {} : { byDay: clock.byDay }),
  }
  const { window, deferral } = windowWithDeferral(rule, clock, context)
  if (!deferral) return { ...known, window, status: statusOf(window, context.now) }
  const status: TaskStatus = context.now < deferral.until ? 'deferred' : statusOf(window, context.now)
  return { ...known, window, status, deferral }
}

/** The window of a clock that runs, moved by a deferral that stands. */
export function windowWithDeferral(
  rule: TaskRule,
  clock: Clock & { state: 'running' },
  context: CareContext,
): { readonly window: DueWindow; readonly deferral?: { readonly entry: Entry; readonly until: Date } } {
  const entry = deferralOf(rule.name, clock, context)
  if (!entry) return { window: clock.window }
  const until = deferredUntil(entry)
  return { window: movedTo(until, clock), deferral: { entry, until } }
}

/** The latest deferral of a task, unless the care was done after it, or something asked for it anew. */
function deferralOf(
  name: string,
  { last, from }: Clock & { state: 'running' },
  { record, now }: CareContext,
): Entry<DeferralData> | undefined {
  const entry = record.latest(deferrals, (data, { performedAt }) => data.task === name && performedAt <= now)
  if (!entry || from > entry.performedAt || (last && last.performedAt > entry.performedAt)) return undefined
  return entry
}

/**
 * The same window from the deferral's new time on: no tolerance before it, the same after. A new time before the due time moves
 * nothing, and a limit by date has no tolerance to take along.
 */
function movedTo(until: Date, { window, byDay }: Clock & { state: 'running' }): DueWindow {
  if (until <= window.dueAt) return window
  const by = byDay === undefined ? until.getTime() - window.dueAt.getTime() : 0
  const after = (moment: Date) => new Date(Math.max(until.getTime(), moment.getTime() + by))
  return {
    dueAt: until,
    soonAt: until,
    opensAt: until,
    closesAt: after(window.closesAt),
    seriousAt: after(window.seriousAt),
  }
}

const press: Readonly<Record<TaskStatus, number>> = {
  'seriously overdue': 1,
  overdue: 2,
  due: 3,
  'due soon': 4,
  upcoming: 5,
  deferred: 6,
  suspended: 7,
}

/** How pressing a status is, 0 first; seriously overdue airway care before all other (domain 3.0). */
export function pressOf(status: TaskStatus, airway: boolean): number {
  return status === 'seriously overdue' && airway ? 0 : press[status]
}

function byPress(a: DueTask, b: DueTask): number {
  return (
    pressOf(a.status, a.rule.airway) - pressOf(b.status, b.rule.airway) ||
    (a.window?.closesAt.getTime() ?? 0) - (b.window?.closesAt.getTime() ?? 0) ||
    a.title.localeCompare(b.title)
  )
}
