import { QueryTypes } from 'sequelize'
import { beforeEach, expect, test } from 'vitest'
import { keepFields, takeDraft } from '#app/auth/draft.server.ts'
import { signIn } from '#app/auth/session.server.ts'
import { application } from '#test/application.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson, formRequest, site, traceOfTest } from '#test/people.ts'
import { aStay, aWardOf } from '#test/stays.ts'

const app = await application()

beforeEach(cleared)

function formOf(fields: readonly (readonly [string, string])[]): FormData {
  const form = new FormData()
  for (const [name, value] of fields) form.append(name, value)
  return form
}

test('a form that is sent after its reason has run out waits behind the next reason', async () => {
  const { patientId } = await aStay()
  const elsewhere = await aWardOf(1, 'Ward 8')
  const user = await aPerson({ wardIds: [elsewhere.id] })
  const [cookie] = (await signIn(new Request(site), user, traceOfTest(user))).split(';')
  const path = `/patients/${patientId}/chart/cuff-pressure`
  const { status, headers } = await app.answer(formRequest(path, { openedBy: user.id, 'care.found': '26' }, cookie))
  expect(status).toBe(302)
  expect(headers.get('Location')).toBe(`/patients/${patientId}/access?returnTo=${encodeURIComponent(path)}`)
  expect(await takeDraft(user.id, path)).toEqual({ openedBy: [user.id], 'care.found': ['26'] })
})

test('a form that somebody else opened does not become a draft of who is signed in', async () => {
  const author = await aPerson()
  const next = await aPerson({ name: 'Bea Lindqvist' })
  const form = formOf([
    ['openedBy', author.id],
    ['care.note', 'Sore at the upper edge'],
  ])
  expect(await keepFields(next.id, '/here', form)).toBe(false)
  expect(await takeDraft(next.id, '/here')).toBeNull()
})

test('fields may have any name', async () => {
  const user = await aPerson()
  const form = formOf(['__proto__', 'constructor', 'toString', '__proto__'].map(name => [name, 'x'] as const))
  expect(await keepFields(user.id, '/here', form)).toBe(true)
  const draft = await takeDraft(user.id, '/here')
  expect(Object.entries(draft ?? {}).toSorted(([a], [b]) => a.localeCompare(b))).toEqual([
    ['__proto__', ['x', 'x']],
    ['constructor', ['x']],
    ['toString', ['x']],
  ])
})

test('one person has at most twenty drafts, the newest, and takes none from others', async () => {
  const user = await aPerson()
  const other = await aPerson({ name: 'Bea Lindqvist' })
  await keepFields(other.id, '/theirs', formOf([['care.note', 'x']]))
  for (let at = 0; at < 22; at += 1) await keepFields(user.id, `/page/${at}`, formOf([['care.note', 'x']]))
  const kept = await owner.query<{ path: string }>('SELECT path FROM drafts', { type: QueryTypes.SELECT })
  const paths = kept.map(({ path }) => path)
  expect(paths).toHaveLength(21)
  expect(paths).toEqual(expect.arrayContaining(['/theirs', '/page/21']))
})
