import type { Migration } from './migration.ts'

export const lineNames: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`ALTER TABLE tube_lines ADD COLUMN IF NOT EXISTS
      former_names JSON NOT NULL DEFAULT '[]' COMMENT 'oldest first: what was charted and recalled under them is of this line'`)
  },
  async down({ context: { sequelize } }) {
    await sequelize.query('ALTER TABLE tube_lines DROP COLUMN IF EXISTS former_names')
  },
}
