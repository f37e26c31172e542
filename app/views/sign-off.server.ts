import { z } from 'zod'
import { confirmed } from '#app/auth/own-sign-in.server.ts'
import { authorOf, type CurrentUser, can } from '#app/auth/permissions.ts'
import { levels, skills } from '#app/care/skills.ts'
import { onlyFields } from '#app/sent-form.server.ts'
import type { Trace } from '#database/access-log.server.ts'
import { signOff, withdrawSignOff } from '#database/competences.server.ts'
import { lastDay, type OpenedCompetence } from './competence.server.ts'

const lost = 'This form has lost a part of itself. Open it again.'
const keys = <Key extends string>(record: Readonly<Record<Key, string>>) => Object.keys(record) as [Key, ...Key[]]

const signingOff = z.object({
  id: z.uuid(lost),
  skill: z.enum(keys(skills), 'Choose the skill'),
  level: z.enum(keys(levels), 'Choose the level'),
  assessedOn: z.iso.date('Enter the day of the assessment'),
})

const withdrawing = z.object({
  id: z.uuid(lost),
  reason: z
    .string()
    .trim()
    .min(1, 'Enter why it is withdrawn')
    .max(500, 'The reason must be at most 500 characters')
    .regex(/^(?:[^\p{Cc}\p{Cs}]|[\n\r\t])*$/u, 'The reason has characters that cannot be stored'),
})

/** Mistakes by field, with what was typed but for the password; null when it was done. */
export interface NotSigned {
  readonly status: number
  readonly intent: 'sign off' | 'withdraw'
  readonly errors: Readonly<Record<string, readonly string[]>>
  readonly typed: Readonly<Record<string, string>>
}

interface Sent {
  readonly user: CurrentUser
  readonly form: FormData
  readonly by: Trace
  readonly now: Date
}

const names = ['id', 'skill', 'level', 'assessedOn', 'reason']

/** Signs a skill off for somebody, or withdraws a sign-off, with the assessor's own password; or says what is wrong. */
export async function signedOff(opened: OpenedCompetence, sent: Sent): Promise<NotSigned | null> {
  const typed = Object.fromEntries(
    [...onlyFields(sent.form, names)].flatMap(([name, value]) => (typeof value === 'string' ? [[name, value]] : [])),
  )
  const isWithdrawal = sent.form.get('intent') === 'withdraw'
  const kept = { intent: isWithdrawal ? ('withdraw' as const) : ('sign off' as const), typed }
  const work = isWithdrawal ? withdrawal(opened, sent, typed) : assessment(opened, sent, typed)
  if ('errors' in work) return { ...kept, status: 400, errors: work.errors }
  const wrong = await ownPassword(sent)
  if (wrong) return { ...kept, ...wrong }
  await work.run()
  return null
}

type Work = { readonly errors: NotSigned['errors'] } | { run(): Promise<void> }

function assessment({ person, assessable, today }: OpenedCompetence, sent: Sent, typed: NotSigned['typed']): Work {
  const form = signingOff.safeParse(typed)
  if (!form.success) return { errors: z.flattenError(form.error).fieldErrors }
  const { id, skill, level, assessedOn } = form.data
  if (!assessable.includes(skill)) return { errors: { skill: ['You are not an assessor of this skill'] } }
  if (assessedOn > today) return { errors: { assessedOn: ['That day has not come yet'] } }
  return {
    run: async () => {
      const expiresOn = await lastDay(person, assessedOn, sent.now)
      await signOff({ id, userId: person.id, skill, level, assessedOn, expiresOn }, authorOf(sent.user), sent.by)
    },
  }
}

function withdrawal({ signOffs }: OpenedCompetence, { user, by }: Sent, typed: NotSigned['typed']): Work {
  const form = withdrawing.safeParse(typed)
  if (!form.success) return { errors: z.flattenError(form.error).fieldErrors }
  const found = signOffs.find(({ id }) => id === form.data.id)
  if (!found) return { errors: { '': ['There is no such sign-off of this person'] } }
  if (!can(user, 'sign off competence') && found.assessedById !== user.id) {
    return { errors: { '': ['Whoever signed it withdraws it, or the educator'] } }
  }
  return { run: () => withdrawSignOff(found, form.data.reason, by) }
}

async function ownPassword({ user, form, by }: Sent) {
  const password = form.get('signerPassword')
  if (typeof password !== 'string' || password === '') {
    return { status: 400, errors: { signerPassword: ['Enter your password, to sign'] } }
  }
  const answer = await confirmed(user.id, password, by)
  if (answer.is === 'right') return null
  if (answer.is === 'wrong') return { status: 400, errors: { signerPassword: ['This is not your password'] } }
  if (answer.is === 'busy') return { status: 503, errors: { signerPassword: ['Many people sign in now. Try again'] } }
  return { status: 429, errors: { signerPassword: [`Too many tries. Wait ${answer.seconds} s, then try again`] } }
}
