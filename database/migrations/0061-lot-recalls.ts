import type { Migration } from './migration.ts'

const table = `CREATE TABLE IF NOT EXISTS lot_recalls (
  id UUID NOT NULL,
  lot VARCHAR(20) NOT NULL,
  line VARCHAR(120) NULL COMMENT 'null: whatever the line',
  is_recalled BOOLEAN NOT NULL COMMENT 'false: the recall before it is lifted',
  reason VARCHAR(500) NOT NULL,
  decided_by UUID NOT NULL,
  decided_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  number BIGINT UNSIGNED NOT NULL AUTO_INCREMENT COMMENT 'the order of the decisions',
  PRIMARY KEY (id),
  UNIQUE KEY lot_recalls_number (number),
  KEY lot_recalls_by_lot (lot, number),
  CONSTRAINT lot_recalls_decided_by FOREIGN KEY (decided_by) REFERENCES users (id),
  CONSTRAINT lot_recalls_say_why CHECK (CHAR_LENGTH(TRIM(reason)) > 0 AND CHAR_LENGTH(TRIM(lot)) > 0)
)`

const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS lot_recalls_refuse_${act.toLowerCase()} BEFORE ${act} ON lot_recalls
    FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'lot_recalls is append-only'`,
)

export const lotRecalls: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('lot_recalls')
  },
}
