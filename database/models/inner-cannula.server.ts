import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { InnerCannulaUse } from '#app/catalogue/item.ts'
import { sequelize } from '../sequelize.server.ts'

/** An inner cannula that can be had, as its maker describes it. Retired rather than deleted. */
export class InnerCannulaRow extends Model<InferAttributes<InnerCannulaRow>, InferCreationAttributes<InnerCannulaRow>> {
  declare id: string
  declare lineId: string
  declare size: string
  declare usedAs: InnerCannulaUse
  declare fenestrated: boolean
  declare packSize: number
  declare gtin: string | null
  declare retiredAt: Date | null
  declare version: CreationOptional<number>
}

InnerCannulaRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    lineId: { type: DataTypes.UUID, allowNull: false },
    size: { type: DataTypes.STRING(12), allowNull: false },
    usedAs: { type: DataTypes.STRING(16), allowNull: false },
    fenestrated: { type: DataTypes.BOOLEAN, allowNull: false },
    packSize: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
    gtin: { type: DataTypes.CHAR(14), allowNull: true },
    retiredAt: { type: DataTypes.DATE(3), allowNull: true },
    version: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 1 },
  },
  { sequelize, tableName: 'inner_cannulas', timestamps: false },
)
