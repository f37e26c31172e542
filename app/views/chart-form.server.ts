import { v7 as uuidv7 } from 'uuid'
import { takeDraft } from '#app/auth/draft.server.ts'
import { authorOf, type CurrentUser } from '#app/auth/permissions.ts'
import type { NameLists } from '#app/care/field-meta.ts'
import { lateReasonAfter } from '#app/care/general-settings.ts'
import type { AnyCareKind, CareContext } from '#app/care/kind.ts'
import type { FormSigner } from '#app/charting/chart-answer.ts'
import { type Typed, typedFrom, typedIn } from '#app/charting/chart-form.ts'
import { restored } from '#app/charting/drafts.ts'
import type { Calendar } from '#app/charting/performed-at.ts'
import { liveTasks } from '#app/rules/board.ts'
import { dueTasks, isTooYoung } from '#app/rules/due-tasks.ts'
import type { TaskStatus } from '#app/rules/status.ts'
import { taskView } from '#app/rules/views.ts'
import { answerableWarnings } from '#app/rules/warning-lives.ts'
import { standingWarnings } from '#app/rules/warnings.ts'
import {
  type ExplainedGauge,
  type ExplainedWarning,
  explained,
  explainedGauges,
  whyStanding,
} from '#app/rules/why-warnings.ts'
import { standingWords } from '#app/rules/words.ts'
import { showDuration } from '#app/time/display.ts'
import { hours, since } from '#app/time/duration.ts'
import { daysBetween, localDay } from '#app/time/zone.ts'
import { fieldsWith, personalSettings, witnessesFor } from './chart-lists.server.ts'
import { type SigningAsk, signingAsk } from './chart-signing.server.ts'
import type { PatientCare } from './patient-context.server.ts'

/** A chart form as it opens. */
export interface ChartFormView {
  readonly kind: string
  /** Minted here: the same form sent twice is one act. */
  readonly id: string
  readonly signer: FormSigner
  readonly signing: SigningAsk
  readonly calendar: Calendar
  readonly typed: Typed
  /** The usual act in words, with its answers. */
  readonly usual: { readonly words: string; readonly answers: Typed } | null
  readonly gauges: readonly ExplainedGauge[]
  readonly notOffered: Readonly<Record<string, readonly string[]>>
  readonly lists: NameLists
  readonly units: Readonly<Record<string, string>>
  readonly witnesses: Readonly<Record<string, string>>
  readonly warnings: readonly ExplainedWarning[]
  /** Who charted the same just now. */
  readonly recently: string | null
  /** How the care stands: `36 min late`. */
  readonly due: { readonly says: string; readonly status: TaskStatus } | null
  readonly isRestored: boolean
  readonly reasonAfterHours: number
  readonly daysBack: number
}

/** For whom a form opens, on which patient, at which address. */
export interface Opening {
  readonly care: PatientCare
  readonly user: CurrentUser
  readonly url: URL
  readonly now: Date
  readonly signedInAt: Date
}

const MOST_DAYS_BACK = 60

/** Everything the form of a kind opens with. Hands out the draft that waited for this person on this page. */
export async function chartForm(kind: AnyCareKind, opening: Opening): Promise<ChartFormView> {
  const { care, user, url, now } = opening
  const { context } = care
  const draft = await takeDraft(user.id, url.pathname)
  const usual = context && (kind.usual?.(context) ?? null)
  const usualTyped = usual && { words: usual.words, answers: typedFrom(usual.answers) }
  const opened = {
    ...openingAnswers(kind, context, url),
    ...(url.searchParams.has('usual') ? usualTyped?.answers : {}),
    ...lastMoment(care),
    ...scannedAnswers(kind, url),
  }
  return {
    ...(await frameOf(kind, opening)),
    id: uuidv7(),
    typed: draft ? restored(kind, draft, care.ward.zone) : opened,
    isRestored: draft !== null,
    usual: usualTyped,
    witnesses: await witnessesFor(care.ward.id, user),
    warnings: context ? warningsFor(kind, context) : [],
    recently: context && recentlyWords(kind, context, user),
    due: context && dueWords(kind, context, url, now),
  }
}

