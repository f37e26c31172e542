import type { Migration } from './migration.ts'

// The address holds 32 random bytes, the table only their SHA-256: whoever reads the table cannot read a calendar with it.
export const calendarFeeds: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE IF NOT EXISTS calendar_feeds (
      secret_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      user_id UUID NOT NULL,
      made_at DATETIME(3) NOT NULL,
      revoked_at DATETIME(3) NULL,
      PRIMARY KEY (secret_hash),
      KEY calendar_feeds_of_user (user_id, revoked_at),
      CONSTRAINT calendar_feeds_user FOREIGN KEY (user_id) REFERENCES users (id)
    )`)
  },
  async down({ context }) {
    await context.dropTable('calendar_feeds')
  },
}
