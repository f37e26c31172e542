import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { installed, MARIADB } from './debian-package.mjs'
import { locked } from './lock.mjs'
import { DATABASE, place, prepare } from './mariadb-folder.mjs'
import { launched, logFile } from './mariadb-launch.mjs'
import { isRunning, processStamp, until } from './processes.mjs'
import { keptSecret } from './secrets.mjs'

/**
 * What is remembered of a server: its port, the stamp of its process, and the stamp of the process that stops it
 * again (null: it stays until it is stopped by hand).
 * @typedef {{ port: number, server: string, holder: string | null }} State
 *
 * A running server.
 * @typedef {object} Mariadb
 * @property {number} port on 127.0.0.1
 * @property {boolean} held true when this process is the one to stop it
 * @property {string} note what the operator should know, or ''
 * @property {(user: 'owner' | 'app' | 'backup', database?: string) => string} url
 */

/**
 * Starts the private MariaDB of a data folder, or finds it running. Installs Debian's package and makes the database
 * files first when they are missing. Listens on 127.0.0.1 only, on a port that stays the same while it is free.
 * @param {object} options
 * @param {string} options.folder the data folder
 * @param {boolean} [options.hold] true when this process will stop the server, false when it stays after this process
 * @param {boolean} [options.durable] false trades safety on a power cut for speed, for tests only
 * @returns {Promise<Mariadb>}
 */
export async function startMariadb({ folder: dataFolder, hold = false, durable = true }) {
  const folder = resolve(dataFolder)
  installed(MARIADB)
  mkdirSync(folder, { recursive: true, mode: 0o711 })
  const holder = hold ? processStamp(process.pid) : null
  return locked(join(folder, 'database.lock'), async () => {
    const before = readState(folder)
    if (before && isRunning(before.server)) {
      // A holder that died without stopping its server leaves it to whoever comes next.
      const orphaned = before.holder !== null && !isRunning(before.holder)
      const state = orphaned || !hold ? { ...before, holder } : before
      writeState(folder, state)
      return running(folder, state, '')
    }
    const at = place(folder)
    prepare(at)
    const state = { ...(await launched(at, before?.port, durable)), holder }
    writeState(folder, state)
    return running(folder, state, at.note)
  })
}

/**
 * Stops the server of a data folder cleanly. Refuses while another process, which would start it again, holds it.
 * @param {string} dataFolder
 * @returns {Promise<boolean>} false when none ran
 */
export async function stopMariadb(dataFolder) {
  const folder = resolve(dataFolder)
  if (!existsSync(folder)) return false
  return locked(join(folder, 'database.lock'), async () => {
    const state = readState(folder)
    if (!state || !isRunning(state.server)) return false
    if (state.holder !== processStamp(process.pid) && isRunning(state.holder)) {
      throw new Error(
        `Process ${state.holder?.split(':')[0]} (npm start or npm run dev) uses this database. Stop that.`,
      )
    }
    process.kill(Number(state.server.split(':')[0]), 'SIGTERM')
    if (await until(() => !isRunning(state.server), 60_000)) return true
    throw new Error(
      `MariaDB (process ${state.server.split(':')[0]}) did not stop within a minute. See ${logFile(folder)}`,
    )
  })
}

/**
 * Tells whether the server of a data folder runs, and where. Null when it does not.
 * @param {string} dataFolder
 * @returns {Mariadb | null}
 */
export function runningMariadb(dataFolder) {
  const folder = resolve(dataFolder)
  const state = readState(folder)
  return state && isRunning(state.server) ? running(folder, state, '') : null
}

/**
 * The living process that is to stop the server of a data folder. Null when there is none.
 * @param {string} dataFolder
 * @returns {number | null}
 */
export function holderOf(dataFolder) {
  const holder = readState(resolve(dataFolder))?.holder
  return holder && isRunning(holder) ? Number(holder.split(':')[0]) : null
}

/**
 * @param {string} folder
 * @param {State} state
 * @param {string} note
 * @returns {Mariadb}
 */
function running(folder, state, note) {
  return {
    port: state.port,
    held: state.holder === processStamp(process.pid),
    note,
    url: (user, database = DATABASE) =>
      `mariadb://${DATABASE}_${user}:${keptSecret(folder, user)}@127.0.0.1:${state.port}/${database}`,
  }
}

/**
 * @param {string} folder
 * @returns {State | null}
 */
function readState(folder) {
  const file = join(folder, 'database.json')
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null
}

/**
 * @param {string} folder
 * @param {State} state
 */
function writeState(folder, state) {
  const file = join(folder, 'database.json')
  writeFileSync(`${file}.new`, `${JSON.stringify(state)}\n`)
  renameSync(`${file}.new`, file)
}
