import { spawn } from 'node:child_process'
import { existsSync, openSync, readFileSync, rmSync } from 'node:fs'
import { connect } from 'node:net'
import { join } from 'node:path'
import { MARIADB } from './debian-package.mjs'
import { freePort, isRunning, processStamp, until } from './processes.mjs'

/**
 * Runs a server on its usual port, or on another when that is taken, and waits until it answers.
 * @param {import('./mariadb-folder.mjs').Place} at
 * @param {number | undefined} usualPort
 * @param {boolean} durable
 */
export async function launched(at, usualPort, durable) {
  // Between finding a port free and taking it, somebody else may take it: hence more than one try.
  for (let tries = 1; ; tries += 1) {
    const port = (tries === 1 && usualPort && (await freePort(usualPort))) || (await freePort())
    if (!port) throw new Error('No free port on 127.0.0.1.')
    const server = await launchedOn(at, port, durable)
    if (server) return { port, server }
    if (tries === 3) throw new Error(`MariaDB did not start. The end of ${logFile(at.folder)}:\n${logEnd(at.folder)}`)
  }
}

/**
 * @param {import('./mariadb-folder.mjs').Place} at
 * @param {number} port
 * @param {boolean} durable
 * @returns {Promise<string | null>} the stamp of the server's process, or null when it ended at once
 */
async function launchedOn(at, port, durable) {
  rmSync(at.pidFile, { force: true })
  const log = openSync(logFile(at.folder), 'a', 0o600)
  const child = spawn(MARIADB.program, flags(at, port, durable), {
    ...at.as,
    cwd: '/',
    detached: true, // out of the terminal's process group: Ctrl-C must reach the application before its database
    stdio: ['ignore', log, log],
  })
  child.unref()
  await new Promise((spawned, failed) => child.once('spawn', spawned).once('error', failed))
  const stamp = processStamp(child.pid)
  // Recovery after a crash comes before the greeting, and may take a while with much unwritten work.
  const answered = await until(
    async () => !isRunning(stamp) || (existsSync(at.pidFile) && (await greets(port))),
    120_000,
  )
  if (!answered) throw new Error(`MariaDB does not answer after two minutes. See ${logFile(at.folder)}`)
  return isRunning(stamp) ? stamp : null
}

// Nothing waits for the disk: what a test wrote need not outlive the machine.
const FAST = [
  ...['--innodb-flush-log-at-trx-commit=0', '--innodb-flush-method=nosync', '--innodb-doublewrite=0', '--sync-frm=OFF'],
  ...['--innodb-buffer-pool-dump-at-shutdown=OFF', '--innodb-log-file-size=32M'],
]

/**
 * @param {import('./mariadb-folder.mjs').Place} at
 * @param {number} port
 * @param {boolean} durable
 */
function flags(at, port, durable) {
  const sqlMode =
    'STRICT_TRANS_TABLES,STRICT_ALL_TABLES,ONLY_FULL_GROUP_BY,NO_ZERO_DATE,NO_ZERO_IN_DATE,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION'
  return [
    ...['--no-defaults', ...at.userFlags, `--datadir=${at.data}`, `--tmpdir=${at.tmp}`, `--init-file=${at.init}`],
    ...[`--pid-file=${at.pidFile}`, `--socket=${at.socket}`, '--bind-address=127.0.0.1', `--port=${port}`],
    ...['--skip-name-resolve', '--performance-schema=OFF', '--default-time-zone=+00:00', `--sql-mode=${sqlMode}`],
    ...['--character-set-server=utf8mb4', '--collation-server=utf8mb4_uca1400_ai_ci'],
    // Read-then-write under REPEATABLE READ loses updates without it (395 of 600, measured).
    '--innodb-snapshot-isolation=ON',
    // The default of a day would let one forgotten ALTER freeze every writer.
    ...['--lock-wait-timeout=60', '--innodb-lock-wait-timeout=5'],
    ...(durable ? ['--innodb-flush-log-at-trx-commit=1'] : FAST),
  ]
}

/**
 * @param {number} port
 * @returns {Promise<boolean>} true when a MariaDB sends its greeting: byte 4 is the protocol's version, 10
 */
function greets(port) {
  return new Promise(resolve => {
    const socket = connect({ port, host: '127.0.0.1', timeout: 1000 })
    /** @param {boolean} answer */
    const settle = answer => {
      socket.destroy()
      resolve(answer)
    }
    socket.once('data', bytes => settle(bytes[4] === 10))
    socket
      .once('error', () => settle(false))
      .once('close', () => settle(false))
      .once('timeout', () => settle(false))
  })
}

/**
 * Where the server of a data folder writes what happens to it.
 * @param {string} folder
 */
export function logFile(folder) {
  return join(folder, 'mariadb.log')
}

/** @param {string} folder */
function logEnd(folder) {
  return readFileSync(logFile(folder), 'utf8').trimEnd().split('\n').slice(-8).join('\n')
}
