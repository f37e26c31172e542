import type { Migration } from './migration.ts'

// Whom the ward calls: [{"who":"Airway team","number":"2222"}], in the order of the bed-head sign.
export const emergencyNumbers: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`ALTER TABLE wards ADD COLUMN IF NOT EXISTS emergency_numbers JSON NOT NULL DEFAULT '[]'
      COMMENT 'whom to call, as printed on bed-head signs'`)
  },
  async down({ context: { sequelize } }) {
    await sequelize.query('ALTER TABLE wards DROP COLUMN IF EXISTS emergency_numbers')
  },
}
