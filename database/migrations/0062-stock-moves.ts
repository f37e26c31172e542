import type { Migration } from './migration.ts'

// `item` is what rows are added up by: the one of the three columns that is filled. The stock of a place is the sum of its
// moves, and of nothing else: no number is kept that could be edited.
const table = `CREATE TABLE IF NOT EXISTS stock_moves (
  act_id UUID NOT NULL COMMENT 'minted when the form was opened, or the entry: the same id twice is the same act',
  part TINYINT UNSIGNED NOT NULL COMMENT 'an act may move several things, or one from place to place',
  act VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  ward_id UUID NOT NULL,
  bed_id UUID NULL COMMENT 'null: the store of the ward',
  supply VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL COMMENT 'by name, as the program lists them',
  tube_id UUID NULL,
  inner_cannula_id UUID NULL,
  item VARCHAR(36) CHARACTER SET ascii COLLATE ascii_bin AS
    (COALESCE(supply, CAST(tube_id AS CHAR(36)), CAST(inner_cannula_id AS CHAR(36)))) PERSISTENT,
  quantity INT NOT NULL COMMENT 'pieces; negative: they left the place',
  counted INT UNSIGNED NULL COMMENT 'what lay there by a count; quantity is the difference',
  entry_id UUID NULL COMMENT 'whose use it is; of a give-back: the entry that no longer counts',
  stay_id UUID NULL COMMENT 'whose patient used it',
  moved_at DATETIME(3) NOT NULL COMMENT 'when it was done; of a use: when the care was',
  recorded_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  recorded_by UUID NOT NULL,
  reason VARCHAR(500) NULL,
  PRIMARY KEY (act_id, part),
  KEY stock_moves_of_place (ward_id, item, bed_id, quantity),
  KEY stock_moves_of_bed (bed_id, item, quantity),
  KEY stock_moves_of_ward (ward_id, recorded_at, act_id, part),
  KEY stock_moves_of_use (stay_id, moved_at, item, quantity),
  KEY stock_moves_of_entry (entry_id),
  CONSTRAINT stock_moves_ward FOREIGN KEY (ward_id) REFERENCES wards (id),
  CONSTRAINT stock_moves_bed FOREIGN KEY (bed_id, ward_id) REFERENCES beds (id, ward_id),
  CONSTRAINT stock_moves_tube FOREIGN KEY (tube_id) REFERENCES tubes (id),
  CONSTRAINT stock_moves_inner_cannula FOREIGN KEY (inner_cannula_id) REFERENCES inner_cannulas (id),
  CONSTRAINT stock_moves_entry FOREIGN KEY (entry_id) REFERENCES entries (id),
  CONSTRAINT stock_moves_stay FOREIGN KEY (stay_id) REFERENCES stays (id),
  CONSTRAINT stock_moves_recorded_by FOREIGN KEY (recorded_by) REFERENCES users (id),
  CONSTRAINT stock_moves_are_of_one_item CHECK ((supply IS NOT NULL) + (tube_id IS NOT NULL) + (inner_cannula_id IS NOT NULL) = 1),
  CONSTRAINT stock_moves_act_is_known CHECK (act IN ('received', 'moved', 'used', 'given back', 'counted', 'wasted')),
  CONSTRAINT stock_moves_go_one_way CHECK ((act = 'received' AND quantity > 0) OR (act = 'moved' AND quantity <> 0)
    OR (act IN ('used', 'wasted') AND quantity < 0) OR (act = 'given back' AND quantity > 0) OR act = 'counted'),
  CONSTRAINT stock_moves_count_what_they_found CHECK ((act = 'counted') = (counted IS NOT NULL)),
  CONSTRAINT stock_moves_of_care_name_it CHECK ((act IN ('used', 'given back')) = (entry_id IS NOT NULL)
    AND (entry_id IS NULL) = (stay_id IS NULL)),
  CONSTRAINT stock_moves_waste_with_a_reason CHECK (act <> 'wasted'
    OR (reason IS NOT NULL AND CHAR_LENGTH(TRIM(reason)) > 0)),
  CONSTRAINT stock_moves_have_happened CHECK (moved_at <= recorded_at + INTERVAL 2 MINUTE)
)`

const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS stock_moves_refuse_${act.toLowerCase()} BEFORE ${act} ON stock_moves FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'stock_moves is append-only: count, or give back with a new move'`,
)

export const stockMoves: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('stock_moves')
  },
}
