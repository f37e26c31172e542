import type { Migration } from './migration.ts'

export const bedMoves: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE bed_moves (
      id UUID NOT NULL COMMENT 'minted when the form was opened: the same move twice is one',
      stay_id UUID NOT NULL,
      ward_id UUID NOT NULL COMMENT 'where to',
      bed_id UUID NOT NULL,
      moved_at DATETIME(3) NOT NULL,
      recorded_at DATETIME(3) NOT NULL DEFAULT UTC_TIMESTAMP(3),
      recorded_by UUID NOT NULL,
      PRIMARY KEY (id),
      KEY bed_moves_of_stay (stay_id, moved_at),
      CONSTRAINT bed_moves_stay FOREIGN KEY (stay_id) REFERENCES stays (id),
      CONSTRAINT bed_moves_bed FOREIGN KEY (bed_id, ward_id) REFERENCES beds (id, ward_id),
      CONSTRAINT bed_moves_recorded_by FOREIGN KEY (recorded_by) REFERENCES users (id)
    )`)
  },
  async down({ context }) {
    await context.dropTable('bed_moves')
  },
}
