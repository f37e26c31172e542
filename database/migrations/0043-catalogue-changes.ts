import type { Migration } from './migration.ts'

const table = `CREATE TABLE IF NOT EXISTS catalogue_changes (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  subject VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  subject_id UUID NOT NULL,
  what VARCHAR(64) NOT NULL COMMENT 'in words: tube added, tube retired',
  changed_by UUID NOT NULL,
  changed_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  old_values JSON NULL COMMENT 'only what changed; null: it is new',
  new_values JSON NOT NULL,
  PRIMARY KEY (id),
  KEY catalogue_changes_of_subject (subject_id, id),
  CONSTRAINT catalogue_changes_changed_by FOREIGN KEY (changed_by) REFERENCES users (id),
  CONSTRAINT catalogue_changes_subject_is_known CHECK (subject IN ('line', 'tube', 'inner cannula'))
)`

const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS catalogue_changes_refuse_${act.toLowerCase()} BEFORE ${act} ON catalogue_changes
    FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'catalogue_changes is append-only'`,
)

export const catalogueChanges: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('catalogue_changes')
  },
}
