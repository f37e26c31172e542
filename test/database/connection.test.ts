import { afterEach, beforeAll, expect, test } from 'vitest'
import { connection } from '#database/connection.server.ts'
import { DatabaseUnavailable, isUniqueViolation, translated } from '#database/errors.server.ts'
import { change, select, sequelize, transact } from '#database/sequelize.server.ts'
import { migrated, owner } from '#test/database.ts'

beforeAll(async () => {
  await migrated()
  await owner.query('CREATE OR REPLACE TABLE probe (id INT PRIMARY KEY, name VARCHAR(10), UNIQUE probe_name (name))')
  await owner.query(`GRANT SELECT, INSERT, UPDATE, DELETE ON probe TO 'cannulary_app'@'127.0.0.1'`)
  return () => owner.query('DROP TABLE probe')
})

afterEach(() => owner.query('DELETE FROM probe'))

test('a decimal comes back as the text it was stored as', async () => {
  expect(await select('SELECT CAST(1.10 AS DECIMAL(5,2)) AS size')).toEqual([{ size: '1.10' }])
})

test('an instant keeps its moment on the way into a raw query and back', async () => {
  const at = new Date('2026-07-01T01:30:15.250Z')
  expect(await select('SELECT CAST(:at AS DATETIME(3)) AS at, CAST(:at AS CHAR) AS text', { at })).toEqual([
    { at, text: '2026-07-01 01:30:15.250' },
  ])
})

test('the session is strict and in UTC', async () => {
  const [session] = await select<{ zone: string; mode: string }>(
    'SELECT @@session.time_zone AS zone, @@sql_mode AS mode',
  )
  expect(session?.zone).toBe('+00:00')
  expect(session?.mode).toContain('STRICT_ALL_TABLES')
})

test('nothing of a transaction that fails is kept', async () => {
  const failing = transact(async transaction => {
    await change('INSERT INTO probe VALUES (1, :name)', { name: 'a' }, transaction)
    throw new Error('halfway')
  })
  await expect(failing).rejects.toThrow('halfway')
  expect(await select('SELECT id FROM probe')).toEqual([])
})

test('a transaction that meets a deadlock is done again as a whole', async () => {
  await transact(t => change(`INSERT INTO probe VALUES (1, 'a'), (2, 'b')`, {}, t))
  let runs = 0
  let meet = () => {}
  const bothHoldALock = new Promise<void>(resolve => {
    meet = resolve
  })
  const crosswise = (first: number, second: number) =>
    transact(async transaction => {
      runs += 1
      await change('UPDATE probe SET name = CONCAT(name, :first) WHERE id = :first', { first }, transaction)
      if (runs === 2) meet()
      await bothHoldALock
      await change('UPDATE probe SET name = CONCAT(name, :first) WHERE id = :second', { first, second }, transaction)
    })
  await Promise.all([crosswise(1, 2), crosswise(2, 1)])
  expect(runs).toBe(3)
  const names = await select<{ name: string }>('SELECT name FROM probe ORDER BY id')
  expect(names.map(({ name }) => name.split('').sort().join(''))).toEqual(['12a', '12b'])
})

test('a refused duplicate names the index that refused it', async () => {
  await transact(t => change(`INSERT INTO probe VALUES (1, 'a')`, {}, t))
  const refused = await transact(t => change(`INSERT INTO probe VALUES (2, 'a')`, {}, t)).catch(error => error)
  expect(isUniqueViolation(refused, 'probe_name')).toBe(true)
  expect(isUniqueViolation(refused, 'PRIMARY')).toBe(false)
})

test('a server that does not answer is told from a wrong statement', async () => {
  const nowhere = connection('mariadb://nobody:x@127.0.0.1:1/nothing')
  const error = await nowhere.authenticate().catch(translated)
  await nowhere.close()
  expect(error).toBeInstanceOf(DatabaseUnavailable)
  const wrong = await select('SELECT nothing FROM nowhere').catch(refusal => refusal)
  expect(wrong).not.toBeInstanceOf(DatabaseUnavailable)
})

test('a connection lost before the end of a transaction is said to have charted nothing', async () => {
  const lost = transact(async transaction => {
    const [session] = await select<{ id: number }>('SELECT CONNECTION_ID() AS id', {}, transaction)
    await sequelize.query(`KILL ${session?.id}`)
    await select('SELECT 1', {}, transaction)
  })
  await expect(lost).rejects.toThrow('Nothing was charted')
})
