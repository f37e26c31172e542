import type { Migration } from './migration.ts'

const table = `CREATE TABLE IF NOT EXISTS policies (
  id UUID NOT NULL,
  name VARCHAR(120) NOT NULL,
  version INT UNSIGNED NOT NULL COMMENT 'from 1, for each ward and for the hospital',
  ward_id UUID NULL COMMENT 'null: the whole hospital',
  reviewed_by VARCHAR(120) NOT NULL COMMENT 'empty: by nobody yet, so never in force',
  reviewed_on DATE NOT NULL,
  starts_at DATETIME(3) NOT NULL,
  reason VARCHAR(500) NOT NULL,
  created_by UUID NULL COMMENT 'null: came with the program',
  created_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  setting_values JSON NOT NULL,
  scope CHAR(36) CHARACTER SET ascii COLLATE ascii_bin AS (COALESCE(CAST(ward_id AS CHAR), 'hospital')) VIRTUAL,
  PRIMARY KEY (id),
  UNIQUE KEY policies_version (scope, version),
  CONSTRAINT policies_ward FOREIGN KEY (ward_id) REFERENCES wards (id),
  CONSTRAINT policies_created_by FOREIGN KEY (created_by) REFERENCES users (id),
  CONSTRAINT policies_have_a_reason CHECK (CHAR_LENGTH(TRIM(reason)) > 0),
  CONSTRAINT policies_values_are_an_object CHECK (JSON_TYPE(setting_values) = 'OBJECT')
)`

// What was due at a past moment is computed under the policy of that moment, so that policy has to be as it was.
const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS policies_refuse_${act.toLowerCase()} BEFORE ${act} ON policies FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'policies is append-only: a change is a new version'`,
)

export const policies: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('policies')
  },
}
