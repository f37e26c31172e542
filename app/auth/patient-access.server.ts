import { createContext, data, type MiddlewareFunction, redirect } from 'react-router'
import { type PatientPlace, placeOf } from '#database/access-grants.server.ts'
import { logAccess, logLook, type Trace } from '#database/access-log.server.ts'
import { keepDraft } from './draft.server.ts'
import { type Act, type CurrentUser, can, canByGrant } from './permissions.ts'
import { isWrite } from './request-kind.ts'
import { signedIn } from './signed-in.server.ts'
import { traceOf } from './trace.server.ts'

/** A patient that somebody may open: where they are, and whether membership or a reason opened them. */
export type OpenedPatient = {
  readonly patientId: string
  readonly wardId: string
  readonly stayId: string
  readonly via: 'ward' | 'grant'
}

/** What is to be done, and from where: `path` is where to go on after a reason was given; null where none can be asked for. */
export type PatientAsk = {
  readonly path: string | null
  readonly act: Act
  readonly by?: Trace
  /** Where the patient is, when the layout of this request has just read it. */
  readonly place?: PatientPlace | null
}

/** The patient of this request, set by `patientOnly`. */
export const patientContext = createContext<OpenedPatient>()

/** Where `patientOnly` found the patient of this request, so that the page's own gate need not ask again. */
export const placeContext = createContext<PatientPlace | null>(null)

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i

/**
 * The patient, if this person may do this to them. Throws a 404 for a patient that does not exist for this person, a 403
 * for an act that is not theirs, and a redirect to the page that asks for a reason for a patient of another ward.
 */
export async function patientGate(user: CurrentUser, patientId: string, ask: PatientAsk): Promise<OpenedPatient> {
  const place = ask.place?.patientId === patientId ? ask.place : await placeIfAny(patientId, user)
  const isEver = can(user, 'see patients') || can(user, 'open patients elsewhere')
  if (place?.wardId == null || place.stayId === null || !isEver) {
    if (place !== null) await logRefusal(user, place, ask)
    throw data('There is no such patient.', 404)
  }
  const { wardId, stayId } = place
  if (can(user, ask.act, wardId)) return { patientId, wardId, stayId, via: 'ward' }
  if (place.grantedUntil !== null && canByGrant(user, ask.act)) return { patientId, wardId, stayId, via: 'grant' }
  if (!can(user, 'see patients', wardId) && place.grantedUntil === null) {
    if (ask.path !== null && can(user, 'open patients elsewhere')) throw redirect(reasonPath(patientId, ask.path))
    await logRefusal(user, place, ask)
    throw data('There is no such patient.', 404)
  }
  await logRefusal(user, place, ask)
  throw data('This is not for you to do on this ward. Ask the charge nurse.', 403)
}

async function placeIfAny(patientId: string, user: CurrentUser): Promise<PatientPlace | null> {
  return UUID.test(patientId) ? placeOf(patientId, user.id) : null
}

/** The page that asks for a reason, and then goes on to `path`. */
export function reasonPath(patientId: string, path: string): string {
  return `/patients/${patientId}/access?${new URLSearchParams({ returnTo: path })}`
}

/** For the layout of a patient's pages: opens the patient, or sends elsewhere, and logs the look. */
export const patientOnly: MiddlewareFunction<Response> = async ({ params, request, url, context }, next) => {
  const user = signedIn(context)
  const by = traceOf({ request, url, context })
  const { patientId = '' } = params
  const place = await placeIfAny(patientId, user)
  const ask = { path: url.pathname + url.search, act: 'see patients', by, place } as const
  const opened = await patientGate(user, patientId, ask).catch(keepingForm({ user, request, url }))
  context.set(patientContext, opened)
  context.set(placeContext, place)
  if (!isWrite(request)) await logPatientLook(opened, by)
  return next()
}

/**
 * What the gate throws, thrown again. A form that comes after its reason has run out waits as a draft behind the page that
 * asks for another one.
 */
export function keepingForm(sent: { readonly user: CurrentUser; readonly request: Request; readonly url: URL }) {
  return async (refusal: unknown): Promise<never> => {
    const { user, request, url } = sent
    if (refusal instanceof Response && isWrite(request)) await keepDraft(user.id, url.pathname, request)
    throw refusal
  }
}

/** Logs that a patient's page was looked at, once in so many minutes for each page and session. */
export function logPatientLook(opened: OpenedPatient, by: Trace, onceInMinutes?: number): Promise<void> {
  const { patientId, stayId, wardId, via } = opened
  const purpose = via === 'grant' ? 'BTG' : 'TREAT'
  return logLook({ action: 'opened patient', purpose, by, patientId, stayId, wardId }, onceInMinutes)
}

async function logRefusal(user: CurrentUser, place: PatientPlace, { path, act, by }: PatientAsk): Promise<void> {
  const nowhere: Trace = {
    actor: user,
    path: path?.split('?')[0] ?? null,
    address: null,
    userAgent: null,
    requestId: null,
  }
  await logAccess({
    action: act,
    outcome: 'refused',
    purpose: 'TREAT',
    by: by ?? nowhere,
    patientId: place.patientId,
    stayId: place.stayId,
    ...(place.wardId === null ? {} : { wardId: place.wardId }),
  })
}
