import { validate as isUuid, v7 as uuidv7 } from 'uuid'
import type { CurrentUser } from '#app/auth/permissions.ts'
import type { AnyCareKind, CareContext } from '#app/care/kind.ts'
import { careSettings, careTasks } from '#app/care/kinds.ts'
import { type Assessed, assessed, type Chartable, type Situation } from '#app/charting/assess.ts'
import type { ChartAnswer, Otherwise } from '#app/charting/chart-answer.ts'
import { intentOf, typedIn } from '#app/charting/chart-form.ts'
import { chartedSentence } from '#app/charting/sentence.ts'
import type { SentPhotographs } from '#app/photographs/sent-photographs.server.ts'
import { entryWarnings } from '#app/rules/warnings.ts'
import { explained, whyEntry } from '#app/rules/why-warnings.ts'
import { showDateTime } from '#app/time/display.ts'
import type { Trace } from '#database/access-log.server.ts'
import type { Alongside } from '#database/entries.server.ts'
import type { Charting } from '#database/entry-outcome.server.ts'
import { person } from '#database/users.server.ts'
import { cataloguedItem } from './catalogued-item.server.ts'
import { calendarOf, signerOf } from './chart-form.server.ts'
import { witnessesFor } from './chart-lists.server.ts'
import { signed } from './chart-signing.server.ts'
import { contextOfAct, contextOfCorrection } from './patient-care.server.ts'
import type { PatientCare } from './patient-context.server.ts'

/** A form that was sent, by whom and about whom. `corrects`: the entry that it takes the place of. */
export interface Sent {
  readonly kind: AnyCareKind
  readonly form: FormData
  readonly care: PatientCare
  readonly user: CurrentUser
  readonly now: Date
  readonly signedInAt: Date
  readonly by: Trace
  readonly corrects?: string
  /** Its files, if it may have some. */
  readonly photographs?: Pick<SentPhotographs, 'shownAgain' | 'problems'>
}

/** What a form may be answered with before anything is stored, or what is to be stored. */
export type Checked =
  | {
      readonly ok: true
      readonly chart: Chartable
      readonly alongside: Alongside | undefined
      readonly isUrgent: boolean
    }
  | { readonly ok: false; readonly answer: ChartAnswer; readonly status: number }

/** Checks a form and does what its button says, short of charting it. Stores nothing. */
export async function checked(sent: Sent): Promise<Checked> {
  const { kind, form, user } = sent
  const intent = intentOf(form)
  const answer = assessed(kind, form, await situationOf(sent))
  if (intent === 'preview') return looked({ is: 'previewed', warnings: answer.ok ? warningsOf(kind, answer) : [] })
  const openedBy = form.get('openedBy')
  if (typeof openedBy === 'string' && isUuid(openedBy) && openedBy !== user.id) return bySomebodyElse(sent, openedBy)
  if (!answer.ok) {
    const { errors, asks } = answer
    return refused({ ...keptOf(sent), title: 'Not charted yet. Please check:', errors, asks }, 400)
  }
  if (intent !== 'review') return signedChart(sent, answer)
  const { care, performedAt } = answer.chart
  const sentence = chartedSentence(kind, care, performedAt, signerOf(user), calendarOf(sent.care, sent.now))
  return looked({ is: 'reviewed', sentence, warnings: warningsOf(kind, answer), ...keptOf(sent) })
}

/** What is to be charted, with the signatures that go with it; a password that is not right is said at its field. */
async function signedChart(sent: Sent, answer: Assessed & { ok: true }): Promise<Checked> {
  const { chart, context } = answer
  const signing = await signed(sent, chart, context)
  if (!signing.ok) {
    const { errors, status } = signing
    return refused({ ...keptOf(sent), title: 'Not charted yet. Please check:', errors, asks: false }, status)
  }
  const isUrgent = warningsOf(sent.kind, answer).some(({ level }) => level === 'red')
  return { ok: true, chart, alongside: signing.alongside, isUrgent }
}

function looked(answer: ChartAnswer): Checked {
  return { ok: false, answer, status: 200 }
}

function refused(answer: Omit<ChartAnswer & { is: 'refused' }, 'is'>, status: number): Checked & { ok: false } {
  return { ok: false, answer: { is: 'refused', ...answer }, status }
}

function warningsOf(kind: AnyCareKind, { chart, context }: { chart: Chartable; context: CareContext | null }) {
  return context ? explained(entryWarnings(kind, chart.care, context), whyEntry(kind, chart.care, context)) : []
}

/** What the page shows again: everything typed, under the same id, so that sending it again is the same act. */
function keptOf({ kind, form, user, photographs }: Sent) {
  const id = form.get('id')
  return {
    typed: typedIn(kind, photographs?.shownAgain ?? form),
    id: typeof id === 'string' && isUuid(id) ? id : uuidv7(),
    signer: signerOf(user),
  }
}

async function situationOf({ kind, care, form, user, now, corrects, photographs }: Sent): Promise<Situation> {
  const witness = form.get('witness')
  const people = witness ? await witnessesFor(care.ward.id, user) : {}
  return {
    calendar: calendarOf(care, now),
    known: { settings: careSettings, tasks: careTasks },
    witnessIds: new Set(Object.keys(people)),
    problems: photographs?.problems ?? [],
    item: await cataloguedItem(kind, form),
    reason: corrects === undefined ? 'when late' : 'always',
    contextAt: at =>
      corrects === undefined
        ? contextOfAct(care, care.policies, at)
        : contextOfCorrection(care, care.policies, at, corrects),
  }
}

async function bySomebodyElse(sent: Sent, openedBy: string): Promise<Checked> {
  const owner = (await person(openedBy))?.name ?? 'somebody else'
  const says = `You are signed in as ${sent.user.name}; this form was opened by ${owner}. If you did this yourself, chart it under your name.`
  return refused({ ...keptOf(sent), title: 'Not charted.', errors: { '': [says] }, asks: false }, 409)
}

/** Where charting leads: to the patient, who by then shows it; or first to what the act asks to do now. */
export function afterCharting(patientId: string, entryId: string, isUrgent: boolean): string {
  return isUrgent ? `/patients/${patientId}/act-now/${entryId}` : `/patients/${patientId}?charted=${entryId}`
}

/** The answer to a form that the record did not take; for the other outcomes the form is done. */
export function refusedByRecord(sent: Sent, outcome: Charting): Checked & { ok: false } {
  const kept = { ...keptOf(sent), title: 'Not charted.', asks: false }
  const zone = sent.care.ward.zone
  if (outcome.outcome === 'other body under this id') {
    const says =
      'This form was charted before, with other answers. Nothing was changed. To chart this as well, send it again.'
    const see: Otherwise = { href: `/entries/${kept.id}`, words: 'See what was charted' }
    return refused({ ...kept, id: uuidv7(), errors: { '': [says] }, see }, 422)
  }
  if (outcome.outcome === 'already corrected') {
    const says = `${outcome.by} corrected or retracted this entry on ${showDateTime(outcome.at, zone)}. Look at that before you go on.`
    const see: Otherwise = { href: `/entries/${outcome.entryId}`, words: 'See the latest' }
    return refused({ ...kept, errors: { '': [says] }, see }, 409)
  }
  if (outcome.outcome === 'stay not open') {
    const ended = outcome.dischargedAt ? ` on ${showDateTime(outcome.dischargedAt, zone)}` : ''
    return refused({ ...kept, errors: { time: [`The stay ended${ended}. Enter a time before that.`] } }, 409)
  }
  throw new Error(`An entry that was ${outcome.outcome} was not refused`)
}
