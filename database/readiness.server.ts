import { setTimeout as pause } from 'node:timers/promises'
import { migrations } from './migrations/list.ts'
import { select } from './sequelize.server.ts'

const PATIENCE_MS = 1000

/**
 * `ready` when the database answers within a second and its schema is the one this build was made for; else what is
 * wrong. A hung disk counts as away: there, a statement waits and never fails.
 */
export async function readiness(): Promise<'ready' | 'database away' | 'schema differs'> {
  const patience = new AbortController()
  const applied = await Promise.race([
    select<{ name: string }>('SELECT name FROM schema_migrations').catch(() => null),
    pause(PATIENCE_MS, null, { signal: patience.signal, ref: false }).catch(() => null),
  ])
  patience.abort()
  if (!applied) return 'database away'
  const names = new Set(applied.map(({ name }) => name))
  const expected = Object.keys(migrations)
  return names.size === expected.length && expected.every(name => names.has(name)) ? 'ready' : 'schema differs'
}
