import type { Migration } from './migration.ts'

// What a bed-head sign warns of beside the tube. Null: nobody has said.
export const airwayDetails: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`ALTER TABLE patients
      ADD COLUMN IF NOT EXISTS laryngoscopy CHAR(1) CHARACTER SET ascii COLLATE ascii_bin NULL
        COMMENT 'view at laryngoscopy, by its grade' AFTER upper_airway,
      ADD COLUMN IF NOT EXISTS airway_notes VARCHAR(500) NULL AFTER laryngoscopy,
      ADD CONSTRAINT patients_laryngoscopy_is_a_grade CHECK (laryngoscopy IN ('1', '2', '3', '4'))`)
  },
  async down({ context: { sequelize } }) {
    await sequelize.query(`ALTER TABLE patients DROP CONSTRAINT IF EXISTS patients_laryngoscopy_is_a_grade,
      DROP COLUMN IF EXISTS airway_notes, DROP COLUMN IF EXISTS laryngoscopy`)
  },
}
