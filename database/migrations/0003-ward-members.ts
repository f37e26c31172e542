import type { Migration } from './migration.ts'

export const wardMembers: Migration = {
  async up({ context: { sequelize } }) {
    await sequelize.query(`CREATE TABLE ward_members (
      user_id UUID NOT NULL,
      ward_id UUID NOT NULL,
      added_at DATETIME(3) NOT NULL,
      added_by UUID NULL,
      PRIMARY KEY (user_id, ward_id),
      KEY ward_members_of_ward (ward_id),
      CONSTRAINT ward_members_user FOREIGN KEY (user_id) REFERENCES users (id),
      CONSTRAINT ward_members_ward FOREIGN KEY (ward_id) REFERENCES wards (id),
      CONSTRAINT ward_members_added_by FOREIGN KEY (added_by) REFERENCES users (id)
    )`)
  },
  async down({ context }) {
    await context.dropTable('ward_members')
  },
}
