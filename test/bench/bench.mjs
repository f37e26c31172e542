// npm run bench [-- --json] [-- --profile]: measures the built application against bare routes of the same framework, on a
// MariaDB of its own in a temporary folder, and leaves nothing running. A missed target is reported; it is no failure.
import { spawn } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import { chmodSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { built } from '../../database/run/build.mjs'
import { dependencies } from '../../database/run/dependencies.mjs'
import { startMariadb, stopMariadb } from '../../database/run/mariadb.mjs'
import { endAsked } from '../../database/run/steps.mjs'
import { ROOT, resolved, tool } from '../../database/run/tool.mjs'

const end = endAsked()
const folder = mkdtempSync(join(tmpdir(), 'cannulary-bench-'))
chmodSync(folder, 0o711) // user mysql has to walk through

try {
  await dependencies(end)
  await built(end)
  await tool(['node', 'node_modules/@react-router/dev/bin.js', 'build', 'test/bench/floor'], {
    env: { NODE_ENV: 'production' },
    signal: end,
  })
  const { url } = await startMariadb({ folder, hold: true })
  process.exitCode = await measured({
    BENCH_FOLDER: folder,
    APP_SERVER: url('app', ''),
    OWNER_SERVER: url('owner', ''),
    // The loader shares code with the application, which checks its settings as it starts.
    DATABASE_URL: url('owner', 'bench'),
    SESSION_SECRET: randomBytes(32).toString('hex'),
  })
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
}
await stopMariadb(folder)
rmSync(folder, { recursive: true, force: true })
process.exit()

/**
 * @param {Record<string, string>} env
 * @returns {Promise<number>} the exit code
 */
function measured(env) {
  const [program, ...args] = resolved(['tsx', 'test/bench/measure.ts', ...process.argv.slice(2)])
  const run = spawn(program, args, { cwd: ROOT, env: { ...process.env, ...env, TZ: 'UTC' }, stdio: 'inherit' })
  end.addEventListener('abort', () => run.kill('SIGTERM'))
  return new Promise((resolve, reject) => {
    run.once('error', reject)
    run.once('exit', code => resolve(end.aborted ? 130 : (code ?? 1)))
  })
}
