import { type ChildProcess, spawn } from 'node:child_process'
import { once } from 'node:events'
import { chmodSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { runningMariadb, startMariadb, stopMariadb } from '../../database/run/mariadb.mjs'
import { freePort, until } from '../../database/run/processes.mjs'
import { ROOT } from '../../database/run/tool.mjs'

let folder: string
let port: number

beforeAll(async () => {
  folder = mkdtempSync(join(process.env.CANNULARY_TEST_DATA ?? tmpdir(), 'cannulary-start-'))
  chmodSync(folder, 0o711)
  port = (await freePort()) ?? 0
})

afterAll(async () => {
  await stopMariadb(folder)
  rmSync(folder, { recursive: true, force: true })
})

/** `npm start` with a data folder and a port of its own. */
function npmStart(environment: Record<string, string> = {}) {
  const { DATABASE_URL: _used, ...inherited } = process.env
  const env = { ...inherited, CANNULARY_DATA: folder, PORT: String(port), ...environment }
  const child = spawn('npm', ['start'], { cwd: ROOT, env, stdio: ['ignore', 'pipe', 'pipe'] })
  const started = { child, ended: once(child, 'exit'), output: '' }
  for (const stream of [child.stdout, child.stderr]) {
    stream.on('data', (chunk: Buffer) => {
      started.output += chunk.toString()
    })
  }
  return started
}

async function readiness() {
  const answer = await fetch(`http://127.0.0.1:${port}/health/ready`)
  return (await answer.json()).status
}

function databasePid() {
  return Number(readFileSync(join(folder, 'mariadb/server.pid'), 'utf8'))
}

async function serving(started: { child: ChildProcess; output: string }) {
  await until(() => started.output.includes('End it with') || started.child.exitCode !== null, 100_000)
  return started.output
}

test('npm start leads to a page, mends its database, and is ended by SIGTERM', { timeout: 120_000 }, async () => {
  const started = npmStart()
  expect(await serving(started)).toMatch(/Packages .*\nMariaDB .*\nApplication .*\nData .*\n\nCannulary is/)
  expect(await readiness()).toBe('ready')
  process.kill(databasePid(), 'SIGKILL')
  expect(await until(async () => (await readiness()) === 'database away', 10_000)).toBe(true)
  expect(await until(async () => (await readiness()) === 'ready', 30_000)).toBe(true)
  started.child.kill('SIGTERM')
  await started.ended
  await expect(fetch(`http://127.0.0.1:${port}/health`)).rejects.toThrow()
  expect(runningMariadb(folder)).toBeNull()
})

test('a database that was started by hand is used and left running', { timeout: 120_000 }, async () => {
  await startMariadb({ folder })
  const started = npmStart({ DEMO: 'off' })
  expect(await serving(started)).toContain('was running on 127.0.0.1')
  started.child.kill('SIGTERM')
  await started.ended
  expect(runningMariadb(folder)).not.toBeNull()
})

test.each([
  [{ PORT: 'three' }, 'PORT is three'],
  [{ DATABASE_URL: 'postgres://here/there' }, 'DATABASE_URL has the form mariadb://'],
  [{ DATABASE_URL: 'mariadb://a:b@127.0.0.1:1/c', NODE_ENV: 'production' }, 'SESSION_SECRET is missing'],
])('a setting that cannot be right is named: %o', { timeout: 60_000 }, async (environment, words) => {
  const started = npmStart(environment)
  const [code] = await started.ended
  expect(code).toBe(1)
  expect(started.output).toContain(words)
})
