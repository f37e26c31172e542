import type { Migration } from './migration.ts'

// An address is compared without case but with accents: under the default collation `ä` would be the same person as `a`.
export const users: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE users (
      id UUID NOT NULL,
      name VARCHAR(120) NOT NULL,
      email VARCHAR(254) COLLATE utf8mb4_uca1400_as_ci NOT NULL,
      role VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      password_hash VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      password_set_at DATETIME(3) NOT NULL,
      one_time_until DATETIME(3) NULL COMMENT 'the password works once, until then; null: it is the person''s own',
      added_at DATETIME(3) NOT NULL,
      added_by UUID NULL,
      disabled_at DATETIME(3) NULL,
      PRIMARY KEY (id),
      UNIQUE KEY users_email (email),
      CONSTRAINT users_added_by FOREIGN KEY (added_by) REFERENCES users (id),
      CONSTRAINT users_role_is_known CHECK (role IN ('nurse', 'respiratory therapist', 'charge nurse',
        'tracheostomy specialist', 'educator', 'administrator', 'observer')),
      CONSTRAINT users_are_named CHECK (CHAR_LENGTH(TRIM(name)) > 0)
    )`)
  },
  async down({ context }) {
    await context.dropTable('users')
  },
}
