// npm test [-- what vitest is given]: installs what is missing, runs the tests against a MariaDB and a browser of their
// own, and leaves nothing running.
import { spawn } from 'node:child_process'
import { chmodSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { dependencies } from '../../database/run/dependencies.mjs'
import { stopMariadb } from '../../database/run/mariadb.mjs'
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
// The run stops its own server, unless it was killed.
await stopMariadb(data)
rmSync(data, { recursive: true, force: true })
process.exit()

/**
 * @param {string[]} args
 * @returns {Promise<number>} the exit code
 */
function vitest(args) {
  const [program, ...rest] = resolved(['node', 'node_modules/vitest/vitest.mjs', ...args])
  const run = spawn(program, rest, { cwd: ROOT, env: { ...process.env, CANNULARY_TEST_DATA: data }, stdio: 'inherit' })
  end.addEventListener('abort', () => {
    run.kill('SIGINT')
    setTimeout(() => run.kill('SIGKILL'), 5000).unref()
  })
  return new Promise((resolve, reject) => {
    run.once('error', reject)
    run.once('exit', code => resolve(end.aborted ? 130 : (code ?? 1)))
  })
}
