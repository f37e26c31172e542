/**
 * Does one step of a start and tells it in one line: its name at once, what came of it and the time when it is done.
 * @template T
 * @param {string} name
 * @param {() => Promise<[says: string, value: T]>} work
 * @returns {Promise<T>}
 */
export async function step(name, work) {
  const startedAt = performance.now()
  const time = () => `${((performance.now() - startedAt) / 1000).toFixed(1)} s`
  process.stdout.write(`${name.padEnd(14)}`)
  try {
    const [says, value] = await work()
    process.stdout.write(`${says} (${time()})\n`)
    return value
  } catch (error) {
    process.stdout.write(`failed (${time()})\n`)
    throw error
  }
}

/**
 * A signal that aborts when the operator asks for the end: Ctrl-C, or SIGTERM from npm or a service manager.
 * @returns {AbortSignal}
 */
export function endAsked() {
  const asked = new AbortController()
  for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, () => asked.abort())
  return asked.signal
}
