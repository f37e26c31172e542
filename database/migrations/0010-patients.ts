import type { Migration } from './migration.ts'

export const patients: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE patients (
      id UUID NOT NULL,
      record_number VARCHAR(32) NOT NULL,
      family_name VARCHAR(80) NOT NULL,
      given_name VARCHAR(80) NOT NULL,
      born_on DATE NOT NULL,
      sex VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      allergies VARCHAR(500) NULL COMMENT 'null: nobody has asked; that there are none is written in words',
      upper_airway VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'not open: after laryngectomy',
      ventilated BOOLEAN NOT NULL,
      oxygen VARCHAR(120) NULL COMMENT 'as prescribed, in words',
      spo2_low TINYINT UNSIGNED NULL COMMENT 'prescribed target in %',
      spo2_high TINYINT UNSIGNED NULL,
      demo BOOLEAN NOT NULL DEFAULT FALSE COMMENT 'invented, to learn with',
      version INT UNSIGNED NOT NULL DEFAULT 1 COMMENT 'raised by each edit, so that two at once are noticed',
      created_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
      PRIMARY KEY (id),
      UNIQUE KEY patients_record_number (record_number),
      KEY patients_by_name (family_name, given_name),
      CONSTRAINT patients_are_named CHECK (CHAR_LENGTH(TRIM(family_name)) > 0 AND CHAR_LENGTH(TRIM(given_name)) > 0),
      CONSTRAINT patients_have_a_number CHECK (CHAR_LENGTH(TRIM(record_number)) > 0),
      CONSTRAINT patients_sex_is_known CHECK (sex IN ('female', 'male', 'other', 'not known')),
      CONSTRAINT patients_upper_airway_is_known CHECK (upper_airway IN ('open', 'not open', 'not known')),
      CONSTRAINT patients_spo2_target CHECK ((spo2_low IS NULL AND spo2_high IS NULL)
        OR (spo2_low IS NOT NULL AND spo2_high IS NOT NULL AND spo2_low BETWEEN 50 AND spo2_high AND spo2_high <= 100))
    )`)
  },
  async down({ context }) {
    await context.dropTable('patients')
  },
}
