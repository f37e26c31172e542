import { type Confirmation, confirmed } from '#app/auth/own-sign-in.server.ts'
import type { CurrentUser } from '#app/auth/permissions.ts'
import type { AnyCareKind, CareContext } from '#app/care/kind.ts'
import { freshSignIn, secondPersonSigns } from '#app/care/signing-settings.ts'
import type { Chartable, FormErrors } from '#app/charting/assess.ts'
import { minutes, since } from '#app/time/duration.ts'
import type { Trace } from '#database/access-log.server.ts'
import type { Alongside } from '#database/entries.server.ts'
import { type Proof, type Signature, withSignatures } from '#database/entry-signatures.server.ts'
import { person } from '#database/users.server.ts'

/** What a form asks of those who sign it. */
export interface SigningAsk {
  /** The signer's password: a final act, and their sign-in was a while ago. */
  readonly password: boolean
  /** Whose password it is, for what keeps passwords. */
  readonly email: string
  /** The second person: asked for where the kind is an act of two people; expected where the policy says so. */
  readonly second: 'offered' | 'asked' | 'expected'
}

interface Asking {
  readonly user: CurrentUser
  readonly context: CareContext | null
  readonly now: Date
  readonly signedInAt: Date
}

/** What the form of a kind asks of those who sign it. */
export function signingAsk(kind: AnyCareKind, { user, context, now, signedInAt }: Asking): SigningAsk {
  const expected = context?.values.of(secondPersonSigns) ?? secondPersonSigns.default
  return {
    password: kind.needsFreshSignIn === true && !isFresh(signedInAt, context, now),
    email: user.email,
    second: kind.twoPeople === undefined ? 'offered' : expected ? 'expected' : 'asked',
  }
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
  const { kind, user, form, now, signedInAt, by } = signing
  if (!kind.needsFreshSignIn) return {}
  const signature = (proof: Proof): Part => ({
    signature: { part: 'author', userId: user.id, role: user.role, proof, competence: null },
  })
  if (form.get('unsigned') === 'yes') return signature('not given')
  const password = passwordIn(form, 'signerPassword')
  if (password !== '') {
    const answer = await confirmed(user.id, password, by)
    if (answer.is === 'right') return signature('password')
    return refused('signerPassword', answer, 'This is not your password')
  }
  if (isFresh(signedInAt, context, now)) return signature('recent sign-in')
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
  const { role } = second
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
