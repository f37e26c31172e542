import type { Migration } from './migration.ts'

// The cookie holds 32 random bytes, the table only their SHA-256: whoever reads the table cannot sign in with it.
export const sessions: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE sessions (
      id_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      user_id UUID NOT NULL,
      started_at DATETIME(3) NOT NULL,
      seen_at DATETIME(3) NOT NULL COMMENT 'the last thing a person did, to the minute; polls do not count',
      ends_at DATETIME(3) NOT NULL COMMENT 'the absolute end, whatever is done',
      ended_at DATETIME(3) NULL COMMENT 'null: not ended by anybody, which says nothing about its limits',
      ended_because VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL,
      address VARCHAR(45) CHARACTER SET ascii COLLATE ascii_bin NULL,
      user_agent VARCHAR(200) NULL,
      PRIMARY KEY (id_hash),
      KEY sessions_of_user (user_id, ended_at),
      KEY sessions_by_end (ends_at),
      CONSTRAINT sessions_user FOREIGN KEY (user_id) REFERENCES users (id),
      CONSTRAINT sessions_end_for_a_reason CHECK ((ended_at IS NULL) = (ended_because IS NULL))
    )`)
  },
  async down({ context }) {
    await context.dropTable('sessions')
  },
}
