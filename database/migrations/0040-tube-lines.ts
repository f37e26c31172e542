import type { Migration } from './migration.ts'

export const tubeLines: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE tube_lines (
      id UUID NOT NULL,
      name VARCHAR(80) NOT NULL COMMENT 'as printed on the flange',
      maker VARCHAR(80) NOT NULL,
      PRIMARY KEY (id),
      UNIQUE KEY tube_lines_name (name),
      CONSTRAINT tube_lines_are_named CHECK (CHAR_LENGTH(TRIM(name)) > 0 AND CHAR_LENGTH(TRIM(maker)) > 0)
    )`)
  },
  async down({ context }) {
    await context.dropTable('tube_lines')
  },
}
