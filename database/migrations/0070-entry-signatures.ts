import type { Migration } from './migration.ts'

// Beside entries and not in them: most acts need no more than the session of whoever charts, and their row stays one statement.
const table = `CREATE TABLE IF NOT EXISTS entry_signatures (
  entry_id UUID NOT NULL,
  part VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  user_id UUID NOT NULL,
  role VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'at that moment',
  proof VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'not given: asked for, and charted without',
  competence VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NULL COMMENT 'for this act, at that moment; null: not asked for',
  signed_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'SHA-256 of the hash of the entry and this row; set by trigger',
  PRIMARY KEY (entry_id, part),
  CONSTRAINT entry_signatures_entry FOREIGN KEY (entry_id) REFERENCES entries (id),
  CONSTRAINT entry_signatures_user FOREIGN KEY (user_id) REFERENCES users (id),
  CONSTRAINT entry_signatures_part_is_known CHECK (part IN ('author', 'second person')),
  CONSTRAINT entry_signatures_proof_is_known CHECK (proof IN ('password', 'recent sign-in', 'session', 'not given')),
  CONSTRAINT entry_signatures_second_by_password CHECK (part = 'author' OR proof = 'password'),
  CONSTRAINT entry_signatures_competence_is_known CHECK (competence IN ('held', 'supervised', 'out of date', 'missing'))
)`

// database/verify-signatures repeats the hash.
const binding = `CREATE TRIGGER IF NOT EXISTS entry_signatures_are_bound BEFORE INSERT ON entry_signatures FOR EACH ROW
BEGIN
  DECLARE author, witness UUID;
  DECLARE head CHAR(64) CHARACTER SET ascii;
  SELECT recorded_by, witness_id, hash INTO author, witness, head FROM entries WHERE id = NEW.entry_id;
  IF NOT (NEW.user_id <=> IF(NEW.part = 'author', author, witness)) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'a signature is that of the author or the second person of its entry';
  END IF;
  SET NEW.hash = SHA2(CONCAT_WS('\\n', head, NEW.entry_id, NEW.part, NEW.user_id, NEW.role, NEW.proof,
    COALESCE(NEW.competence, '-'), NEW.signed_at), 256);
END`

const refusing = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS entry_signatures_refuse_${act.toLowerCase()} BEFORE ${act} ON entry_signatures FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entry_signatures is append-only'`,
)

export const entrySignatures: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [table, binding, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('entry_signatures')
  },
}
