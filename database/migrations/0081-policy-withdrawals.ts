import type { Migration } from './migration.ts'

const table = `CREATE TABLE IF NOT EXISTS policy_withdrawals (
  policy_id UUID NOT NULL,
  reason VARCHAR(500) NOT NULL,
  withdrawn_by UUID NOT NULL,
  withdrawn_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  PRIMARY KEY (policy_id),
  CONSTRAINT policy_withdrawals_policy FOREIGN KEY (policy_id) REFERENCES policies (id),
  CONSTRAINT policy_withdrawals_by FOREIGN KEY (withdrawn_by) REFERENCES users (id),
  CONSTRAINT policy_withdrawals_have_a_reason CHECK (CHAR_LENGTH(TRIM(reason)) > 0)
)`

// Care was judged by a version from its start on: taking it back after that would change the past.
const early = `CREATE TRIGGER IF NOT EXISTS policy_withdrawals_come_early BEFORE INSERT ON policy_withdrawals FOR EACH ROW
  IF (SELECT starts_at FROM policies WHERE id = NEW.policy_id) <= UTC_TIMESTAMP(3) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'this policy has started: it cannot be withdrawn';
  END IF`

const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS policy_withdrawals_refuse_${act.toLowerCase()} BEFORE ${act} ON policy_withdrawals FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'policy_withdrawals is append-only'`,
)

export const policyWithdrawals: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, early, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('policy_withdrawals')
  },
}
