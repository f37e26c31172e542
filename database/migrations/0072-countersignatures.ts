import type { Migration } from './migration.ts'

// A table and not a kind of care: a countersignature is about an entry, may come after the patient has left, and says
// nothing of the patient.
const table = `CREATE TABLE IF NOT EXISTS countersignatures (
  entry_id UUID NOT NULL,
  signed_by UUID NOT NULL,
  signed_role VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'at that moment',
  signed_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'SHA-256 of the hash of the entry and this row; set by trigger',
  PRIMARY KEY (entry_id),
  CONSTRAINT countersignatures_entry FOREIGN KEY (entry_id) REFERENCES entries (id),
  CONSTRAINT countersignatures_signed_by FOREIGN KEY (signed_by) REFERENCES users (id)
)`

// The stay's row is locked first, as it is by an entry: a correction at the same moment comes before or after, never between.
const binding = `CREATE TRIGGER IF NOT EXISTS countersignatures_are_bound BEFORE INSERT ON countersignatures FOR EACH ROW
BEGIN
  DECLARE author, stay UUID;
  DECLARE supervised BOOLEAN;
  DECLARE stands VARCHAR(16) CHARACTER SET ascii;
  DECLARE head CHAR(64) CHARACTER SET ascii;
  SELECT recorded_by, stay_id, under_supervision, status, hash INTO author, stay, supervised, stands, head
    FROM entries WHERE id = NEW.entry_id;
  UPDATE stays SET countersign_count = countersign_count + 1 WHERE id = stay;
  IF NEW.signed_by = author OR RIGHT(NEW.signed_role, 18) = ' under supervision' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures are by a registered colleague of the author';
  END IF;
  IF NOT (supervised <=> TRUE) OR stands <> 'final' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures are of entries charted under supervision';
  END IF;
  IF EXISTS (SELECT 1 FROM entries WHERE supersedes_id = NEW.entry_id LOCK IN SHARE MODE) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures are of entries that count';
  END IF;
  SET NEW.hash = SHA2(CONCAT_WS('\\n', head, NEW.entry_id, NEW.signed_by, NEW.signed_role, NEW.signed_at), 256);
END`

const raising = `CREATE TRIGGER IF NOT EXISTS countersignatures_raise_the_ward AFTER INSERT ON countersignatures FOR EACH ROW
  INSERT INTO ward_revs (ward_id)
    SELECT s.ward_id FROM entries e JOIN stays s ON s.id = e.stay_id WHERE e.id = NEW.entry_id
    ON DUPLICATE KEY UPDATE rev = rev + 1`

const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS countersignatures_refuse_${act.toLowerCase()} BEFORE ${act} ON countersignatures FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures is append-only'`,
)

export const countersignatures: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, binding, raising, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('countersignatures')
  },
}
