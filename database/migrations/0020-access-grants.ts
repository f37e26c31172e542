import type { Migration } from './migration.ts'

const table = `CREATE TABLE IF NOT EXISTS access_grants (
  id UUID NOT NULL,
  user_id UUID NOT NULL,
  patient_id UUID NOT NULL,
  ward_id UUID NOT NULL COMMENT 'where the patient was when the reason was given',
  reason VARCHAR(500) NOT NULL,
  granted_at DATETIME(3) NOT NULL,
  ends_at DATETIME(3) NOT NULL,
  PRIMARY KEY (id),
  KEY access_grants_in_force (user_id, patient_id, ends_at),
  KEY access_grants_of_ward (ward_id, granted_at),
  CONSTRAINT access_grants_user FOREIGN KEY (user_id) REFERENCES users (id),
  CONSTRAINT access_grants_patient FOREIGN KEY (patient_id) REFERENCES patients (id),
  CONSTRAINT access_grants_ward FOREIGN KEY (ward_id) REFERENCES wards (id),
  CONSTRAINT access_grants_have_a_reason CHECK (CHAR_LENGTH(TRIM(reason)) >= 10),
  CONSTRAINT access_grants_end CHECK (ends_at > granted_at)
)`

// A reason that was given stays as it was given; it ends by its time.
const triggers = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS access_grants_refuse_${act.toLowerCase()} BEFORE ${act} ON access_grants FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'access_grants is append-only'`,
)

export const accessGrants: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, ...triggers]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('access_grants')
  },
}
