import type { Migration } from './migration.ts'

const signOffs = `CREATE TABLE IF NOT EXISTS competences (
  id UUID NOT NULL COMMENT 'minted when the form was opened: the same id twice is the same sign-off',
  user_id UUID NOT NULL,
  skill VARCHAR(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  level VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  assessed_on DATE NOT NULL,
  expires_on DATE NOT NULL,
  assessed_by UUID NOT NULL,
  assessed_role VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'at that moment',
  signed_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  PRIMARY KEY (id),
  KEY competences_of_user (user_id, skill, signed_at),
  CONSTRAINT competences_user FOREIGN KEY (user_id) REFERENCES users (id),
  CONSTRAINT competences_assessed_by FOREIGN KEY (assessed_by) REFERENCES users (id),
  CONSTRAINT competences_level_is_known CHECK (level IN ('supervised', 'independent', 'assessor')),
  CONSTRAINT competences_are_assessed_by_another CHECK (assessed_by <> user_id),
  CONSTRAINT competences_expire CHECK (expires_on > assessed_on)
)`

const withdrawals = `CREATE TABLE IF NOT EXISTS competence_withdrawals (
  competence_id UUID NOT NULL,
  withdrawn_by UUID NOT NULL,
  reason VARCHAR(500) NOT NULL,
  withdrawn_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
  PRIMARY KEY (competence_id),
  CONSTRAINT competence_withdrawals_competence FOREIGN KEY (competence_id) REFERENCES competences (id),
  CONSTRAINT competence_withdrawals_withdrawn_by FOREIGN KEY (withdrawn_by) REFERENCES users (id),
  CONSTRAINT competence_withdrawals_have_a_reason CHECK (CHAR_LENGTH(TRIM(reason)) > 0)
)`

const refusing = ['competences', 'competence_withdrawals'].flatMap(name =>
  ['UPDATE', 'DELETE'].map(
    act => `CREATE TRIGGER IF NOT EXISTS ${name}_refuse_${act.toLowerCase()} BEFORE ${act} ON ${name} FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = '${name} is append-only: sign off anew, or withdraw'`,
  ),
)

export const competences: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [signOffs, withdrawals, ...refusing]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('competence_withdrawals')
    await context.dropTable('competences')
  },
}
