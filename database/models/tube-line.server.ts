import { DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** A line of tubes and inner cannulas that one maker sells under one name. */
export class TubeLineRow extends Model<InferAttributes<TubeLineRow>, InferCreationAttributes<TubeLineRow>> {
  declare id: string
  declare name: string
  declare maker: string
}

TubeLineRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    name: { type: DataTypes.STRING(80), allowNull: false },
    maker: { type: DataTypes.STRING(80), allowNull: false },
  },
  { sequelize, tableName: 'tube_lines', timestamps: false },
)
