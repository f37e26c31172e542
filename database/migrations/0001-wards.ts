import type { Migration } from './migration.ts'

const tables = [
  `CREATE TABLE IF NOT EXISTS wards (
    id UUID NOT NULL,
    name VARCHAR(80) NOT NULL,
    shift_times JSON NOT NULL COMMENT 'starts in local time, in order: ["07:00","15:00","23:00"]',
    pressure_unit VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    retired BOOLEAN NOT NULL DEFAULT FALSE,
    PRIMARY KEY (id),
    UNIQUE KEY wards_name (name),
    CONSTRAINT wards_are_named CHECK (CHAR_LENGTH(TRIM(name)) > 0),
    CONSTRAINT wards_pressure_unit_is_known CHECK (pressure_unit IN ('cmH2O', 'mmHg', 'kPa')),
    CONSTRAINT wards_have_shifts CHECK (JSON_TYPE(shift_times) = 'ARRAY' AND JSON_LENGTH(shift_times) > 0)
  )`,
  `CREATE TABLE IF NOT EXISTS beds (
    id UUID NOT NULL,
    ward_id UUID NOT NULL,
    label VARCHAR(16) NOT NULL,
    position SMALLINT UNSIGNED NOT NULL COMMENT 'order on the board, from 1',
    retired BOOLEAN NOT NULL DEFAULT FALSE,
    PRIMARY KEY (id),
    UNIQUE KEY beds_label (ward_id, label),
    UNIQUE KEY beds_with_ward (id, ward_id),
    CONSTRAINT beds_ward FOREIGN KEY (ward_id) REFERENCES wards (id),
    CONSTRAINT beds_are_labelled CHECK (CHAR_LENGTH(TRIM(label)) > 0)
  )`,
  // Raised at the end of every transaction that changes what a ward's board shows. A row of its own, because it is hot.
  `CREATE TABLE IF NOT EXISTS ward_revs (
    ward_id UUID NOT NULL,
    rev BIGINT UNSIGNED NOT NULL DEFAULT 1,
    PRIMARY KEY (ward_id),
    CONSTRAINT ward_revs_ward FOREIGN KEY (ward_id) REFERENCES wards (id)
  )`,
]

export const wards: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of tables) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('ward_revs')
    await context.dropTable('beds')
    await context.dropTable('wards')
  },
}
