import '../environment.ts'
import { parseArgs } from 'node:util'
import { closePasswords } from '#app/auth/password.server.ts'
import { env } from '#app/env.server.ts'
import { showDateTime, showDuration } from '#app/time/display.ts'
import { days, since } from '#app/time/duration.ts'
import { connection } from '../connection.server.ts'
import { demoSeededAt, population } from '../demo.server.ts'
import { demoHospital } from '../seeders/hospital.ts'
import { loadDemo } from '../seeders/load.server.ts'
import { emptyDemo } from '../seeders/reset.server.ts'
import { sequelize } from '../sequelize.server.ts'

const FRESH = 'npm run seed -- --reset'
const zone = env.hospitalTimeZone

const owner = connection(env.databaseOwnerUrl, { maxConnections: 2, queryTimeoutMs: 60_000 })
try {
  console.log(await answer())
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
} finally {
  await Promise.all([owner.close(), sequelize.close(), closePasswords()])
}

async function answer(): Promise<string> {
  const { values } = parseArgs({
    options: { 'if-empty': { type: 'boolean' }, reset: { type: 'boolean' }, now: { type: 'string' } },
  })
  const now = moment(values.now)
  if (values.reset) {
    await emptyDemo(owner)
    return load(now)
  }
  const { patients, accounts } = await population()
  if (patients === 0 && accounts === 0) return load(now)
  const seededAt = await demoSeededAt()
  const stands = seededAt ? standing(seededAt, now) : 'The database is in use, so no demo hospital is added.'
  if (values['if-empty']) return stands
  throw new Error(seededAt ? `Nothing was changed. ${stands} Replace it: ${FRESH}` : stands)
}

function moment(text: string | undefined): Date {
  const at = text === undefined ? new Date() : new Date(text)
  if (Number.isNaN(at.getTime())) throw new Error(`--now is ${text}: write it as 2026-12-01T14:06:00Z`)
  return at
}

async function load(now: Date): Promise<string> {
  const startedAt = performance.now()
  const hospital = demoHospital(now, zone)
  await loadDemo(owner, hospital)
  const { wards, patients, people, entries } = hospital
  const counts = `${wards.length} wards, ${patients.length} patients, ${people.length} accounts, ${entries.length} entries`
  const took = ((performance.now() - startedAt) / 1000).toFixed(1)
  return `Demo hospital as of ${showDateTime(now, zone)}: ${counts}, in ${took} s.`
}

function standing(seededAt: Date, now: Date): string {
  const age = since(seededAt, now)
  const loaded = `The demo hospital was made on ${showDateTime(seededAt, zone)}.`
  return age <= days(1)
    ? loaded
    : `${loaded} It is ${showDuration(age)} old, so all its care is late. Make a fresh one: ${FRESH}`
}
