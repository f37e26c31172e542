import { spawnSync } from 'node:child_process'
import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { QueryTypes } from 'sequelize'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { connection } from '#database/connection.server.ts'
import { locked } from '../../database/run/lock.mjs'
import { runningMariadb, startMariadb, stopMariadb } from '../../database/run/mariadb.mjs'
import { until } from '../../database/run/processes.mjs'

const isRoot = process.getuid?.() === 0
let base: string
let folder: string

beforeEach(() => {
  base = mkdtempSync(join(process.env.CANNULARY_TEST_DATA ?? tmpdir(), 'cannulary-server-'))
  chmodSync(base, 0o755)
  folder = join(base, 'data')
})

afterEach(async () => {
  await stopMariadb(folder)
  rmSync(base, { recursive: true, force: true })
})

const start = () => startMariadb({ folder, hold: true, durable: false })

async function answers(url: string) {
  const database = connection(url, { maxConnections: 1 })
  try {
    await database.authenticate()
    return true
  } finally {
    await database.close()
  }
}

function serverPid() {
  return Number(JSON.parse(readFileSync(join(folder, 'database.json'), 'utf8')).server.split(':')[0])
}

test('a start after a stop finds its port, and another one when that is taken', { timeout: 60_000 }, async () => {
  const { port } = await start()
  expect(await stopMariadb(folder)).toBe(true)
  expect(runningMariadb(folder)).toBeNull()
  expect((await start()).port).toBe(port)
  await stopMariadb(folder)
  const squatter = createServer().listen(port, '127.0.0.1')
  const elsewhere = await start()
  squatter.close()
  expect(elsewhere.port).not.toBe(port)
  expect(await answers(elsewhere.url('owner'))).toBe(true)
})

test('three starts at once make one server', { timeout: 60_000 }, async () => {
  const ports = (await Promise.all([start(), start(), start()])).map(({ port }) => port)
  expect(new Set(ports).size).toBe(1)
})

test('what was committed is there again after kill -9', { timeout: 60_000 }, async () => {
  const before = connection((await startMariadb({ folder, hold: true })).url('owner'), { maxConnections: 1 })
  await before.query('CREATE TABLE kept (id INT)')
  await before.query('INSERT INTO kept VALUES (1)')
  await before.close()
  process.kill(serverPid(), 'SIGKILL')
  await until(() => runningMariadb(folder) === null, 5000)
  const after = connection((await start()).url('owner'), { maxConnections: 1 })
  const rows = await after.query('SELECT id FROM kept', { type: QueryTypes.SELECT })
  await after.close()
  expect(rows).toEqual([{ id: 1 }])
})

test('a path with a space, too long for a socket, is served', { timeout: 60_000 }, async () => {
  folder = join(base, 'a folder', 'x'.repeat(90), 'data')
  mkdirSync(folder, { recursive: true, mode: 0o755 })
  expect(await answers((await start()).url('owner'))).toBe(true)
})

test('root is refused over the network, and secrets are readable by their owner alone', {
  timeout: 60_000,
}, async () => {
  const { port, note } = await start()
  await expect(answers(`mariadb://root@127.0.0.1:${port}/mysql`)).rejects.toThrow()
  expect(statSync(join(folder, 'secrets.json')).mode & 0o777).toBe(0o600)
  expect(statSync(join(folder, 'mariadb/init.sql')).mode & 0o777).toBe(0o600)
  expect(note).toBe('')
  // Root gives the files to user mysql, who can enter here; anybody else keeps them.
  expect(statSync(`/proc/${serverPid()}`).uid === 0).toBe(false)
})

test.runIf(isRoot)('below a closed folder the server runs as root and says so', { timeout: 60_000 }, async () => {
  chmodSync(base, 0o700)
  const { note, url } = await start()
  expect(note).toContain('as root')
  expect(await answers(url('owner'))).toBe(true)
})

test.runIf(isRoot)('a person who is not root runs it as themselves', { timeout: 60_000 }, () => {
  chmodSync(base, 0o777)
  const script = `
    const { startMariadb, stopMariadb } = await import('${join(process.cwd(), 'database/run/mariadb.mjs')}')
    const { port } = await startMariadb({ folder: '${folder}', hold: true, durable: false })
    await stopMariadb('${folder}')
    console.log(port)`
  const nobody = { uid: 65_534, gid: 65_534, cwd: '/', encoding: 'utf8' } as const
  const run = spawnSync(process.execPath, ['--input-type=module', '-e', script], nobody)
  expect(run.stderr).toBe('')
  expect(Number(run.stdout)).toBeGreaterThan(0)
})

test('a lock left by a process that died is taken over, and one of a living process is not', async () => {
  const file = join(base, 'lock')
  const dead = spawnSync(process.execPath, ['-e', '']).pid
  writeFileSync(file, `${dead}:1`)
  const order: string[] = []
  const one = locked(file, async () => {
    await pause(100)
    order.push('first')
  })
  await pause(50)
  await Promise.all([one, locked(file, async () => void order.push('second'))])
  expect(order).toEqual(['first', 'second'])
  expect(existsSync(file)).toBe(false)
})
