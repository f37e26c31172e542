import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** A place on a ward. It stays when it is retired, because stays and moves refer to it. */
export class BedRow extends Model<InferAttributes<BedRow>, InferCreationAttributes<BedRow>> {
  declare id: string
  declare wardId: string
  declare label: string
  declare position: number
  declare retired: CreationOptional<boolean>
}

BedRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    wardId: { type: DataTypes.UUID, allowNull: false },
    label: { type: DataTypes.STRING(16), allowNull: false },
    position: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
    retired: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
  },
  { sequelize, tableName: 'beds', timestamps: false },
)
