import type { Migration } from './migration.ts'

// The CHECK on data is named and apart: inline on the column it would replace MariaDB's own, and JSON would read back as text.
const table = `CREATE TABLE IF NOT EXISTS entries (
  id UUID NOT NULL COMMENT 'minted when the form was opened: the same id twice is the same act',
  stay_id UUID NOT NULL,
  number INT UNSIGNED NOT NULL COMMENT 'from 1 without gaps in each stay; set by trigger',
  kind VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  version SMALLINT UNSIGNED NOT NULL COMMENT 'of the payload, by the upgrades of its kind',
  performed_at DATETIME(3) NOT NULL,
  recorded_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  recorded_by UUID NOT NULL,
  recorded_role VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'at that moment',
  witness_id UUID NULL,
  supersedes_id UUID NULL,
  reason VARCHAR(500) NULL,
  status VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'final',
  data JSON NOT NULL,
  hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'SHA-256 of the hash before it and this row; set by trigger',
  PRIMARY KEY (id),
  UNIQUE KEY entries_number (stay_id, number),
  UNIQUE KEY entries_supersedes (supersedes_id),
  KEY entries_timeline (stay_id, performed_at, id),
  KEY entries_by_kind (stay_id, kind, performed_at, id),
  CONSTRAINT entries_stay FOREIGN KEY (stay_id) REFERENCES stays (id),
  CONSTRAINT entries_recorded_by FOREIGN KEY (recorded_by) REFERENCES users (id),
  CONSTRAINT entries_witness FOREIGN KEY (witness_id) REFERENCES users (id),
  CONSTRAINT entries_supersede FOREIGN KEY (supersedes_id) REFERENCES entries (id),
  CONSTRAINT entries_data_is_object CHECK (JSON_TYPE(data) = 'OBJECT'),
  CONSTRAINT entries_data_is_small CHECK (LENGTH(data) <= 65535),
  CONSTRAINT entries_kind_is_a_slug CHECK (kind REGEXP '^[a-z]([a-z0-9-]*[a-z0-9])?$'),
  CONSTRAINT entries_are_counted CHECK (number > 0 AND version > 0),
  CONSTRAINT entries_status_is_known CHECK (status IN ('final', 'retracted')),
  CONSTRAINT entries_retract_another CHECK (status = 'final' OR supersedes_id IS NOT NULL),
  CONSTRAINT entries_correct_with_a_reason CHECK (supersedes_id IS NULL
    OR (reason IS NOT NULL AND CHAR_LENGTH(TRIM(reason)) > 0)),
  CONSTRAINT entries_have_happened CHECK (performed_at <= recorded_at + INTERVAL 2 MINUTE),
  CONSTRAINT entries_are_witnessed_by_another CHECK (witness_id IS NULL OR witness_id <> recorded_by)
)`

// Free text comes last but for the payload and is quoted, so that no two rows read the same. database/verify-entries repeats this.
const hashed = `SHA2(CONCAT_WS('\\n', head, NEW.id, NEW.stay_id, counted, NEW.kind, NEW.version, NEW.performed_at,
    NEW.recorded_at, NEW.recorded_by, NEW.recorded_role, COALESCE(CAST(NEW.witness_id AS CHAR), '-'),
    COALESCE(CAST(NEW.supersedes_id AS CHAR), '-'), NEW.status, COALESCE(JSON_QUOTE(NEW.reason), '-'), NEW.data), 256)`

// The number is given under the lock of the stay's row, which is held until the commit: whoever sees number n sees all
// before it. All reads lock, because a plain read would open a snapshot, and the ward's counter may have moved since.
const numbering = `CREATE TRIGGER IF NOT EXISTS entries_are_numbered BEFORE INSERT ON entries FOR EACH ROW
BEGIN
  DECLARE counted INT UNSIGNED;
  DECLARE ended DATETIME(3);
  DECLARE head CHAR(64) CHARACTER SET ascii;
  SELECT entry_count + 1, discharged_at, last_entry_hash INTO counted, ended, head
    FROM stays WHERE id = NEW.stay_id FOR UPDATE;
  IF counted IS NULL THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries belong to a stay';
  END IF;
  IF NEW.performed_at > ended THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries are performed within their stay';
  END IF;
  IF NEW.supersedes_id IS NOT NULL AND NOT EXISTS (SELECT 1 FROM entries
    WHERE id = NEW.supersedes_id AND stay_id = NEW.stay_id AND kind = NEW.kind LOCK IN SHARE MODE) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries supersede one of the same stay and kind';
  END IF;
  SET NEW.number = counted, NEW.hash = ${hashed};
  UPDATE stays SET entry_count = counted, last_entry_hash = NEW.hash WHERE id = NEW.stay_id;
END`

// The ward's row is the hottest one: it is locked last.
const raising = `CREATE TRIGGER IF NOT EXISTS entries_raise_the_ward AFTER INSERT ON entries FOR EACH ROW
  INSERT INTO ward_revs (ward_id) SELECT ward_id FROM stays WHERE id = NEW.stay_id FOR UPDATE
    ON DUPLICATE KEY UPDATE rev = rev + 1`

const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS entries_refuse_${act.toLowerCase()} BEFORE ${act} ON entries FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries is append-only: correct or retract with a new entry'`,
)

export const entries: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, numbering, raising, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('entries')
  },
}
