import { randomBytes } from 'node:crypto'
import { readFileSync, renameSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

/**
 * The secret of that name, made at random the first time and kept in the data folder, readable by its owner alone.
 * @param {string} folder the data folder
 * @param {'owner' | 'app' | 'backup' | 'session'} name a database user's password, or what signs sessions
 */
export function keptSecret(folder, name) {
  const file = join(folder, 'secrets.json')
  const kept = readSecrets(file)
  const known = kept[name]
  if (known) return known
  const made = randomBytes(32).toString('hex')
  writeFileSync(`${file}.new`, `${JSON.stringify({ ...kept, [name]: made }, null, 2)}\n`, { mode: 0o600, flush: true })
  renameSync(`${file}.new`, file)
  return made
}

/**
 * @param {string} file
 * @returns {Record<string, string>}
 */
function readSecrets(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'))
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return {}
    throw new Error(`${file} cannot be read. It holds the database's passwords: restore it from a backup.`, {
      cause: error,
    })
  }
}
