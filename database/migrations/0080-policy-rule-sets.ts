import type { Migration } from './migration.ts'

/*
 * A ward may hold a rule set for children beside that for adults, with versions of its own. A reviewer who is known here is linked,
 * and is never the author.
 */
const up = [
  `ALTER TABLE policies
     ADD COLUMN IF NOT EXISTS rule_set VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'adults' AFTER ward_id,
     ADD COLUMN IF NOT EXISTS reviewer_id UUID NULL COMMENT 'null: reviewed by somebody from outside' AFTER reviewed_by`,
  `ALTER TABLE policies
     ADD CONSTRAINT policies_reviewer FOREIGN KEY IF NOT EXISTS (reviewer_id) REFERENCES users (id),
     ADD CONSTRAINT IF NOT EXISTS policies_rule_set_is_known CHECK (rule_set IN ('adults', 'children')),
     ADD CONSTRAINT IF NOT EXISTS policies_are_reviewed_by_another CHECK (reviewer_id IS NULL OR reviewer_id <> created_by)`,
  `ALTER TABLE policies DROP INDEX IF EXISTS policies_version`,
  `ALTER TABLE policies ADD UNIQUE KEY IF NOT EXISTS policies_version (scope, rule_set, version)`,
]

const down = [
  `ALTER TABLE policies DROP INDEX IF EXISTS policies_version`,
  `ALTER TABLE policies DROP CONSTRAINT IF EXISTS policies_are_reviewed_by_another`,
  `ALTER TABLE policies DROP CONSTRAINT IF EXISTS policies_rule_set_is_known`,
  `ALTER TABLE policies DROP FOREIGN KEY IF EXISTS policies_reviewer`,
  `ALTER TABLE policies DROP INDEX IF EXISTS policies_reviewer`,
  `ALTER TABLE policies DROP COLUMN IF EXISTS reviewer_id, DROP COLUMN IF EXISTS rule_set`,
  `ALTER TABLE policies ADD UNIQUE KEY IF NOT EXISTS policies_version (scope, version)`,
]

export const policyRuleSets: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of up) await sequelize.query(statement)
  },
  async down({ context: { sequelize } }) {
    for (const statement of down) await sequelize.query(statement)
  },
}