/** What every form of a kind is drawn with, whatever it opens with. */
export async function frameOf(kind: AnyCareKind, { care, user, now, signedInAt }: Omit<Opening, 'url'>) {
  const { context, ward } = care
  const { label, units } = personalSettings(context)
  const began = localDay(care.record.stay.admittedAt, ward.zone)
  return {
    kind: kind.slug,
    signer: signerOf(user),
    signing: await signingAsk(kind, { user, context, now, signedInAt, zone: ward.zone }),
    calendar: calendarOf(care, now),
    gauges: context && !isTooYoung(context) ? explainedGauges(kind, context) : [],
    notOffered: context ? (kind.notOffered?.(context) ?? {}) : {},
    lists: {
      task: context ? deferrable(context) : {},
      setting: label,
      warning: context ? answerableWarnings(context) : {},
    },
    units,
    reasonAfterHours: context?.values.of(lateReasonAfter) ?? lateReasonAfter.default,
    daysBack: Math.min(MOST_DAYS_BACK, Math.max(1, daysBetween(began, localDay(now, ward.zone)))),
  }
}

/** Who signs, as a form carries it. */
export function signerOf(user: CurrentUser): FormSigner {
  return { ...authorOf(user), name: user.name }
}

/** What the answer to "when" is held against. */
export function calendarOf({ record: { stay }, ward }: PatientCare, now: Date): Calendar {
  return { zone: ward.zone, now, beganAt: stay.admittedAt, endedAt: stay.dischargedAt }
}

/** What the scan page found, where it leads here; checked like everything else once the form is sent. */
export function scannedAnswers(kind: AnyCareKind, url: URL): Typed {
  const sent = new FormData()
  for (const [name, value] of url.searchParams) if (name.startsWith('care.')) sent.append(name, value)
  return typedIn(kind, sent)
}

/** Nothing is done "now" for a patient who has left. */
function lastMoment({ record: { stay }, ward }: PatientCare): Typed {
  return stay.dischargedAt === null ? {} : { when: ['other'], day: [localDay(stay.dischargedAt, ward.zone)] }
}

/** Facts of the record, then what the task or the running act that was followed here already says. */
function openingAnswers(kind: AnyCareKind, context: CareContext | null, url: URL): Typed {
  const name = url.searchParams.get('task') ?? ''
  const rule = kind.tasks?.find(task => task.name === name)
  const running = context && kind.running?.(context).find(act => act.name === url.searchParams.get('running'))
  const named = context && Object.hasOwn(deferrable(context), name) ? fieldsWith(kind, 'task') : []
  const warning = url.searchParams.get('warning') ?? ''
  const warned = context && Object.hasOwn(answerableWarnings(context), warning) ? fieldsWith(kind, 'warning') : []
  return {
    ...(context ? typedFrom(kind.startsWith?.(context) ?? {}) : {}),
    ...typedFrom(rule?.opensWith ?? {}),
    ...typedFrom(running?.stopsWith ?? {}),
    ...Object.fromEntries(named.map(field => [`care.${field}`, [name]])),
    ...Object.fromEntries(warned.map(field => [`care.${field}`, [warning]])),
  }
}

/** Care that is due for this patient, now or later, by name. */
function deferrable(context: CareContext): Readonly<Record<string, string>> {
  const running = dueTasks(context).filter(task => task.status !== 'suspended')
  return Object.fromEntries(running.map(({ rule, title }) => [rule.name, title]))
}

/** What stands about this kind of care, and whatever is red. */
function warningsFor(kind: AnyCareKind, context: CareContext): readonly ExplainedWarning[] {
  const own = new Set(kind.standing?.(context).map(({ name }) => name))
  const shown = standingWarnings(context).filter(({ level, name }) => level === 'red' || own.has(name))
  return shown.length === 0 ? [] : explained(shown, whyStanding(context))
}

const RECENT = hours(0.5)

function recentlyWords(kind: AnyCareKind, { record, now }: CareContext, user: CurrentUser): string | null {
  const last = record.of(kind)[0]
  if (!last || since(last.performedAt, now) > RECENT) return null
  const who = last.recordedById === user.id ? 'You' : last.recordedByName
  return `${who} charted this ${showDuration(since(last.performedAt, now))} ago: ${kind.summary(last.data)}`
}

function dueWords(kind: AnyCareKind, context: CareContext, url: URL, now: Date) {
  const asked = url.searchParams.get('task')
  const tasks = liveTasks(dueTasks(context).map(taskView), now.getTime()).filter(task => task.kind === kind.slug)
  const task = tasks.find(({ name }) => name === asked) ?? tasks[0]
  return task ? { says: standingWords(task, now.getTime(), context.ward.zone), status: task.status } : null
}
