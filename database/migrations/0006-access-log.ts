import type { Migration } from './migration.ts'

// Ids only, and no foreign keys: the log outlives what it is about, and nothing may keep it from being written.
const tables = [
  `CREATE TABLE IF NOT EXISTS access_log (
    chain VARCHAR(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    seq INT UNSIGNED NOT NULL,
    at DATETIME(3) NOT NULL,
    actor_id UUID NULL,
    actor_role VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL COMMENT 'at that moment',
    session_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
    purpose VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    action VARCHAR(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    outcome VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    resource_type VARCHAR(32) CHARACTER SET ascii COLLATE ascii_bin NULL,
    resource_id VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
    patient_id UUID NULL,
    stay_id UUID NULL,
    ward_id UUID NULL,
    path VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NULL,
    address VARCHAR(45) CHARACTER SET ascii COLLATE ascii_bin NULL,
    user_agent VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NULL,
    request_id VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
    prev_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    PRIMARY KEY (chain, seq),
    KEY access_log_of_ward (ward_id, at),
    KEY access_log_of_actor (actor_id, at),
    CONSTRAINT access_log_purpose_is_known CHECK (purpose IN ('TREAT', 'BTG', 'ADMIN', 'SIGN-IN')),
    CONSTRAINT access_log_outcome_is_known CHECK (outcome IN ('done', 'refused', 'failed'))
  )`,
  `CREATE TABLE IF NOT EXISTS access_log_heads (
    chain VARCHAR(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    seq INT UNSIGNED NOT NULL,
    hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    PRIMARY KEY (chain)
  )`,
]

const triggers = ['UPDATE', 'DELETE'].map(
  act => `CREATE TRIGGER IF NOT EXISTS access_log_refuses_${act.toLowerCase()} BEFORE ${act} ON access_log FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'access_log is append-only'`,
)

export const accessLog: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [...tables, ...triggers]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('access_log_heads')
    await context.dropTable('access_log')
  },
}
