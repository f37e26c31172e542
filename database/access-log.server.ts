import { createHash } from 'node:crypto'
import type { Transaction } from 'sequelize'
import type { Role } from '#app/auth/permissions.ts'
import { change, select, transact } from './sequelize.server.ts'

/** Who did something, from where: ids and network facts, nothing about a patient. `actor` is null before sign-in. */
export type Trace = {
  readonly actor: { readonly id: string; readonly role: Role; readonly sessionHash: string | null } | null
  readonly path: string | null
  readonly address: string | null
  readonly userAgent: string | null
  readonly requestId: string | null
}

/** Why: treatment, another ward's patient for a stated reason, keeping the house, or coming in (ISO 27789, IHE BALP). */
export type Purpose = 'TREAT' | 'BTG' | 'ADMIN' | 'SIGN-IN'

/** One act to be logged. `action` is in the past tense; `resource` is what it was done to, when that is not the patient. */
export type AccessEntry = {
  readonly action: string
  readonly purpose: Purpose
  readonly by: Trace
  readonly outcome?: 'done' | 'refused' | 'failed'
  readonly resource?: { readonly type: string; readonly id: string }
  readonly patientId?: string
  readonly stayId?: string | null
  readonly wardId?: string
}

/** A row of the log as it is stored. */
export type AccessRow = {
  chain: string
  seq: number
  at: Date
  actorId: string | null
  actorRole: string | null
  sessionHash: string | null
  purpose: string
  action: string
  outcome: string
  resourceType: string | null
  resourceId: string | null
  patientId: string | null
  stayId: string | null
  wardId: string | null
  path: string | null
  address: string | null
  userAgent: string | null
  requestId: string | null
  prevHash: string
  hash: string
}

/** What the first link of every chain is tied to. */
export const GENESIS = '0'.repeat(64)

/** The columns of a row under the names of `AccessRow`, for a SELECT. */
export const accessColumns = `chain, seq, at, actor_id AS actorId, actor_role AS actorRole, session_hash AS sessionHash,
  purpose, action, outcome, resource_type AS resourceType, resource_id AS resourceId, patient_id AS patientId,
  stay_id AS stayId, ward_id AS wardId, path, address, user_agent AS userAgent, request_id AS requestId,
  prev_hash AS prevHash, hash`

/** SHA-256 over everything in the row but the hash itself, the link to the row before included. */
export function linkHash(row: Omit<AccessRow, 'hash'>): string {
  const link = [row.chain, row.seq, row.at.toISOString(), row.actorId, row.actorRole, row.sessionHash, row.purpose]
  const what = [row.action, row.outcome, row.resourceType, row.resourceId, row.patientId, row.stayId, row.wardId]
  const where = [row.path, row.address, row.userAgent, row.requestId, row.prevHash]
  return createHash('sha256')
    .update(JSON.stringify([...link, ...what, ...where]))
    .digest('hex')
}

/**
 * Adds a link to the chain of the patient, person or ward it is about. One that is given a transaction commits with it;
 * else it has one of its own.
 */
export async function logAccess(entry: AccessEntry, transaction?: Transaction): Promise<void> {
  if (transaction === undefined) return transact(own => logAccess(entry, own))
  const chain = chainOf(entry)
  const head = await lockedHead(chain, transaction)
  const unlinked = { ...rowOf(entry), chain, seq: head.seq + 1, at: head.now, prevHash: head.hash }
  const row: AccessRow = { ...unlinked, hash: linkHash(unlinked) }
  await change(
    `INSERT INTO access_log (chain, seq, at, actor_id, actor_role, session_hash, purpose, action, outcome, resource_type,
       resource_id, patient_id, stay_id, ward_id, path, address, user_agent, request_id, prev_hash, hash)
     VALUES (:chain, :seq, :at, :actorId, :actorRole, :sessionHash, :purpose, :action, :outcome, :resourceType,
       :resourceId, :patientId, :stayId, :wardId, :path, :address, :userAgent, :requestId, :prevHash, :hash)`,
    row,
    transaction,
  )
  await change('UPDATE access_log_heads SET seq = :seq, hash = :hash WHERE chain = :chain', row, transaction)
}

const SAME_LOOK_MINUTES = 5

/**
 * Logs a look, once: the same page in the same session within so many minutes is the same look, so that a page which is
 * asked for again and again does not fill the log.
 */
export async function logLook(entry: AccessEntry, onceInMinutes = SAME_LOOK_MINUTES): Promise<void> {
  const row = { ...rowOf(entry), chain: chainOf(entry) }
  const [again] = await select(
    `SELECT 1 AS found FROM access_log WHERE actor_id = :actorId AND at > UTC_TIMESTAMP(3) - INTERVAL :onceInMinutes MINUTE
       AND chain = :chain AND session_hash = :sessionHash AND path = :path AND action = :action LIMIT 1`,
    { ...row, onceInMinutes },
  )
  if (again === undefined) await logAccess(entry)
}

function chainOf({ patientId, resource, wardId, by }: AccessEntry): string {
  if (patientId !== undefined) return `patient:${patientId.toLowerCase()}`
  if (resource?.type === 'user') return `user:${resource.id.toLowerCase()}`
  if (wardId !== undefined) return `ward:${wardId.toLowerCase()}`
  return by.actor === null ? 'nobody' : `user:${by.actor.id.toLowerCase()}`
}

function rowOf({ action, outcome = 'done', purpose, by, resource, patientId, stayId, wardId }: AccessEntry) {
  return {
    actorId: by.actor?.id.toLowerCase() ?? null,
    actorRole: by.actor?.role ?? null,
    sessionHash: by.actor?.sessionHash ?? null,
    purpose,
    action,
    outcome,
    resourceType: resource?.type ?? null,
    resourceId: ascii(resource?.id, 64),
    patientId: patientId?.toLowerCase() ?? null,
    stayId: stayId?.toLowerCase() ?? null,
    wardId: wardId?.toLowerCase() ?? null,
    path: ascii(by.path, 200),
    address: ascii(by.address, 45),
    userAgent: ascii(by.userAgent, 200),
    requestId: ascii(by.requestId, 64),
  }
}

/** What a caller sent may hold anything; a log line holds printable characters of a known number. */
function ascii(text: string | null | undefined, most: number): string | null {
  return text?.replace(/[^\x20-\x7e]/g, '?').slice(0, most) ?? null
}

type Head = { seq: number; hash: string; now: Date }

async function lockedHead(chain: string, transaction: Transaction): Promise<Head> {
  const read = () =>
    select<Head>(
      'SELECT seq, hash, UTC_TIMESTAMP(3) AS now FROM access_log_heads WHERE chain = :chain FOR UPDATE',
      { chain },
      transaction,
    )
  const [known] = await read()
  if (known) return known
  await change(
    `INSERT INTO access_log_heads (chain, seq, hash) VALUES (:chain, 0, :genesis) ON DUPLICATE KEY UPDATE chain = chain`,
    { chain, genesis: GENESIS },
    transaction,
  )
  const [made] = await read()
  if (made === undefined) throw new Error(`The chain ${chain} of the access log has no head`)
  return made
}
