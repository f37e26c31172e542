import { DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** That somebody belongs to a ward. */
export class WardMemberRow extends Model<InferAttributes<WardMemberRow>, InferCreationAttributes<WardMemberRow>> {
  declare userId: string
  declare wardId: string
  declare addedAt: Date
  declare addedBy: string | null
}

WardMemberRow.init(
  {
    userId: { type: DataTypes.UUID, primaryKey: true },
    wardId: { type: DataTypes.UUID, primaryKey: true },
    addedAt: { type: DataTypes.DATE(3), allowNull: false },
    addedBy: { type: DataTypes.UUID },
  },
  { sequelize, tableName: 'ward_members', timestamps: false },
)
