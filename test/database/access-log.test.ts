import { QueryTypes } from 'sequelize'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { type AccessEntry, logAccess, logLook } from '#database/access-log.server.ts'
import { transact } from '#database/sequelize.server.ts'
import { verifyAccessLog } from '#database/verify-access-log.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson, traceOfTest } from '#test/people.ts'

const ada = '018f0000-0000-7000-8000-00000000ada0'
const bo = '018f0000-0000-7000-8000-00000000b000'
const ward = '018f0000-0000-7000-8000-000000000007'

beforeEach(cleared)
afterEach(guardAgain)

const guards = ['UPDATE', 'DELETE'] as const

/** What somebody with the owner's rights would do first. */
async function unguarded(statement: string) {
  for (const act of guards) await owner.query(`DROP TRIGGER IF EXISTS access_log_refuses_${act.toLowerCase()}`)
  await owner.query(statement)
}

async function guardAgain() {
  for (const act of guards) {
    await owner.query(`CREATE TRIGGER IF NOT EXISTS access_log_refuses_${act.toLowerCase()} BEFORE ${act} ON access_log
      FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'access_log is append-only'`)
  }
}

async function look(patientId: string, path = '/patients/x'): Promise<AccessEntry> {
  const entry: AccessEntry = {
    action: 'opened patient',
    purpose: 'TREAT',
    by: traceOfTest(await reader(), path),
    patientId,
    wardId: ward,
  }
  return entry
}

let known: Awaited<ReturnType<typeof aPerson>> | undefined
beforeEach(() => {
  known = undefined
})
async function reader() {
  known ??= await aPerson()
  return known
}

const rows = () =>
  owner.query<{ chain: string; seq: number; actor_role: string; user_agent: string }>(
    'SELECT chain, seq, actor_role, user_agent FROM access_log ORDER BY chain, seq',
    { type: QueryTypes.SELECT },
  )

test('each patient has a chain of their own, which verifies', async () => {
  for (const patientId of [ada, bo, ada, ada]) await logAccess(await look(patientId))
  expect((await rows()).map(({ chain, seq }) => `${chain} ${seq}`)).toEqual([
    `patient:${ada} 1`,
    `patient:${ada} 2`,
    `patient:${ada} 3`,
    `patient:${bo} 1`,
  ])
  expect(await verifyAccessLog()).toMatchObject({ chains: 2, links: 4, firstBad: null })
})

test('what is not about a patient goes to the chain of the person or the ward', async () => {
  const user = await reader()
  await logAccess({ action: 'signed in', purpose: 'SIGN-IN', by: traceOfTest(user) })
  await logAccess({ action: 'opened board', purpose: 'TREAT', by: traceOfTest(user), wardId: ward })
  await logAccess({ action: 'signed in', outcome: 'refused', purpose: 'SIGN-IN', by: traceOfTest() })
  expect((await rows()).map(({ chain }) => chain)).toEqual(['nobody', `user:${user.id}`, `ward:${ward}`])
})

test('forty looks at once make one chain without a gap', async () => {
  const entry = await look(ada)
  await Promise.all(Array.from({ length: 40 }, () => logAccess(entry)))
  expect(await verifyAccessLog()).toMatchObject({ chains: 1, links: 40, firstBad: null })
})

test('a look is undone with the transaction it belongs to', async () => {
  const entry = await look(ada)
  const work = transact(async transaction => {
    await logAccess(entry, transaction)
    throw new Error('the write it belongs to failed')
  })
  await expect(work).rejects.toThrow('failed')
  await logAccess(entry)
  expect(await verifyAccessLog()).toMatchObject({ links: 1, firstBad: null })
})

test('a page that keeps itself up to date is one look in five minutes', async () => {
  const entry = await look(ada)
  for (let times = 0; times < 3; times += 1) await logLook(entry)
  await logLook(await look(ada, '/patients/x/timeline'))
  expect(await rows()).toHaveLength(2)
})

test('what a caller sends cannot fake a line or break the log', async () => {
  const entry = await look(ada)
  const userAgent = `Naïve\r\nbrowser ${'x'.repeat(400)}`
  await logAccess({ ...entry, by: { ...entry.by, userAgent } })
  const [row] = await rows()
  expect(row?.user_agent).toMatch(/^Na\?ve\?\?browser x+$/)
  expect(row?.user_agent).toHaveLength(200)
  expect(await verifyAccessLog()).toMatchObject({ firstBad: null })
})

test.each([['UPDATE access_log SET actor_id = NULL'], ['DELETE FROM access_log']])(
  '%s is refused, even to the owner',
  async statement => {
    await logAccess(await look(ada))
    await expect(owner.query(statement)).rejects.toThrow(/append-only/)
  },
)

test.each([
  ['a changed actor', `UPDATE access_log SET actor_id = NULL WHERE seq = 2`, 2, 'is not as it was written'],
  ['a changed time', `UPDATE access_log SET at = at - INTERVAL 1 DAY WHERE seq = 3`, 3, 'is not as it was written'],
  ['a row that was taken out', `DELETE FROM access_log WHERE seq = 2`, 3, 'follows 1: what was between them is gone'],
  [
    'a first row that was taken out',
    `DELETE FROM access_log WHERE seq = 1`,
    2,
    'follows 0: what was between them is gone',
  ],
  ['a last row that was taken out', `DELETE FROM access_log WHERE seq = 4`, 4, 'is gone: the chain ends at 3'],
  ['a chain that was taken out', `DELETE FROM access_log`, 4, 'is gone: the chain ends at 0'],
  [
    'a row whose hash was made to fit',
    `UPDATE access_log SET hash = REPEAT('a', 64) WHERE seq = 4`,
    4,
    'is not as it was written',
  ],
])('%s is named', async (_, statement, seq, says) => {
  const entry = await look(ada)
  for (let times = 0; times < 4; times += 1) await logAccess(entry)
  await unguarded(statement)
  expect((await verifyAccessLog()).firstBad).toEqual({ chain: `patient:${ada}`, seq, says })
})

test('the digest changes when an end and its head are cut off together', async () => {
  const entry = await look(ada)
  await logAccess(entry)
  const { digest } = await verifyAccessLog()
  await logAccess(entry)
  expect((await verifyAccessLog()).digest).not.toBe(digest)
  await unguarded('DELETE FROM access_log WHERE seq = 2')
  await owner.query('UPDATE access_log_heads SET seq = 1, hash = (SELECT hash FROM access_log)')
  expect(await verifyAccessLog()).toMatchObject({ firstBad: null, digest })
})
