import type { Sequelize } from 'sequelize'
import { showDateTime, showDuration } from '#app/time/display.ts'
import { days, since } from '#app/time/duration.ts'
import type { Zone } from '#app/time/zone.ts'
import { demoSeededAt, population } from '../demo.server.ts'

/** What is wanted: `if empty` leaves anything else as it is and says how it stands, `only` refuses, `reset` replaces the demo hospital. */
export type Seeding = 'if empty' | 'only' | 'reset'

const FRESH = 'npm run seed -- --reset'

/**
 * Loads the demo hospital as of `now`, as the owner of the database, and returns in one line what was done or how it stands.
 * Throws when it refuses; nothing has been changed then.
 */
export async function seed(owner: Sequelize, how: Seeding, now: Date, zone: Zone): Promise<string> {
  if (how === 'reset') {
    const { emptyDemo } = await import('./reset.server.ts')
    await emptyDemo(owner)
    return load(owner, now, zone)
  }
  const { patients, accounts } = await population()
  if (patients === 0 && accounts === 0) return load(owner, now, zone)
  const seededAt = await demoSeededAt()
  const stands = seededAt ? standing(seededAt, now, zone) : 'The database is in use, so no demo hospital is added.'
  if (how === 'if empty') return stands
  throw new Error(seededAt ? `Nothing was changed. ${stands} To replace it: ${FRESH}` : stands)
}

/** The makers of the demo hospital are read only when it is made: a start that finds it in place need not wait for them. */
async function load(owner: Sequelize, now: Date, zone: Zone): Promise<string> {
  const startedAt = performance.now()
  const [{ demoHospital }, { loadDemo }] = await Promise.all([import('./hospital.ts'), import('./load.server.ts')])
  const hospital = demoHospital(now, zone)
  await loadDemo(owner, hospital)
  const { wards, patients, people, entries } = hospital
  const counts = `${wards.length} wards, ${patients.length} patients, ${people.length} accounts, ${entries.length} entries`
  const took = ((performance.now() - startedAt) / 1000).toFixed(1)
  return `Demo hospital as of ${showDateTime(now, zone)}: ${counts}, in ${took} s.`
}

function standing(seededAt: Date, now: Date, zone: Zone): string {
  const age = since(seededAt, now)
  const loaded = `The demo hospital was made on ${showDateTime(seededAt, zone)}.`
  return age <= days(1)
    ? loaded
    : `${loaded} It is ${showDuration(age)} old, so all its care is late. Make a fresh one: ${FRESH}`
}
