import { startMariadb } from './mariadb.mjs'
import { sessionSecret } from './settings.mjs'

/**
 * The database that a start or a command is to use: the server that DATABASE_URL names, or the private one of the data
 * folder, which is started when it does not run.
 * @param {import('./settings.mjs').Settings} settings
 * @returns {Promise<{ held: boolean, says: string, env: NodeJS.ProcessEnv }>} `held` when this process has to stop it;
 *   `env` for the programs that use it
 */
export async function servedDatabase(settings) {
  const { folder, databaseUrl } = settings
  const secret = { SESSION_SECRET: sessionSecret(process.env, settings) }
  if (databaseUrl) {
    const ownerUrl = process.env.DATABASE_OWNER_URL || databaseUrl
    const { host, pathname } = new URL(databaseUrl)
    const env = { ...settings.env, ...secret, DATABASE_URL: databaseUrl, DATABASE_OWNER_URL: ownerUrl }
    return { held: false, says: `as given: ${host}${pathname}`, env }
  }
  const server = await startMariadb({ folder, hold: true })
  const says = `${server.held ? 'runs' : 'was running'} on 127.0.0.1:${server.port}, data in ${folder}`
  return {
    held: server.held,
    says: server.note ? `${says}, ${server.note}` : says,
    env: { ...settings.env, ...secret, DATABASE_URL: server.url('app'), DATABASE_OWNER_URL: server.url('owner') },
  }
}
