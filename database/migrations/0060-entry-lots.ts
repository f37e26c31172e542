import type { Migration } from './migration.ts'

// Virtual, so that millions of entries are not rewritten; compared without regard to case, as lots are typed.
export const entryLots: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`ALTER TABLE entries ADD COLUMN IF NOT EXISTS lot VARCHAR(20) COLLATE utf8mb4_uca1400_ai_ci
      AS (JSON_VALUE(data, '$.lot')) VIRTUAL COMMENT 'of the device that was charted, for recalls'`)
    await sequelize.query('ALTER TABLE entries ADD INDEX IF NOT EXISTS entries_by_lot (lot)')
  },
  async down({ context: { sequelize } }) {
    await sequelize.query('ALTER TABLE entries DROP INDEX IF EXISTS entries_by_lot')
    await sequelize.query('ALTER TABLE entries DROP COLUMN IF EXISTS lot')
  },
}
