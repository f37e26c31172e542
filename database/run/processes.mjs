import { readFileSync } from 'node:fs'
import { createServer } from 'node:net'
import { setTimeout as pause } from 'node:timers/promises'

/**
 * Names one process for good: its number together with its start time, since a number alone is used again.
 * Null when no such process runs. A zombie, which a container without an init keeps for ever, does not run.
 * @param {number | undefined} pid
 * @returns {string | null}
 */
export function processStamp(pid) {
  if (!pid) return null
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    // The name in brackets may hold spaces: the fields are counted from behind it. 0 = state, 19 = start time.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    return fields[0] === 'Z' ? null : `${pid}:${fields[19]}`
  } catch {
    return null // no such process
  }
}

/**
 * True while the process that was stamped still runs.
 * @param {string | null | undefined} stamp
 */
export function isRunning(stamp) {
  return Boolean(stamp) && processStamp(Number(stamp?.split(':')[0])) === stamp
}

/**
 * Waits until the condition holds, looking every 25 ms. False when it did not within the time.
 * @param {() => boolean | Promise<boolean>} condition
 * @param {number} timeMs
 */
export async function until(condition, timeMs) {
  const end = performance.now() + timeMs
  while (!(await condition())) {
    if (performance.now() > end) return false
    await pause(25)
  }
  return true
}

/**
 * True when nothing listens on the port, so that a server may be given it.
 * @param {number} port 0 asks for any free one
 * @param {string} [host]
 * @returns {Promise<number | null>} the port, or null when it is taken
 */
export function freePort(port = 0, host = '127.0.0.1') {
  return new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', error => {
      if ('code' in error && error.code === 'EADDRINUSE') resolve(null)
      else reject(error)
    })
    probe.listen({ port, host, exclusive: true }, () => {
      const address = probe.address()
      probe.close(() => resolve(address && typeof address === 'object' ? address.port : null))
    })
  })
}
