import type { Transaction } from 'sequelize'
import { v5 as uuidv5 } from 'uuid'
import type { Policy, RuleSet } from '#app/care/policy.ts'
import { isUniqueViolation } from './errors.server.ts'
import { marks } from './marks.server.ts'
import { PolicyRow } from './models/policy.server.ts'
import { select, transact } from './sequelize.server.ts'
import { raiseAllWards, raiseWards } from './ward-revs.server.ts'

/** How a version was taken back before it started. */
export interface Withdrawal {
  readonly by: string
  readonly at: Date
  readonly reason: string
}

/** A policy as kept: with why it came, when, and by whom (null: it came with the program). */
export interface StoredPolicy extends Policy {
  readonly ruleSet: RuleSet
  readonly withdrawn: boolean
  readonly withdrawal: Withdrawal | null
  readonly reason: string
  readonly createdAt: Date
  readonly createdByName: string | null
}

/** A policy to add; its version is the next one of its ward and rule set, or of the hospital's. */
export type NewPolicy = Omit<Policy, 'version' | 'withdrawn' | 'children'> & {
  readonly reason: string
  /** The reviewer, when known here: never who adds it. */
  readonly reviewerId?: string | null
}

let kept: { readonly mark: string; readonly policies: readonly StoredPolicy[] } = { mark: '', policies: [] }

/**
 * Every policy there is or was, newest first. Kept in memory: policies are only ever added, so their number and the last
 * time one came tell whether there are new ones.
 */
export async function policies(): Promise<readonly StoredPolicy[]> {
  const { policies: mark } = await marks()
  if (mark !== kept.mark) kept = { mark, policies: await allPolicies() }
  return kept.policies
}

type Row = Omit<StoredPolicy, 'withdrawn' | 'withdrawal'> & {
  withdrawnBy: string | null
  withdrawnAt: Date | null
  withdrawnReason: string | null
}

async function allPolicies(): Promise<readonly StoredPolicy[]> {
  const rows = await select<Row>(
    `SELECT p.id, p.name, p.version, p.ward_id AS wardId, p.rule_set AS ruleSet, p.reviewed_by AS reviewedBy,
       p.reviewed_on AS reviewedOn, p.starts_at AS startsAt, p.setting_values AS \`values\`, p.reason,
       p.created_at AS createdAt, u.name AS createdByName, t.withdrawn_at AS withdrawnAt, t.reason AS withdrawnReason,
       b.name AS withdrawnBy
     FROM policies p LEFT JOIN users u ON u.id = p.created_by LEFT JOIN policy_withdrawals t ON t.policy_id = p.id
       LEFT JOIN users b ON b.id = t.withdrawn_by
     ORDER BY p.starts_at DESC, p.version DESC`,
  )
  return rows.map(({ withdrawnBy, withdrawnAt, withdrawnReason, ...policy }) => ({
    ...policy,
    withdrawn: withdrawnAt !== null,
    withdrawal: withdrawnAt && { by: withdrawnBy ?? '', at: withdrawnAt, reason: withdrawnReason ?? '' },
  }))
}

/**
 * Adds a policy, and returns what became of it: its version, also when the same form came again. Throws when somebody
 * else used the id.
 */
export async function addPolicy(policy: NewPolicy, by: string | null): Promise<{ readonly version: number }> {
  try {
    return await transact(transaction => insertPolicy(policy, by, transaction))
  } catch (error) {
    if (isUniqueViolation(error, 'policies_version')) return addPolicy(policy, by)
    const known = isUniqueViolation(error, 'PRIMARY')
      ? (await policies()).find(({ id }) => id === policy.id)
      : undefined
    if (known) return { version: known.version }
    throw error
  }
}

/** The next version of a ward's rule set, in a transaction of its own or of more. */
export async function insertPolicy(
  policy: NewPolicy,
  by: string | null,
  transaction: Transaction,
): Promise<{ readonly version: number }> {
  const ruleSet = policy.ruleSet ?? 'adults'
  const [last] = await select<{ version: number | null }>(
    'SELECT MAX(version) AS version FROM policies WHERE ward_id <=> :wardId AND rule_set = :ruleSet',
    { wardId: policy.wardId, ruleSet },
    transaction,
  )
  const version = (last?.version ?? 0) + 1
  await PolicyRow.create({ ...policy, ruleSet, version, createdBy: by }, { transaction })
  if (policy.wardId === null) await raiseAllWards(transaction)
  else await raiseWards([policy.wardId], transaction)
  return { version }
}

/** The id of the version that a form of one ward adds to another one: the same form twice is one version in each. */
export function policyIdFor(formId: string, wardId: string): string {
  return uuidv5(wardId, formId)
}
