import { type Confirmation, confirmed } from '#app/auth/own-sign-in.server.ts'
import { authorOf, type CurrentUser } from '#app/auth/permissions.ts'
import type { AnyCareKind, CareContext } from '#app/care/kind.ts'
import { freshSignIn, secondPersonSigns } from '#app/care/signing-settings.ts'
import { type CompetenceStanding, skills, standingWords } from '#app/care/skills.ts'
import type { Chartable, FormErrors } from '#app/charting/assess.ts'
import { standingIn } from '#app/rules/competence.ts'
import { minutes, since } from '#app/time/duration.ts'
import { type LocalDay, localDay, type Zone } from '#app/time/zone.ts'
import type { Trace } from '#database/access-log.server.ts'
import { signOffsOf } from '#database/competences.server.ts'
import type { Alongside } from '#database/entries.server.ts'
import { type Signature, withSignatures } from '#database/entry-signatures.server.ts'
import { person } from '#database/users.server.ts'

/** What a form asks of those who sign it. */
export interface SigningAsk {
  /** The signer's password: a final act, and their sign-in was a while ago. */
  readonly password: boolean
  /** Whose password it is, for what keeps passwords. */
  readonly email: string
  /** The second person: asked for where the kind is an act of two people; expected where the policy says so. */
  readonly second: 'offered' | 'asked' | 'expected'
  /** What the signer lacks for this act, in words; it never refuses. */
  readonly lacks: string | null
}

export interface Asking {
  readonly zone: Zone
  readonly user: CurrentUser
  readonly context: CareContext | null
  readonly now: Date
  readonly signedInAt: Date
}

/** What the form of a kind asks of those who sign it. */
export async function signingAsk(
  kind: AnyCareKind,
  { user, context, now, signedInAt, zone }: Asking,
): Promise<SigningAsk> {
  const expected = context?.values.of(secondPersonSigns) ?? secondPersonSigns.default
  return {
    password: kind.needsFreshSignIn === true && !isFresh(signedInAt, context, now),
    email: user.email,
    second: kind.twoPeople === undefined ? 'offered' : expected ? 'expected' : 'asked',
    lacks: lackWords(kind, await competenceFor(kind, user.id, localDay(now, zone))),
  }
}

/** How somebody stands in the skill that a kind asks for; null when it asks for none. */
async function competenceFor(kind: AnyCareKind, userId: string, today: LocalDay): Promise<CompetenceStanding | null> {
  if (!kind.needsCompetence) return null
  return standingIn(await signOffsOf([userId]), kind.needsCompetence, today)
}

function lackWords(kind: AnyCareKind, standing: CompetenceStanding | null): string | null {
  if (!kind.needsCompetence || standing === null || standing === 'held') return null
  return `${skills[kind.needsCompetence]}: ${standingWords[standing]}.`
}

function isFresh(signedInAt: Date, context: CareContext | null, now: Date): boolean {
  const most = context?.values.of(freshSignIn) ?? freshSignIn.default
  return since(signedInAt, now) < minutes(most)
}

/** What is to be written with an entry, or which password was not right. */
export type Signed =
  | { readonly ok: true; readonly alongside: Alongside | undefined }
  | { readonly ok: false; readonly errors: FormErrors; readonly status: number }

/** A form with its passwords, sent by somebody. */
export interface Signing {
  readonly kind: AnyCareKind
  readonly form: FormData
  readonly user: CurrentUser
  readonly now: Date
  readonly signedInAt: Date
  readonly by: Trace
  readonly care: { readonly ward: { readonly zone: Zone } }
}

interface Part {
  readonly signature?: Signature
  readonly errors?: FormErrors
  readonly status?: number
}

/** Checks the passwords on a form. Nothing here keeps an act out of the record: each can be left out, and the entry says so. */
export async function signed(signing: Signing, chart: Chartable, context: CareContext | null): Promise<Signed> {
  const parts = [await authorPart(signing, context), await secondPart(signing, chart)]
  const errors: FormErrors = Object.assign({}, ...parts.map(part => part.errors))
  if (Object.keys(errors).length > 0) {
    return { ok: false, errors, status: Math.max(400, ...parts.map(part => part.status ?? 400)) }
  }
  const signatures = parts.flatMap(({ signature }) => signature ?? [])
  return { ok: true, alongside: withSignatures(chart.id, signatures) }
}

async function authorPart(signing: Signing, context: CareContext | null): Promise<Part> {
  const { kind, user, now, care } = signing
  if (!kind.needsFreshSignIn && !kind.needsCompetence) return {}
  const proven = kind.needsFreshSignIn ? await ownProof(signing, context) : 'session'
  if (typeof proven !== 'string') return proven
  const competence = await competenceFor(kind, user.id, localDay(now, care.ward.zone))
  return {
    signature: { part: 'author', userId: user.id, role: authorOf(user).role, proof: proven, competence },
  }
}

async function ownProof({ user, form, now, signedInAt, by }: Signing, context: CareContext | null) {
  if (form.get('unsigned') === 'yes') return 'not given'
  const password = passwordIn(form, 'signerPassword')
  if (password !== '') {
    const answer = await confirmed(user.id, password, by)
    return answer.is === 'right' ? 'password' : refused('signerPassword', answer, 'This is not your password')
  }
  if (isFresh(signedInAt, context, now)) return 'recent sign-in'
  return { errors: { signerPassword: ['Enter your password, to sign this act'] } }
}

async function secondPart({ form, by }: Signing, { witnessId }: Chartable): Promise<Part> {
  const password = passwordIn(form, 'witnessPassword')
  if (password === '') return {}
  if (witnessId === undefined) return { errors: { witness: ['Choose whose password was entered below'] } }
  const answer = await confirmed(witnessId, password, by)
  const second = await person(witnessId)
  if (answer.is !== 'right' || second === null) {
    return refused('witnessPassword', answer, `This is not the password of ${second?.name ?? 'that person'}`)
  }
  const { role } = authorOf({ ...second, isSupervised: second.supervised })
  return { signature: { part: 'second person', userId: witnessId, role, proof: 'password', competence: null } }
}

/** One password of a form; empty when it has none, or several. */
function passwordIn(form: FormData, name: 'signerPassword' | 'witnessPassword'): string {
  const [password, ...others] = form.getAll(name)
  return typeof password === 'string' && others.length === 0 ? password : ''
}

function refused(field: string, answer: Confirmation, wrong: string): Part {
  const without = field === 'signerPassword' ? 'chart without it below' : 'leave it empty'
  if (answer.is === 'to wait') {
    const says = `Too many tries. Wait ${answer.seconds} s, or ${without}: the entry will say so`
    return { errors: { [field]: [says] }, status: 429 }
  }
  if (answer.is === 'busy') {
    const says = `Many people are signing in at this moment. Try again in a few seconds, or ${without}`
    return { errors: { [field]: [says] }, status: 503 }
  }
  return { errors: { [field]: [wrong] }, status: 400 }
}
