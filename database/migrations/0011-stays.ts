import type { Migration } from './migration.ts'

// A CHECK or a unique index cannot say "while it is open"; a generated column that is null afterwards can.
const table = `CREATE TABLE IF NOT EXISTS stays (
  id UUID NOT NULL,
  patient_id UUID NOT NULL,
  ward_id UUID NOT NULL,
  bed_id UUID NOT NULL COMMENT 'the last bed, once discharged',
  admitted_at DATETIME(3) NOT NULL,
  discharged_at DATETIME(3) NULL,
  discharge_reason VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL,
  discharge_note VARCHAR(500) NULL,
  entry_count INT UNSIGNED NOT NULL DEFAULT 0 COMMENT 'the number of its last entry; set by a trigger of entries',
  last_entry_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT '' COMMENT 'likewise',
  occupied_bed_id UUID AS (IF(discharged_at IS NULL, bed_id, NULL)) VIRTUAL,
  open_patient_id UUID AS (IF(discharged_at IS NULL, patient_id, NULL)) VIRTUAL,
  PRIMARY KEY (id),
  UNIQUE KEY stays_one_to_a_bed (occupied_bed_id),
  UNIQUE KEY stays_one_to_a_patient (open_patient_id),
  KEY stays_of_ward (ward_id, discharged_at),
  KEY stays_of_patient (patient_id, admitted_at),
  CONSTRAINT stays_patient FOREIGN KEY (patient_id) REFERENCES patients (id),
  CONSTRAINT stays_ward FOREIGN KEY (ward_id) REFERENCES wards (id),
  CONSTRAINT stays_bed_of_ward FOREIGN KEY (bed_id, ward_id) REFERENCES beds (id, ward_id),
  CONSTRAINT stays_end_with_a_reason CHECK ((discharged_at IS NULL) = (discharge_reason IS NULL)),
  CONSTRAINT stays_end_after_they_start CHECK (discharged_at IS NULL OR discharged_at >= admitted_at)
)`

export const stays: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(table)
  },
  async down({ context }) {
    await context.dropTable('stays')
  },
}
