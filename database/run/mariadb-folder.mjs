import { spawnSync } from 'node:child_process'
import {
  chmodSync,
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import { join, resolve } from 'node:path'
import { keptSecret } from './secrets.mjs'

export const DATABASE = 'cannulary'
const LONGEST_SOCKET_PATH = 107 // bytes, sun_path of unix(7) less its closing zero

/**
 * Where one server's files lie, and as whom it runs.
 * @typedef {object} Place
 * @property {string} folder the data folder: secrets, state and log
 * @property {string} data the database files
 * @property {string} tmp
 * @property {string} init statements that the server runs at each start
 * @property {string} pidFile
 * @property {string} socket '' where the path would be too long for a socket
 * @property {{ uid: number, gid: number } | Record<string, never>} as the user to become, empty for the present one
 * @property {string[]} userFlags
 * @property {string} note what the operator should know, or ''
 */

/**
 * Makes the folders of a server and says how it is to be run there. As root the server drops to user mysql, unless
 * a closed folder above keeps that user out: then it runs as root, and the note says so.
 * @param {string} dataFolder
 * @returns {Place}
 */
export function place(dataFolder) {
  const folder = resolve(dataFolder)
  const inner = join(folder, 'mariadb')
  mkdirSync(folder, { recursive: true, mode: 0o711 })
  mkdirSync(inner, { recursive: true, mode: 0o700 })
  const socket = join(inner, 'server.sock')
  const files = {
    folder,
    data: join(inner, 'data'),
    tmp: join(inner, 'tmp'),
    init: join(inner, 'init.sql'),
    pidFile: join(inner, 'server.pid'),
    socket: Buffer.byteLength(socket) <= LONGEST_SOCKET_PATH ? socket : '',
  }
  return { ...files, ...identity(inner) }
}

/**
 * @param {string} inner
 * @returns {Pick<Place, 'as' | 'userFlags' | 'note'>}
 */
function identity(inner) {
  const me = process.getuid?.()
  const belongsTo = statSync(inner).uid
  if (me !== 0) {
    if (belongsTo === me) return { as: {}, userFlags: [], note: '' }
    throw new Error(
      `${inner} belongs to user ${belongsTo}. Start as that user, or set CANNULARY_DATA to another folder.`,
    )
  }
  const mysql = mysqlUser()
  chownSync(inner, mysql.uid, mysql.gid)
  if (spawnSync('/usr/bin/test', ['-w', inner], { ...mysql, cwd: '/' }).status === 0) {
    return { as: mysql, userFlags: [], note: '' }
  }
  const note = 'as root, because user mysql cannot enter a folder above; CANNULARY_DATA may name a more open place'
  return { as: {}, userFlags: ['--user=root'], note }
}

function mysqlUser() {
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find(text => text.startsWith('mysql:'))
  const [, , uid, gid] = line?.split(':') ?? []
  if (!uid || !gid)
    throw new Error('The user mysql, which the MariaDB package makes, is missing. Reinstall mariadb-server.')
  return { uid: Number(uid), gid: Number(gid) }
}

/**
 * Makes the database files where there are none, and hands all files to the user that will run the server.
 * @param {Place} at
 */
export function prepare(at) {
  const { uid, gid } = { uid: process.getuid?.() ?? 0, gid: process.getgid?.() ?? 0, ...at.as }
  mkdirSync(at.tmp, { recursive: true, mode: 0o700 })
  if (!existsSync(at.data)) createDatabaseFiles(at, uid, gid)
  writeFileSync(at.init, initStatements(at.folder), { mode: 0o600 })
  chmodSync(at.init, 0o600)
  if (process.getuid?.() === 0) run('chown', ['-R', `${uid}:${gid}`, join(at.folder, 'mariadb')])
}

/**
 * @param {Place} at
 * @param {number} uid
 * @param {number} gid
 */
function createDatabaseFiles(at, uid, gid) {
  // Made beside and renamed when whole, so that an interrupted installation is never taken for a database.
  const draft = `${at.data}.new`
  rmSync(draft, { recursive: true, force: true })
  mkdirSync(draft, { mode: 0o700 })
  if (process.getuid?.() === 0) run('chown', ['-R', `${uid}:${gid}`, join(at.folder, 'mariadb')])
  const flags = ['--no-defaults', `--datadir=${draft}`, '--skip-test-db', '--skip-name-resolve', ...at.userFlags]
  // The script splits its --tmpdir at a space, but not the variable.
  const env = { ...process.env, TMPDIR: at.tmp }
  run('mariadb-install-db', [...flags, '--auth-root-authentication-method=socket'], { ...at.as, env })
  renameSync(draft, at.data)
}

/**
 * @param {string} program
 * @param {string[]} args
 * @param {import('node:child_process').SpawnSyncOptions} [options]
 */
function run(program, args, options = {}) {
  const done = spawnSync(program, args, { ...options, cwd: '/', encoding: 'utf8' })
  if (done.status === 0) return
  const says = [done.error?.message, done.stdout, done.stderr].filter(Boolean).join('\n').trim()
  throw new Error(`${program} failed:\n${says.split('\n').slice(-12).join('\n')}`)
}

/**
 * Database and users, repeated at each start. The owner migrates; the backup user reads; what the application's user
 * may do is granted table by table after each migration, because it may never change or delete an entry.
 * @param {string} folder
 */
function initStatements(folder) {
  const users = /** @type {const} */ (['owner', 'app', 'backup']).flatMap(name => {
    const user = `'${DATABASE}_${name}'@'127.0.0.1'`
    return [`CREATE USER IF NOT EXISTS ${user};`, `ALTER USER ${user} IDENTIFIED BY '${keptSecret(folder, name)}';`]
  })
  // The second pattern is for scratch databases: a restored backup to be verified, or one of the tests.
  const grants = [`\`${DATABASE}\``, `\`${DATABASE}\\_%\``].flatMap(names => [
    `GRANT ALL ON ${names}.* TO '${DATABASE}_owner'@'127.0.0.1' WITH GRANT OPTION;`,
    `GRANT SELECT, LOCK TABLES, SHOW VIEW, TRIGGER, EVENT ON ${names}.* TO '${DATABASE}_backup'@'127.0.0.1';`,
  ])
  return `${[`CREATE DATABASE IF NOT EXISTS \`${DATABASE}\`;`, ...users, ...grants].join('\n')}\n`
}
