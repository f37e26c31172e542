import type { Policy } from '#app/care/policy.ts'
import { isUniqueViolation } from './errors.server.ts'
import { PolicyRow } from './models/policy.server.ts'
import { select, transact } from './sequelize.server.ts'
import { raiseAllWards, raiseWards } from './ward-revs.server.ts'

/** A policy as kept: with why it came, when, and by whom (null: it came with the program). */
export interface StoredPolicy extends Policy {
  readonly reason: string
  readonly createdAt: Date
  readonly createdByName: string | null
}

/** A policy to add; its version is the next one of its ward, or of the hospital. */
export type NewPolicy = Omit<StoredPolicy, 'version' | 'createdAt' | 'createdByName'>

let kept: { readonly mark: string; readonly policies: readonly StoredPolicy[] } = { mark: '', policies: [] }

/**
 * Every policy there is or was, newest first. Kept in memory: policies are only ever added, so their number and the last
 * time one came tell whether there are new ones.
 */
export async function policies(): Promise<readonly StoredPolicy[]> {
  const [counted] = await select<{ mark: string }>(
    `SELECT CONCAT_WS(' ', COUNT(*), MAX(created_at)) AS mark FROM policies`,
  )
  const mark = counted?.mark ?? ''
  if (mark !== kept.mark) kept = { mark, policies: await allPolicies() }
  return kept.policies
}

function allPolicies(): Promise<readonly StoredPolicy[]> {
  return select<StoredPolicy>(
    `SELECT p.id, p.name, p.version, p.ward_id AS wardId, p.reviewed_by AS reviewedBy, p.reviewed_on AS reviewedOn,
       p.starts_at AS startsAt, p.setting_values AS \`values\`, p.reason, p.created_at AS createdAt,
       u.name AS createdByName
     FROM policies p LEFT JOIN users u ON u.id = p.created_by ORDER BY p.starts_at DESC, p.version DESC`,
  )
}

/**
 * Adds a policy, and returns what became of it: its version, also when the same form came again. Throws when somebody
 * else used the id.
 */
export async function addPolicy(policy: NewPolicy, by: string | null): Promise<{ readonly version: number }> {
  try {
    return await transact(async transaction => {
      const [last] = await select<{ version: number | null }>(
        'SELECT MAX(version) AS version FROM policies WHERE ward_id <=> :wardId',
        { wardId: policy.wardId },
        transaction,
      )
      const version = (last?.version ?? 0) + 1
      await PolicyRow.create({ ...policy, version, createdBy: by }, { transaction })
      if (policy.wardId === null) await raiseAllWards(transaction)
      else await raiseWards([policy.wardId], transaction)
      return { version }
    })
  } catch (error) {
    if (isUniqueViolation(error, 'policies_version')) return addPolicy(policy, by)
    const known = isUniqueViolation(error, 'PRIMARY')
      ? (await policies()).find(({ id }) => id === policy.id)
      : undefined
    if (known) return { version: known.version }
    throw error
  }
}
