import type { Migration } from './migration.ts'

// The role of an entry says that it was charted under supervision, so that it stays so when the account no longer is.
// The column computed from it is virtual, and costs nothing but its index; the role grows for the words.
export const supervision: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [
      `ALTER TABLE users ADD COLUMN IF NOT EXISTS supervised BOOLEAN NOT NULL DEFAULT FALSE
         COMMENT 'what they chart waits for a countersignature' AFTER role`,
      `ALTER TABLE stays ADD COLUMN IF NOT EXISTS countersign_count INT UNSIGNED NOT NULL DEFAULT 0
         COMMENT 'raised by trigger, so that open pages notice'`,
      `ALTER TABLE entries MODIFY COLUMN recorded_role VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL
         COMMENT 'at that moment'`,
      `ALTER TABLE entries ADD COLUMN IF NOT EXISTS under_supervision BOOLEAN
         AS (RIGHT(recorded_role, 18) = ' under supervision') VIRTUAL`,
      'ALTER TABLE entries ADD KEY IF NOT EXISTS entries_under_supervision (under_supervision, stay_id)',
    ]) {
      await sequelize.query(statement)
    }
  },
  async down({ context: { sequelize } }) {
    for (const statement of [
      'ALTER TABLE entries DROP KEY IF EXISTS entries_under_supervision',
      'ALTER TABLE entries DROP COLUMN IF EXISTS under_supervision',
      'ALTER TABLE stays DROP COLUMN IF EXISTS countersign_count',
      'ALTER TABLE users DROP COLUMN IF EXISTS supervised',
    ]) {
      await sequelize.query(statement)
    }
  },
}
