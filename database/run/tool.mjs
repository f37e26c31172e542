import { spawn } from 'node:child_process'
import { fileURLToPath } from 'node:url'

/** The project's folder, with a closing slash. */
export const ROOT = fileURLToPath(new URL('../../', import.meta.url))

/**
 * Runs a program of the project to its end and returns the last line it wrote. Throws with the end of what it wrote
 * when it fails.
 * @param {string[]} command the program and its arguments; `node` and `tsx` mean this very Node.js
 * @param {{ env?: NodeJS.ProcessEnv | undefined, signal?: AbortSignal | undefined, advice?: string | undefined }} [options]
 * @returns {Promise<string>}
 */
export function tool(command, { env = {}, signal, advice = '' } = {}) {
  const [program, ...args] = resolved(command)
  const child = spawn(program, args, {
    cwd: ROOT,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
    signal,
  })
  let output = ''
  for (const stream of [child.stdout, child.stderr])
    stream.on('data', chunk => {
      output += chunk
    })
  return new Promise((resolve, reject) => {
    child.once('error', reject)
    child.once('close', (code, killedBy) => {
      const lines = output.trimEnd().split('\n')
      if (code === 0) return resolve(lines.at(-1) ?? '')
      const how = killedBy ? `was ended by ${killedBy}` : `failed (${code})`
      reject(new Error(`${command.join(' ')} ${how}:\n${lines.slice(-20).join('\n')}\n${advice}`.trimEnd()))
    })
  })
}

/**
 * @param {string[]} command
 * @returns {[string, ...string[]]}
 */
export function resolved([program = '', ...args]) {
  if (program === 'node') return [process.execPath, ...args]
  if (program === 'tsx') return [process.execPath, '--import', 'tsx', ...args]
  return [program, ...args]
}
