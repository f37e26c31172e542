import type { Migration } from './migration.ts'

// The pictures themselves are files of these names; a row is what makes one of them part of the record.
const table = `CREATE TABLE IF NOT EXISTS photographs (
  id UUID NOT NULL COMMENT 'of the entry and the content: the same form twice is the same photograph',
  entry_id UUID NOT NULL COMMENT 'with which it was added; a correction may keep it',
  stay_id UUID NOT NULL,
  file UUID NOT NULL COMMENT 'the name of its files in the store',
  width SMALLINT UNSIGNED NOT NULL,
  height SMALLINT UNSIGNED NOT NULL,
  bytes INT UNSIGNED NOT NULL,
  sha256 CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'of the file in the store',
  added_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  PRIMARY KEY (id),
  UNIQUE KEY photographs_file (file),
  KEY photographs_of_entry (entry_id),
  CONSTRAINT photographs_entry FOREIGN KEY (entry_id) REFERENCES entries (id),
  CONSTRAINT photographs_stay FOREIGN KEY (stay_id) REFERENCES stays (id),
  CONSTRAINT photographs_have_a_size CHECK (width > 0 AND height > 0 AND bytes > 0)
)`

const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS photographs_refuse_${act.toLowerCase()} BEFORE ${act} ON photographs FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'photographs is append-only: correct or retract their entry'`,
)

export const photographs: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('photographs')
  },
}
