// npm test [-- what vitest is given]: installs what is missing, runs the tests against a MariaDB and a browser of their
// own, and leaves nothing running.
import { spawn } from 'node:child_process'
import { chmodSync, mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { dependencies } from '../../database/run/dependencies.mjs'
import { holderOf, stopMariadb } from '../../database/run/mariadb.mjs'
import { until } from '../../database/run/processes.mjs'
import { endAsked } from '../../database/run/steps.mjs'
import { ROOT, resolved } from '../../database/run/tool.mjs'

const end = endAsked()
const data = mkdtempSync(join(tmpdir(), 'cannulary-test-'))
chmodSync(data, 0o711) // user mysql has to walk through

try {
  await dependencies(end)
  process.exitCode = await vitest(['run', '--config', 'test/vitest.config.ts', ...process.argv.slice(2)])
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
}
await leftoversEnded()
rmSync(data, { recursive: true, force: true, maxRetries: 5, retryDelay: 200 })
process.exit()

/** Tests stop what they start, unless they were killed: then a server, or a whole npm start, is still there. */
async function leftoversEnded() {
  for (const folder of dataFolders(data)) {
    const holder = holderOf(folder)
    if (holder) process.kill(holder, 'SIGTERM')
    await until(() => holderOf(folder) === null, 10_000)
    await stopMariadb(folder)
  }
}

/**
 * @param {string} folder
 * @returns {string[]} the folders at or below it in which a server was started
 */
function dataFolders(folder) {
  const entries = readdirSync(folder, { withFileTypes: true })
  const below = entries.filter(entry => entry.isDirectory() && entry.name !== 'mariadb')
  const own = entries.some(({ name }) => name === 'database.json') ? [folder] : []
  return [...own, ...below.flatMap(({ name }) => dataFolders(join(folder, name)))]
}

/**
 * @param {string[]} args
 * @returns {Promise<number>} the exit code
 */
function vitest(args) {
  const [program, ...rest] = resolved(['node', 'node_modules/vitest/vitest.mjs', ...args])
  // A process group of its own, so that none of its workers is left behind when it is ended in the middle.
  const env = { ...process.env, CANNULARY_TEST_DATA: data }
  const run = spawn(program, rest, { cwd: ROOT, env, stdio: 'inherit', detached: true })
  end.addEventListener('abort', () => {
    run.kill('SIGINT')
    setTimeout(() => endGroup(run.pid), 5000).unref()
  })
  return new Promise((resolve, reject) => {
    run.once('error', reject)
    run.once('exit', code => {
      endGroup(run.pid)
      resolve(end.aborted ? 130 : (code ?? 1))
    })
  })
}

/** @param {number | undefined} leader */
function endGroup(leader) {
  try {
    if (leader) process.kill(-leader, 'SIGKILL')
  } catch (error) {
    const isGone = error instanceof Error && 'code' in error && error.code === 'ESRCH'
    if (!isGone) throw error
  }
}
