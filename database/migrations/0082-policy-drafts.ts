import type { Migration } from './migration.ts'

const table = `CREATE TABLE IF NOT EXISTS policy_drafts (
  id UUID NOT NULL,
  ward_id UUID NOT NULL,
  rule_set VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  rev INT UNSIGNED NOT NULL COMMENT 'raised with every save: a form that saw another one is told',
  setting_values JSON NOT NULL,
  changed_by UUID NOT NULL,
  changed_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  PRIMARY KEY (id),
  UNIQUE KEY policy_drafts_of_ward (ward_id, rule_set),
  CONSTRAINT policy_drafts_ward FOREIGN KEY (ward_id) REFERENCES wards (id),
  CONSTRAINT policy_drafts_changed_by FOREIGN KEY (changed_by) REFERENCES users (id),
  CONSTRAINT policy_drafts_rule_set_is_known CHECK (rule_set IN ('adults', 'children')),
  CONSTRAINT policy_drafts_values_are_an_object CHECK (JSON_TYPE(setting_values) = 'OBJECT')
)`

export const policyDrafts: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(table)
  },
  async down({ context }) {
    await context.dropTable('policy_drafts')
  },
}
