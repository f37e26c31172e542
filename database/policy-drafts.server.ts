import type { Transaction } from 'sequelize'
import type { Policy, RuleSet } from '#app/care/policy.ts'
import { isUniqueViolation } from './errors.server.ts'
import { insertPolicy, type NewPolicy, policies } from './policies.server.ts'
import { change, select, transact } from './sequelize.server.ts'

/** The draft of a ward's next version: one for each rule set, that whoever may manage the policy of the ward works on. */
export interface PolicyDraft {
  readonly id: string
  readonly wardId: string
  readonly ruleSet: RuleSet
  /** Raised with every save. */
  readonly rev: number
  readonly values: Policy['values']
  readonly changedById: string
  readonly changedByName: string
  readonly changedAt: Date
}

/** What became of a save or a publication: done, or somebody else was there first. */
export type DraftOutcome =
  | { readonly outcome: 'done' }
  | { readonly outcome: 'stale'; readonly now: PolicyDraft | null }

const SELECT_DRAFT = `SELECT d.id, d.ward_id AS wardId, d.rule_set AS ruleSet, d.rev, d.setting_values AS \`values\`,
    d.changed_by AS changedById, u.name AS changedByName, d.changed_at AS changedAt
  FROM policy_drafts d JOIN users u ON u.id = d.changed_by WHERE d.ward_id = :wardId AND d.rule_set = :ruleSet`

type Scope = Pick<PolicyDraft, 'wardId' | 'ruleSet'>

/** The draft of a ward's rule set, or null. */
export async function policyDraft(
  { wardId, ruleSet }: Scope,
  transaction: Transaction | null = null,
): Promise<PolicyDraft | null> {
  const lock = transaction ? ' FOR UPDATE' : ''
  const [draft] = await select<PolicyDraft>(SELECT_DRAFT + lock, { wardId, ruleSet }, transaction)
  return draft ?? null
}

/** Keeps a draft. `rev` is the one that the form saw, 0 when there was none; when it has moved on nothing is kept. */
export async function savePolicyDraft(
  draft: Scope & Pick<PolicyDraft, 'id' | 'rev' | 'values'>,
  by: string,
): Promise<DraftOutcome> {
  try {
    return await transact(async transaction => {
      const now = await policyDraft(draft, transaction)
      if ((now?.rev ?? 0) !== draft.rev) return { outcome: 'stale', now }
      const row = { ...draft, values: JSON.stringify(draft.values), by }
      await change(
        `INSERT INTO policy_drafts (id, ward_id, rule_set, rev, setting_values, changed_by)
         VALUES (:id, :wardId, :ruleSet, 1, :values, :by)
         ON DUPLICATE KEY UPDATE rev = rev + 1, setting_values = VALUE(setting_values), changed_by = VALUE(changed_by),
           changed_at = UTC_TIMESTAMP(3)`,
        row,
        transaction,
      )
      return { outcome: 'done' }
    })
  } catch (error) {
    if (isUniqueViolation(error, 'policy_drafts_of_ward')) return { outcome: 'stale', now: await policyDraft(draft) }
    throw error
  }
}

/** Throws a draft away, unless it has moved on since the form saw it. */
export async function discardPolicyDraft(draft: Scope & Pick<PolicyDraft, 'rev'>): Promise<DraftOutcome> {
  return transact(async transaction => {
    const now = await policyDraft(draft, transaction)
    if (now && now.rev !== draft.rev) return { outcome: 'stale', now }
    await removeDraft(draft, transaction)
    return { outcome: 'done' }
  })
}

async function removeDraft({ wardId, ruleSet }: Scope, transaction: Transaction): Promise<void> {
  await change(
    'DELETE FROM policy_drafts WHERE ward_id = :wardId AND rule_set = :ruleSet',
    { wardId, ruleSet },
    transaction,
  )
}

/**
 * Turns a draft into the next version of every ward it is for, all or none, and the draft is gone. A form that was sent twice
 * is answered the same; one that saw an older draft is refused.
 */
export async function publishDraft(
  draft: Scope & Pick<PolicyDraft, 'rev'>,
  versions: readonly NewPolicy[],
  by: string,
): Promise<DraftOutcome> {
  return transact(async transaction => {
    const now = await policyDraft(draft, transaction)
    if (now?.rev !== draft.rev) return (await areThere(versions)) ? { outcome: 'done' } : { outcome: 'stale', now }
    for (const version of versions) await insertPolicy(version, by, transaction)
    await removeDraft(draft, transaction)
    return { outcome: 'done' }
  })
}

async function areThere(versions: readonly NewPolicy[]): Promise<boolean> {
  const known = await policies()
  return versions.every(({ id }) => known.some(policy => policy.id === id))
}
