import { createHash } from 'node:crypto'
import { createCookie } from 'react-router'
import { connection } from '#database/connection.server.ts'
import { grantAppRights } from '#database/grants.server.ts'
import { migrateUp } from '#database/migrate.server.ts'
import type { BenchHospital } from './hospital.ts'
import { load } from './load.ts'

/** A filled database, and somebody who is signed in there. */
export interface FilledDatabase {
  readonly appUrl: string
  readonly ownerUrl: string
  readonly entries: number
  /** The `Cookie` header of a nurse of the first ward. */
  readonly cookie: string
  readonly nurseId: string
  readonly wardId: string
  readonly stays: readonly { readonly id: string; readonly patientId: string }[]
}

/** Makes a database with today's schema and the hospital in it, on the servers that `npm run bench` names. */
export async function filledDatabase(name: string, bench: BenchHospital): Promise<FilledDatabase> {
  const [appUrl, ownerUrl] = [`${process.env.APP_SERVER}${name}`, `${process.env.OWNER_SERVER}${name}`]
  await once(`${process.env.OWNER_SERVER}`, server => server.query(`CREATE DATABASE \`${name}\``))
  await once(ownerUrl, migrateUp, 3)
  const entries = await once(ownerUrl, owner => load(owner, bench))
  const secret = `the session of the bench in ${name}`
  await once(ownerUrl, async owner => {
    // What the bare route writes to.
    await owner.query('CREATE TABLE floor_rows (id UUID PRIMARY KEY, data JSON NOT NULL)')
    await grantAppRights(owner, appUrl)
    await owner.query(
      `INSERT INTO sessions (id_hash, user_id, started_at, seen_at, ends_at)
       VALUES (:idHash, :userId, UTC_TIMESTAMP(3), UTC_TIMESTAMP(3), UTC_TIMESTAMP(3) + INTERVAL 12 HOUR)`,
      { replacements: { idHash: createHash('sha256').update(secret).digest('hex'), userId: bench.nurse.id } },
    )
  })
  const wardId = bench.hospital.wards[0]?.id ?? ''
  const stays = bench.hospital.stays.filter(stay => stay.wardId === wardId)
  const cookie = (await createCookie('cannulary').serialize(secret)).split(';')[0] ?? ''
  return { appUrl, ownerUrl, entries, cookie, nurseId: bench.nurse.id, wardId, stays }
}

async function once<T>(url: string, work: (database: ReturnType<typeof connection>) => Promise<T>, maxConnections = 1) {
  const database = connection(url, { maxConnections, queryTimeoutMs: 300_000 })
  try {
    return await work(database)
  } finally {
    await database.close()
  }
}
