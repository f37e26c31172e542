import type { Migration } from './migration.ts'

// None of the numbers follows from another, whatever the label says, so each has its own column.
const table = `CREATE TABLE tubes (
  id UUID NOT NULL,
  line_id UUID NOT NULL,
  size VARCHAR(12) NOT NULL COMMENT 'as on the label',
  size_system VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  construction VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  inner_cannula VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NULL COMMENT 'null: single cannula',
  id_with_inner DECIMAL(4,1) NULL COMMENT 'mm; null: single cannula',
  id_without_inner DECIMAL(4,1) NOT NULL COMMENT 'mm',
  od DECIMAL(4,1) NOT NULL COMMENT 'mm',
  length_mm DECIMAL(4,1) NOT NULL,
  cuff VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  fenestrated BOOLEAN NOT NULL,
  connector VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'where the 15 mm connector sits',
  flange VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  longest_use_days SMALLINT UNSIGNED NULL COMMENT 'null: the label gives none',
  gtin CHAR(14) CHARACTER SET ascii COLLATE ascii_bin NULL,
  insertion_aid BOOLEAN NOT NULL COMMENT 'an obturator comes with it',
  reusable_inner_cannulas TINYINT UNSIGNED NOT NULL COMMENT 'how many come with it',
  retired_at DATETIME(3) NULL,
  version INT UNSIGNED NOT NULL DEFAULT 1 COMMENT 'raised by each edit, so that two at once are noticed',
  sold_with VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin AS (COALESCE(inner_cannula, 'none')) VIRTUAL,
  PRIMARY KEY (id),
  UNIQUE KEY tubes_gtin (gtin),
  UNIQUE KEY tubes_described
    (line_id, size, size_system, construction, sold_with, cuff, fenestrated, connector, flange, length_mm),
  KEY tubes_by_size (size_system, size),
  CONSTRAINT tubes_line FOREIGN KEY (line_id) REFERENCES tube_lines (id),
  CONSTRAINT tubes_have_a_size CHECK (CHAR_LENGTH(TRIM(size)) > 0),
  CONSTRAINT tubes_size_system_is_known CHECK (size_system IN ('ISO 5366', 'Jackson')),
  CONSTRAINT tubes_are_single_or_dual CHECK ((construction = 'single' AND inner_cannula IS NULL AND id_with_inner IS NULL)
    OR (construction = 'dual' AND inner_cannula IS NOT NULL AND inner_cannula IN ('disposable', 'reusable')
      AND id_with_inner IS NOT NULL)),
  CONSTRAINT tubes_walls_nest CHECK (od > id_without_inner
    AND (id_with_inner IS NULL OR (id_with_inner > 0 AND id_without_inner > id_with_inner))),
  CONSTRAINT tubes_have_a_length CHECK (length_mm > 0),
  CONSTRAINT tubes_cuff_is_known CHECK (cuff IN ('none', 'air', 'water', 'foam')),
  CONSTRAINT tubes_connector_is_known CHECK (connector IN ('outer', 'inner', 'none')),
  CONSTRAINT tubes_flange_is_known CHECK (flange IN ('fixed', 'adjustable')),
  CONSTRAINT tubes_last_a_day CHECK (longest_use_days IS NULL OR longest_use_days > 0),
  CONSTRAINT tubes_gtin_is_digits CHECK (gtin IS NULL OR gtin REGEXP '^[0-9]{14}$')
)`

export const tubes: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(table)
  },
  async down({ context }) {
    await context.dropTable('tubes')
  },
}
