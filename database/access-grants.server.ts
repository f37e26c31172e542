import { v7 as uuidv7 } from 'uuid'
import { logAccess, type Trace } from './access-log.server.ts'
import { databaseNow } from './clock.server.ts'
import { AccessGrantRow } from './models/access-grant.server.ts'
import { select, transact } from './sequelize.server.ts'

/** Where a patient is, or was last, and until when this person has a reason to open them. `stayId` null: never admitted. */
export type PatientPlace = {
  patientId: string
  stayId: string | null
  wardId: string | null
  wardName: string | null
  grantedUntil: Date | null
}

/** The place of a patient as one person meets it, in one query; null when there is no such patient. */
export async function placeOf(patientId: string, userId: string): Promise<PatientPlace | null> {
  const rows = await select<PatientPlace>(
    `SELECT p.id AS patientId, s.id AS stayId, s.ward_id AS wardId, w.name AS wardName,
       (SELECT MAX(g.ends_at) FROM access_grants g
        WHERE g.user_id = :userId AND g.patient_id = p.id AND g.ward_id = s.ward_id AND g.ends_at > UTC_TIMESTAMP(3)) AS grantedUntil
     FROM patients p LEFT JOIN stays s ON s.patient_id = p.id LEFT JOIN wards w ON w.id = s.ward_id
     WHERE p.id = :patientId ORDER BY s.discharged_at IS NULL DESC, s.admitted_at DESC, s.id DESC LIMIT 1`,
    { patientId, userId },
  )
  return rows[0] ?? null
}

/** What somebody says to open a patient of another ward. */
export type Grant = {
  readonly userId: string
  readonly patientId: string
  readonly stayId: string | null
  readonly wardId: string
  readonly reason: string
  readonly minutes: number
}

/** Opens the patient to this person for that long, and logs it as break-glass. */
export async function grantAccess(grant: Grant, by: Trace): Promise<void> {
  const { userId, patientId, stayId, wardId, reason, minutes } = grant
  await transact(async transaction => {
    const id = uuidv7()
    const grantedAt = await databaseNow(transaction)
    const endsAt = new Date(grantedAt.getTime() + minutes * 60_000)
    await AccessGrantRow.create({ id, userId, patientId, wardId, reason, grantedAt, endsAt }, { transaction })
    const resource = { type: 'access-grant', id }
    await logAccess({ action: 'gave a reason', purpose: 'BTG', by, resource, patientId, stayId, wardId }, transaction)
  })
}

/** One opening of a ward's patient by somebody from elsewhere. `looks` counts the pages opened while it lasted. */
export type Opening = {
  id: string
  patientId: string
  familyName: string
  givenName: string
  userName: string
  userRole: string
  reason: string
  grantedAt: Date
  endsAt: Date
  looks: number
}

/** Who from elsewhere opened patients of a ward within the last days, newest first, at most 200. */
export function openingsOf(wardId: string, days: number): Promise<Opening[]> {
  return select<Opening>(
    `SELECT g.id, g.patient_id AS patientId, p.family_name AS familyName, p.given_name AS givenName,
       u.name AS userName, u.role AS userRole, g.reason,
       g.granted_at AS grantedAt, g.ends_at AS endsAt,
       (SELECT COUNT(*) FROM access_log l WHERE l.actor_id = g.user_id AND l.at BETWEEN g.granted_at AND g.ends_at
          AND l.patient_id = g.patient_id AND l.action = 'opened patient') AS looks
     FROM access_grants g JOIN users u ON u.id = g.user_id JOIN patients p ON p.id = g.patient_id
     WHERE g.ward_id = :wardId AND g.granted_at > UTC_TIMESTAMP(3) - INTERVAL :days DAY
     ORDER BY g.granted_at DESC, g.id DESC LIMIT 200`,
    { wardId, days },
  )
}
