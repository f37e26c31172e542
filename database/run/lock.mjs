import { linkSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { isRunning, processStamp, until } from './processes.mjs'

/**
 * Does the work while no other process does work under the same lock file. A lock left by a process that died is
 * taken over. Fails when the lock is not free within a minute.
 * @template T
 * @param {string} file
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function locked(file, work) {
  const mine = processStamp(process.pid) ?? String(process.pid)
  if (!(await until(() => taken(file, mine), 60_000))) {
    throw new Error(`${file} is held by process ${readLock(file)?.split(':')[0]}. Wait for it to finish, or end it.`)
  }
  try {
    return await work()
  } finally {
    rmSync(file, { force: true })
  }
}

/**
 * @param {string} file
 * @param {string} mine
 */
function taken(file, mine) {
  const draft = `${file}.${process.pid}`
  writeFileSync(draft, mine)
  try {
    // A link appears with its whole content or not at all, so that nobody ever reads half a stamp.
    linkSync(draft, file)
    return true
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error
    removeStale(file)
    return false
  } finally {
    rmSync(draft, { force: true })
  }
}

/** @param {string} file */
function removeStale(file) {
  const holder = readLock(file)
  if (holder === null || isRunning(holder)) return
  const aside = `${file}.stale.${process.pid}`
  try {
    renameSync(file, aside) // of several who see the stale lock, one wins the rename
    if (readLock(aside) !== holder) linkSync(aside, file) // somebody's fresh lock: give it back
  } catch (error) {
    const lost = error instanceof Error && 'code' in error && (error.code === 'ENOENT' || error.code === 'EEXIST')
    if (!lost) throw error
  } finally {
    rmSync(aside, { force: true })
  }
}

/** @param {string} file */
function readLock(file) {
  try {
    return readFileSync(file, 'utf8')
  } catch {
    return null // released meanwhile
  }
}
