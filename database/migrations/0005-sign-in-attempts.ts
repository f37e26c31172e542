import type { Migration } from './migration.ts'

// Counters and not attempts: what is kept about somebody who mistypes is one number and one time.
export const signInAttempts: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE sign_in_attempts (
      subject CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'SHA-256 of an account, an address, or both',
      misses INT UNSIGNED NOT NULL,
      last_missed_at DATETIME(3) NOT NULL,
      PRIMARY KEY (subject),
      KEY sign_in_attempts_by_age (last_missed_at)
    )`)
  },
  async down({ context }) {
    await context.dropTable('sign_in_attempts')
  },
}
