import { spawn } from 'node:child_process'
import { mkdirSync } from 'node:fs'
import { dependencies } from './dependencies.mjs'
import { runningMariadb, startMariadb, stopMariadb } from './mariadb.mjs'
import { freePort } from './processes.mjs'
import { servedDatabase } from './served-database.mjs'
import { settings as settingsFrom } from './settings.mjs'
import { endAsked, step } from './steps.mjs'
import { ROOT, resolved, tool } from './tool.mjs'

const LONGEST_END_MS = 2500

/**
 * How one of the two ways of running differs from the other.
 * @typedef {object} Way
 * @property {'production' | 'development'} mode
 * @property {string[]} server the program that serves, as for `tool`
 * @property {(end: AbortSignal) => Promise<void>} [before] what has to be done before serving
 * @property {boolean} [waits] true when the server loads at once, listens when it is told to, and tells when it does
 */

/**
 * Brings up everything the application needs, serves it until the operator ends it, and takes down what it brought up.
 * @param {Way} way
 */
export async function launch(way) {
  const end = endAsked()
  /** @type {string | null} */
  let held = null
  try {
    const settings = settingsFrom(process.env)
    await addressIsFree(settings)
    mkdirSync(settings.folder, { recursive: true, mode: 0o711 })
    await step('Packages', async () => [await dependencies(end), null])
    const database = await step('MariaDB', async () => {
      const served = await servedDatabase(settings)
      return [served.says, served]
    })
    if (database.held) held = settings.folder
    end.throwIfAborted()
    const env = { ...database.env, NODE_ENV: way.mode, TZ: 'UTC' }
    await way.before?.(end)
    const data = () => dataMade(settings, env, end)
    if (!way.waits) await data()
    process.exitCode = await served(way, settings, env, end, { held, first: way.waits ? data : undefined })
  } catch (error) {
    if (!end.aborted) {
      console.error(error instanceof Error ? `\n${error.message}` : error)
      process.exitCode = 1
    }
  }
  if (held) await stopMariadb(held)
  process.exit()
}

/** @param {import('./settings.mjs').Settings} settings */
async function addressIsFree({ port, host }) {
  if (port === 0 || (await freePort(port, host))) return
  throw new Error(`Port ${port} is in use. Stop what uses it, or choose another: PORT=${port + 1} npm start`)
}

/**
 * @param {import('./settings.mjs').Settings} settings
 * @param {NodeJS.ProcessEnv} env
 * @param {AbortSignal} signal
 */
async function dataMade({ demo, databaseUrl }, env, signal) {
  const advice = [
    databaseUrl ? 'Is DATABASE_URL right, and may its user create tables there?' : '',
    demo ? 'To start without the demo hospital: DEMO=off npm start' : '',
  ].join('\n')
  const command = ['tsx', 'database/commands/prepare.ts', ...(demo ? ['--demo'] : [])]
  await step('Data', async () => [await tool(command, { env, signal, advice }), null])
}

/**
 * @param {Way} way
 * @param {import('./settings.mjs').Settings} settings
 * @param {NodeJS.ProcessEnv} env
 * @param {AbortSignal} end
 * @param {{ held: string | null, first?: (() => Promise<void>) | undefined }} around the data folder whose MariaDB is this
 *   process's own, and what has to be done before a waiting server may listen
 * @returns {Promise<number>} the exit code
 */
async function served(way, settings, env, end, { held, first }) {
  const [program, ...args] = resolved(way.server)
  const server = spawn(program, args, {
    cwd: ROOT,
    env: { ...process.env, ...env, ...(first ? { LISTEN: 'when told' } : {}) },
    stdio: way.waits ? ['ignore', 'inherit', 'inherit', 'ipc'] : ['ignore', 'inherit', 'inherit'],
  })
  const { promise: over, settle } = settled()
  server.once('error', error => settle(error))
  server.once('exit', code => {
    if (!end.aborted) console.error('The application ended by itself. What it wrote last is above.')
    settle(end.aborted ? 0 : code || 1)
  })
  server.once('message', () => console.log(`\nCannulary is at ${settings.address}   End it with Ctrl-C.\n`))
  const watch = held ? setInterval(() => void revive(held).catch(settle), 1000) : undefined
  const stop = () => {
    clearInterval(watch)
    server.kill('SIGTERM')
    setTimeout(() => server.kill('SIGKILL'), LONGEST_END_MS).unref()
  }
  if (end.aborted) stop()
  end.addEventListener('abort', stop)
  first?.().then(() => server.connected && server.send('listen'), settle)
  const outcome = await over
  clearInterval(watch)
  if (typeof outcome === 'number') return outcome
  server.kill('SIGTERM')
  throw outcome
}

/** A promise with the function that settles it. */
function settled() {
  /** @type {(outcome: number | Error) => void} */
  let settle = () => {}
  /** @type {Promise<number | Error>} */
  const promise = new Promise(resolve => {
    settle = resolve
  })
  return { promise, settle }
}

let reviving = false

/**
 * Starts the database again after it was killed, on its old port, where the application looks for it.
 * @param {string} folder
 */
async function revive(folder) {
  if (reviving || runningMariadb(folder)) return
  reviving = true
  console.error('MariaDB ended unexpectedly. Starting it again.')
  await startMariadb({ folder, hold: true })
  reviving = false
}
