import type { Migration } from './migration.ts'

// What somebody had typed when their session ended. Theirs alone, one a page, gone after a day.
export const drafts: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE drafts (
      user_id UUID NOT NULL,
      path VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      fields JSON NOT NULL COMMENT 'each name with its values, as the form sent them',
      saved_at DATETIME(3) NOT NULL,
      PRIMARY KEY (user_id, path),
      KEY drafts_by_age (saved_at),
      CONSTRAINT drafts_user FOREIGN KEY (user_id) REFERENCES users (id)
    )`)
  },
  async down({ context }) {
    await context.dropTable('drafts')
  },
}
