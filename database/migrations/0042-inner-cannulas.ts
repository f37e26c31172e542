import type { Migration } from './migration.ts'

const cannulas = `CREATE TABLE IF NOT EXISTS inner_cannulas (
  id UUID NOT NULL,
  line_id UUID NOT NULL,
  size VARCHAR(12) NOT NULL COMMENT 'as on the label',
  used_as VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  fenestrated BOOLEAN NOT NULL,
  pack_size SMALLINT UNSIGNED NOT NULL,
  gtin CHAR(14) CHARACTER SET ascii COLLATE ascii_bin NULL,
  retired_at DATETIME(3) NULL,
  version INT UNSIGNED NOT NULL DEFAULT 1 COMMENT 'raised by each edit, so that two at once are noticed',
  PRIMARY KEY (id),
  UNIQUE KEY inner_cannulas_gtin (gtin),
  UNIQUE KEY inner_cannulas_described (line_id, size, used_as, fenestrated, pack_size),
  CONSTRAINT inner_cannulas_line FOREIGN KEY (line_id) REFERENCES tube_lines (id),
  CONSTRAINT inner_cannulas_have_a_size CHECK (CHAR_LENGTH(TRIM(size)) > 0),
  CONSTRAINT inner_cannulas_use_is_known CHECK (used_as IN ('disposable', 'reusable')),
  CONSTRAINT inner_cannulas_come_in_packs CHECK (pack_size > 0),
  CONSTRAINT inner_cannulas_gtin_is_digits CHECK (gtin IS NULL OR gtin REGEXP '^[0-9]{14}$')
)`

// Said by the maker for each pair: a cannula of the same number may not lock, and one of another number may.
const fits = `CREATE TABLE IF NOT EXISTS inner_cannula_fits (
  tube_id UUID NOT NULL,
  inner_cannula_id UUID NOT NULL,
  PRIMARY KEY (tube_id, inner_cannula_id),
  KEY inner_cannula_fits_cannula (inner_cannula_id, tube_id),
  CONSTRAINT inner_cannula_fits_tube FOREIGN KEY (tube_id) REFERENCES tubes (id),
  CONSTRAINT inner_cannula_fits_inner_cannula FOREIGN KEY (inner_cannula_id) REFERENCES inner_cannulas (id)
)`

export const innerCannulas: Migration = {
  async up({ context: { sequelize } }) {
    for (const statement of [cannulas, fits]) await sequelize.query(statement)
  },
  async down({ context }) {
    await context.dropTable('inner_cannula_fits')
    await context.dropTable('inner_cannulas')
  },
}
