import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** What came to a place or left it. Rows are never updated or deleted: the stock of a place is their sum. */
export class StockMoveRow extends Model<InferAttributes<StockMoveRow>, InferCreationAttributes<StockMoveRow>> {
  declare actId: string
  declare part: number
  declare act: string
  declare wardId: string
  declare bedId: string | null
  declare supply: CreationOptional<string | null>
  declare tubeId: CreationOptional<string | null>
  declare innerCannulaId: CreationOptional<string | null>
  declare quantity: number
  declare counted: CreationOptional<number | null>
  declare entryId: CreationOptional<string | null>
  declare stayId: CreationOptional<string | null>
  declare movedAt: Date
  declare recordedBy: string
  declare reason: CreationOptional<string | null>
}

StockMoveRow.init(
  {
    actId: { type: DataTypes.UUID, primaryKey: true },
    part: { type: DataTypes.TINYINT.UNSIGNED, primaryKey: true },
    act: { type: DataTypes.STRING(16), allowNull: false },
    wardId: { type: DataTypes.UUID, allowNull: false },
    bedId: { type: DataTypes.UUID, allowNull: true },
    supply: { type: DataTypes.STRING(32), allowNull: true },
    tubeId: { type: DataTypes.UUID, allowNull: true },
    innerCannulaId: { type: DataTypes.UUID, allowNull: true },
    quantity: { type: DataTypes.INTEGER, allowNull: false },
    counted: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
    entryId: { type: DataTypes.UUID, allowNull: true },
    stayId: { type: DataTypes.UUID, allowNull: true },
    movedAt: { type: DataTypes.DATE(3), allowNull: false },
    recordedBy: { type: DataTypes.UUID, allowNull: false },
    reason: { type: DataTypes.STRING(500), allowNull: true },
  },
  { sequelize, tableName: 'stock_moves', timestamps: false },
)
