import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { inject } from 'vitest'
import { connection } from '#database/connection.server.ts'
import { grantAppRights } from '#database/grants.server.ts'
import { migrateUp } from '#database/migrate.server.ts'
import { ROOT, resolved, tool } from '../../database/run/tool.mjs'

export interface StartedApp {
  /** Where it answers: `http://127.0.0.1:41234`, without a slash. */
  readonly url: string
  /** Its database, as the application's user and as the owner. */
  readonly databaseUrl: string
  readonly ownerUrl: string
  /** All that the server has written so far. */
  readonly log: () => string
  /** Ends it as an operator would, with SIGTERM, and drops its database. Gives the exit code. */
  readonly stop: () => Promise<number | null>
}

let counter = 0

/** Starts the built application on a free port, on a database of its own with today's schema. */
export async function startedApp({ timeZone = 'Europe/London', demo = true } = {}): Promise<StartedApp> {
  counter += 1
  const name = `cannulary_journey_${process.pid}_${counter}`
  const databaseUrl = `${inject('appServer')}/${name}`
  const ownerUrl = `${inject('ownerServer')}/${name}`
  await makeDatabase(name, databaseUrl, ownerUrl)
  const env = {
    DATABASE_URL: databaseUrl,
    DATABASE_OWNER_URL: ownerUrl,
    HOSPITAL_TIME_ZONE: timeZone,
    SESSION_SECRET: 'a secret for tests alone, 40 characters.',
    HOST: '127.0.0.1',
    PORT: '0',
    NODE_ENV: 'production',
  }
  if (demo) await tool(['tsx', 'database/commands/seed.ts', '--if-empty'], { env })
  return served(env, { databaseUrl, ownerUrl }, () => dropDatabase(name))
}

async function served(
  env: Record<string, string>,
  urls: { databaseUrl: string; ownerUrl: string },
  afterwards: () => Promise<void>,
): Promise<StartedApp> {
  const [program, ...args] = resolved(['tsx', 'server.ts'])
  // Over the channel the server tells its port, and ends when this process is killed.
  const child = spawn(program, args, {
    cwd: ROOT,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  })
  let log = ''
  for (const stream of [child.stdout, child.stderr]) {
    stream?.on('data', (chunk: Buffer) => {
      log += chunk.toString()
    })
  }
  const ended = once(child, 'exit')
  const listening = await Promise.race([once(child, 'message'), ended.then(() => null)])
  if (!listening) throw new Error(`The server ended before it listened:\n${log}`)
  const [message] = listening as [{ listening: number }]
  return {
    ...urls,
    url: `http://127.0.0.1:${message.listening}`,
    log: () => log,
    async stop() {
      child.kill('SIGTERM')
      const [code] = (await ended) as [number | null]
      await afterwards()
      return code
    },
  }
}

async function makeDatabase(name: string, databaseUrl: string, ownerUrl: string) {
  await asOwner(server => server.query(`CREATE DATABASE \`${name}\``))
  const owner = connection(ownerUrl, { maxConnections: 3 })
  try {
    await migrateUp(owner)
    await grantAppRights(owner, databaseUrl)
  } finally {
    await owner.close()
  }
}

async function dropDatabase(name: string) {
  await asOwner(server => server.query(`DROP DATABASE \`${name}\``))
}

async function asOwner(work: (server: ReturnType<typeof connection>) => Promise<unknown>) {
  const server = connection(`${inject('ownerServer')}/`, { maxConnections: 1 })
  try {
    await work(server)
  } finally {
    await server.close()
  }
}
