// npm run migrate | seed | verify | admin: runs a command of database/commands on the database that npm start uses, and
// brings that up for as long as the command takes.
import { spawn } from 'node:child_process'
import { mkdirSync } from 'node:fs'
import { dependencies } from './dependencies.mjs'
import { stopMariadb } from './mariadb.mjs'
import { servedDatabase } from './served-database.mjs'
import { settings as settingsFrom } from './settings.mjs'
import { endAsked } from './steps.mjs'
import { ROOT, resolved } from './tool.mjs'

const [name = '', ...options] = process.argv.slice(2)
const end = endAsked() // the command is told by the terminal itself, and the database stays up until it has ended

try {
  await dependencies(end)
  const settings = settingsFrom(process.env)
  mkdirSync(settings.folder, { recursive: true, mode: 0o711 })
  const { held, env } = await servedDatabase(settings)
  process.exitCode = await run(env)
  if (held) await stopMariadb(settings.folder)
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
}
process.exit()

/**
 * @param {NodeJS.ProcessEnv} env
 * @returns {Promise<number>} the exit code
 */
function run(env) {
  const [program, ...args] = resolved(['tsx', `database/commands/${name}.ts`, ...options])
  const child = spawn(program, args, { cwd: ROOT, env: { ...process.env, ...env }, stdio: 'inherit' })
  end.addEventListener('abort', () => child.kill('SIGTERM'))
  return new Promise((resolve, reject) => {
    child.once('error', reject)
    child.once('exit', code => resolve(code ?? 1))
  })
}
