import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { readdirSync, readFileSync } from 'node:fs'
import { ROOT, resolved } from '../../database/run/tool.mjs'

/** A server under measurement. */
export interface Served {
  readonly port: number
  readonly pid: number
  /** Ends it and waits until it is gone. */
  stop(): Promise<void>
}

/** Starts a server of the project on a free port of 127.0.0.1; `flags` are Node's. What it logs is read and dropped. */
export async function served(file: string, env: NodeJS.ProcessEnv, flags: readonly string[] = []): Promise<Served> {
  const [program, ...args] = resolved(['tsx', file])
  const settings = { HOST: '127.0.0.1', PORT: '0', NODE_ENV: 'production', ...env }
  const child = spawn(program, [...flags, ...args], {
    cwd: ROOT,
    env: { ...process.env, ...settings },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  })
  let errors = ''
  child.stdout?.resume()
  child.stderr?.on('data', (chunk: Buffer) => {
    errors = (errors + chunk.toString()).slice(-4000)
  })
  const ended = once(child, 'exit')
  const listening = await Promise.race([once(child, 'message'), ended.then(() => null)])
  if (!listening || child.pid === undefined) throw new Error(`${file} ended before it listened:\n${errors}`)
  const [message] = listening as [{ listening: number }]
  return {
    port: message.listening,
    pid: child.pid,
    async stop() {
      child.kill('SIGTERM')
      await ended
    },
  }
}

/** The CPU time that processes have used so far with all their threads, in ms; to the microsecond, so that rounds may be short. */
export function cpuMs(pids: readonly number[]): number {
  const tasks = pids.flatMap(pid => readdirSync(`/proc/${pid}/task`).map(task => `/proc/${pid}/task/${task}/schedstat`))
  const nanoseconds = tasks.map(file => Number(readFileSync(file, 'utf8').split(' ')[0]))
  return nanoseconds.reduce((sum, time) => sum + time, 0) / 1e6
}
