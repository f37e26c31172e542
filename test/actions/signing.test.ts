import { QueryTypes } from 'sequelize'
import { beforeEach, expect, test } from 'vitest'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { aTube } from '#app/care/make.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { minutes } from '#app/time/duration.ts'
import { aCharting, changed, chart, openedForm, refusalOf, type Sent, wholeForm } from '#test/charting.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson, password } from '#test/people.ts'

let given: Awaited<ReturnType<typeof aCharting>>
let second: Awaited<ReturnType<typeof aPerson>>

beforeEach(async () => {
  await cleared()
  given = await aCharting()
  second = await aPerson({ name: 'Kofi Lindstrand', role: 'respiratory therapist', wardIds: [given.ward.id] })
})

const longAgo = () => new Date(Date.now() - minutes(11))
const aChange = (more: Readonly<Record<string, string>> = {}): Sent =>
  changed(wholeForm(tubeChange, given.nurse, aTube()), more)
const send = (form: Sent, signedInAt?: Date) => chart(given.nurse, given.patientId, tubeChange.slug, form, signedInAt)

const signatures = () =>
  owner.query<{ part: string; userId: string; role: string; proof: string }>(
    'SELECT part, user_id AS userId, role, proof FROM entry_signatures ORDER BY part',
    { type: QueryTypes.SELECT },
  )
/** As after a dozen guesses: a wait of a minute, which a slow machine does not outlast. */
const guessedOften = () => owner.query('UPDATE sign_in_attempts SET misses = 12, last_missed_at = UTC_TIMESTAMP(3)')
const charted = async () =>
  (
    await owner.query('SELECT id FROM entries WHERE kind = :slug', {
      replacements: { slug: tubeChange.slug },
      type: QueryTypes.SELECT,
    })
  ).length

test('a final act soon after signing in asks for nothing more, and the entry says how it was signed', async () => {
  expect(await openedForm(given.nurse, given.patientId, tubeChange.slug)).toMatchObject({
    signing: { password: false },
  })
  expect(await send(aChange())).toMatchObject({ status: 302 })
  expect(await signatures()).toEqual([
    { part: 'author', userId: given.nurse.id, role: 'nurse', proof: 'recent sign-in' },
  ])
})

test('later the password is asked for, and an act without it stays on the form', async () => {
  const opened = await openedForm(given.nurse, given.patientId, tubeChange.slug, '', longAgo())
  expect(opened).toMatchObject({ signing: { password: true, second: 'expected' } })
  const answer = await send(aChange(), longAgo())
  expect(answer.status).toBe(400)
  expect(refusalOf(answer).errors).toEqual({ signerPassword: ['Enter your password, to sign this act'] })
  expect(await charted()).toBe(1)
})

test('the right password signs, and is kept nowhere', async () => {
  const sent = aChange({ signerPassword: password })
  expect(await send(sent, longAgo())).toMatchObject({ status: 302 })
  expect(await signatures()).toMatchObject([{ proof: 'password' }])
  expect(await send(sent, longAgo())).toMatchObject({ status: 302 })
  expect(await charted()).toBe(2)
})

test('a wrong password is said at its field, and everything but the password stays', async () => {
  const answer = await send(aChange({ signerPassword: 'not it at all', witness: second.id }), longAgo())
  expect(answer.status).toBe(400)
  const { errors, typed } = refusalOf(answer)
  expect(errors).toEqual({ signerPassword: ['This is not your password'] })
  expect(typed).toMatchObject({ witness: [second.id], 'care.reason': expect.anything() })
  expect(JSON.stringify(answer)).not.toContain('not it at all')
  expect(await charted()).toBe(1)
})

test('whoever has guessed too often waits, and may still chart what was done', async () => {
  await send(aChange({ signerPassword: 'a guess' }), longAgo())
  await guessedOften()
  const answer = await send(aChange({ signerPassword: password }), longAgo())
  expect(answer.status).toBe(429)
  expect(refusalOf(answer).errors.signerPassword?.[0]).toMatch(
    /^Too many tries\. Wait \d+ s, or chart without it below/,
  )
  expect(await send(aChange({ unsigned: 'yes' }), longAgo())).toMatchObject({ status: 302 })
  expect(await signatures()).toMatchObject([{ part: 'author', proof: 'not given' }])
})

test('a second person signs with their own password', async () => {
  const form = changed(wholeForm(cuffPressure, given.nurse), { witness: second.id, witnessPassword: password })
  expect(await chart(given.nurse, given.patientId, cuffPressure.slug, form)).toMatchObject({ status: 302 })
  expect(await signatures()).toEqual([
    { part: 'second person', userId: second.id, role: 'respiratory therapist', proof: 'password' },
  ])
})

test('a second person who is only named has no signature', async () => {
  expect(await send(aChange({ witness: second.id }))).toMatchObject({ status: 302 })
  expect(await signatures()).toMatchObject([{ part: 'author' }])
})

test.each([
  [
    'a wrong password',
    () => ({ witness: second.id, witnessPassword: 'x' }),
    'witnessPassword',
    /not the password of Kofi/,
  ],
  ['a password of nobody', () => ({ witnessPassword: password }), 'witness', /Choose whose password/],
  [
    'the signer as the second person',
    () => ({ witness: given.nurse.id, witnessPassword: password }),
    'witness',
    /from the list/,
  ],
])('%s is refused at its field, and nothing is charted', async (_, fields, field, words) => {
  const answer = await send(aChange(fields()))
  expect(answer.status).toBe(400)
  expect(refusalOf(answer).errors[field]?.[0]).toMatch(words)
  expect(await charted()).toBe(1)
  expect(await signatures()).toEqual([])
})

test('a colleague cannot be guessed at faster than on the sign-in page', async () => {
  const guess = (text: string) => send(aChange({ witness: second.id, witnessPassword: text }))
  await guess('a guess')
  await guessedOften()
  const answer = await guess(password)
  expect(answer.status).toBe(429)
  expect(refusalOf(answer).errors.witnessPassword?.[0]).toMatch(/Wait \d+ s, or leave it empty/)
})

test('a look before charting asks for no password and keeps none', async () => {
  const answer = await send([...aChange({ signerPassword: 'not it at all' }), ['intent', 'review']], longAgo())
  expect(answer).toMatchObject({ status: 200, says: { is: 'reviewed' } })
  expect(JSON.stringify(answer)).not.toContain('not it at all')
})
