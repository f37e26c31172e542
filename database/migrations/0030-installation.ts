import type { Migration } from './migration.ts'

export const installation: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE installation (
      name VARCHAR(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'demo: the hospital that was invented, and when',
      value JSON NOT NULL,
      set_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
      PRIMARY KEY (name)
    )`)
  },
  async down({ context }) {
    await context.dropTable('installation')
  },
}
