import { DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** A patient came to a bed: on admission, or from another bed. */
export class BedMoveRow extends Model<InferAttributes<BedMoveRow>, InferCreationAttributes<BedMoveRow>> {
  declare id: string
  declare stayId: string
  declare wardId: string
  declare bedId: string
  declare movedAt: Date
  declare recordedBy: string
}

BedMoveRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    stayId: { type: DataTypes.UUID, allowNull: false },
    wardId: { type: DataTypes.UUID, allowNull: false },
    bedId: { type: DataTypes.UUID, allowNull: false },
    movedAt: { type: DataTypes.DATE(3), allowNull: false },
    recordedBy: { type: DataTypes.UUID, allowNull: false },
  },
  { sequelize, tableName: 'bed_moves', timestamps: false },
)
