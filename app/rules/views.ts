import { type Chapter, chapters } from '../care/chapters.ts'
import {
  type AnyCareKind,
  type CareContext,
  type ChartingAct,
  type Entry,
  type PatientRecord,
  wordsOf,
} from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import type { Lane } from '../care/lanes.ts'
import { dwellNotice, dwellStrongNotice } from '../care/tube-change/dwell-settings.ts'
import { byDate } from '../care/tube-change/tasks.ts'
import { dwellLimit, insertedOn, type TubeEntry, tubeInPlace, tubeWords } from '../care/tube-change/tube.ts'
import { type DwellStage, daysLeft, dwellDay, dwellStage } from '../clinical/dwell.ts'
import { localDay } from '../time/zone.ts'
import { contextBefore } from './context.ts'
import { type DueTask, dueTasks, isTooYoung } from './due-tasks.ts'
import { type RunningView, runningViews } from './running.ts'
import { type StandingView, standingViews } from './standing-views.ts'
import { statusOf, type TaskStatus } from './status.ts'

/*
 * What boards show, as plain data: moments are milliseconds, so that a page and its data refresh carry the same
 * shape, and statuses are left to `liveStatus`, so that it stays true as time passes without asking the server.
 */

export interface TaskView {
  readonly kind: string
  readonly name: string
  readonly title: string
  readonly lane: Lane
  readonly airway: boolean
  readonly chartWords: string
  readonly opensWith?: Readonly<Record<string, string>>
  readonly window?: {
    readonly dueAt: number
    readonly soonAt: number
    readonly opensAt: number
    readonly closesAt: number
    readonly seriousAt: number
  }
  readonly byDay?: string
  readonly because?: string
  readonly deferredUntil?: number
}

export interface MarkView {
  readonly at: number
  readonly kind: string
  readonly lane: Lane
  readonly shape: 'done' | 'out of range' | 'deferred'
}

export interface TubeView {
  readonly words: string
  readonly day: number
  /** Null, like the days left, where no rule is for this patient. */
  readonly limit: number | null
  readonly daysLeft: number | null
  readonly stage: DwellStage
  /** The task that its limit makes due. */
  readonly task: string
}

/** One patient's care on their own page. */
export interface CareView {
  readonly tasks: readonly TaskView[]
  readonly marks: readonly MarkView[]
  /** Trials and the like that have begun and not ended. */
  readonly running: readonly RunningView[]
  readonly warnings: readonly StandingView[]
  readonly tube?: TubeView
}

/** Due care, marks since `marksFrom`, standing warnings and the tube of one patient, as plain data. */
export function careView(context: CareContext, marksFrom: Date): CareView {
  const tube = tubeInPlace(context.record)
  return {
    tasks: dueTasks(context).map(taskView),
    marks: marksSince(context, marksFrom),
    running: runningViews(context),
    warnings: standingViews(context),
    ...(tube ? { tube: tubeView(tube, context) } : {}),
  }
}

/** A due task as plain data. */
export function taskView(task: DueTask): TaskView {
  const { kind, rule, title, window, byDay, because, deferral } = task
  return {
    kind: kind.slug,
    name: rule.name,
    title,
    lane: kind.lane,
    airway: rule.airway,
    chartWords: kind.chartWords,
    ...(rule.opensWith ? { opensWith: rule.opensWith } : {}),
    ...(window ? { window: inMilliseconds(window) } : {}),
    ...(byDay ? { byDay } : {}),
    ...(because ? { because } : {}),
    ...(deferral ? { deferredUntil: deferral.until.getTime() } : {}),
  }
}

function inMilliseconds(window: NonNullable<DueTask['window']>) {
  return {
    dueAt: window.dueAt.getTime(),
    soonAt: window.soonAt.getTime(),
    opensAt: window.opensAt.getTime(),
    closesAt: window.closesAt.getTime(),
    seriousAt: window.seriousAt.getTime(),
  }
}

/** How a task stands at `now` (ms). Without a window it is suspended. */
export function liveStatus(task: Pick<TaskView, 'window' | 'deferredUntil'>, now: number): TaskStatus {
  if (!task.window) return 'suspended'
  if (task.deferredUntil !== undefined && now < task.deferredUntil) return 'deferred'
  return statusOf(task.window, now)
}

/** How long a tube has been in, against its limit. */
export function tubeView(tube: TubeEntry, context: CareContext): TubeView {
  const on = insertedOn(tube, context)
  const today = localDay(context.now, context.ward.zone)
  const about = { words: tubeWords(tube.data), day: dwellDay(on, today), task: byDate.name }
  if (isTooYoung(context)) return { ...about, limit: null, daysLeft: null, stage: 'quiet' }
  const { days } = dwellLimit(tube, context)
  const left = daysLeft(on, days, today)
  const { values } = context
  const stage = dwellStage(left, { noticeDays: values.of(dwellNotice), strongDays: values.of(dwellStrongNotice) })
  return { ...about, limit: days, daysLeft: left, stage }
}

/** What was charted since `from`, oldest first, as marks on a strip. */
export function marksSince(
  context: CareContext,
  from: Date,
  kinds: readonly AnyCareKind[] = careKinds,
): readonly MarkView[] {
  return kinds
    .flatMap(kind => entriesSince(context.record, kind, from).map(entry => mark(kind, entry, context)))
    .toSorted((a, b) => a.at - b.at)
}

function entriesSince(record: PatientRecord, kind: AnyCareKind, from: Date): readonly Entry[] {
  return record.since(kind, from)
}

function mark(kind: AnyCareKind, entry: Entry, context: CareContext): MarkView {
  const outside = isOutOfRange(kind, entry, context)
  const shape = outside ? 'out of range' : kind.marksAs === 'deferred' ? 'deferred' : 'done'
  return { at: entry.performedAt.getTime(), kind: kind.slug, lane: kind.lane, shape }
}

/** Whether an act on record is drawn as out of range: judged by tube, cuff and own values of its time. */
export function isOutOfRange(kind: AnyCareKind, entry: Entry, context: CareContext): boolean {
  const before = contextBefore(entry, context)
  return !isTooYoung(before) && kind.outOfRange?.(entry.data, before) === true
}

/** `Cuff pressure`: the title of a kind by its stored name, or that name in words. */
export function kindTitle(slug: string): string {
  return careKinds.find(kind => kind.slug === slug)?.title ?? wordsOf(slug)
}

/** The kinds of a chapter that somebody may chart, for links. */
export interface ChartableKinds {
  readonly chapter: Chapter
  readonly kinds: readonly { readonly slug: string; readonly title: string }[]
}

/** What somebody may chart, by chapter; without chapters of which they may chart nothing. */
export function chartableKinds(may: (act: ChartingAct) => boolean): readonly ChartableKinds[] {
  const own = careKinds.filter(kind => may(kind.act ?? 'chart care'))
  return chapters
    .map(chapter => ({
      chapter,
      kinds: own.filter(kind => kind.chapter === chapter).map(({ slug, title }) => ({ slug, title })),
    }))
    .filter(({ kinds }) => kinds.length > 0)
}
