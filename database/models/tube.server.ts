import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { CatalogueTube } from '#app/catalogue/item.ts'
import { sequelize } from '../sequelize.server.ts'

/** A tube that can be had, as its maker describes it. Retired rather than deleted: what was charted refers to it. */
export class TubeRow extends Model<InferAttributes<TubeRow>, InferCreationAttributes<TubeRow>> {
  declare id: string
  declare lineId: string
  declare size: string
  declare sizeSystem: CatalogueTube['sizeSystem']
  declare construction: CatalogueTube['construction']
  declare innerCannula: CatalogueTube['innerCannula']
  declare idWithInner: number | null
  declare idWithoutInner: number
  declare od: number
  declare lengthMm: number
  declare cuff: CatalogueTube['cuff']
  declare fenestrated: boolean
  declare connector: CatalogueTube['connector']
  declare flange: CatalogueTube['flange']
  declare longestUseDays: number | null
  declare gtin: string | null
  declare insertionAid: boolean
  declare reusableInnerCannulas: number
  declare retiredAt: Date | null
  declare version: CreationOptional<number>
}

// Sequelize writes the column's name into what it is given, so each column gets its own.
const word = () => ({ type: DataTypes.STRING(16), allowNull: false })
const mm = () => ({ type: DataTypes.DECIMAL(4, 1), allowNull: false })

TubeRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    lineId: { type: DataTypes.UUID, allowNull: false },
    size: { type: DataTypes.STRING(12), allowNull: false },
    sizeSystem: word(),
    construction: word(),
    innerCannula: { ...word(), allowNull: true },
    idWithInner: { ...mm(), allowNull: true },
    idWithoutInner: mm(),
    od: mm(),
    lengthMm: mm(),
    cuff: word(),
    fenestrated: { type: DataTypes.BOOLEAN, allowNull: false },
    connector: word(),
    flange: word(),
    longestUseDays: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: true },
    gtin: { type: DataTypes.CHAR(14), allowNull: true },
    insertionAid: { type: DataTypes.BOOLEAN, allowNull: false },
    reusableInnerCannulas: { type: DataTypes.TINYINT.UNSIGNED, allowNull: false },
    retiredAt: { type: DataTypes.DATE(3), allowNull: true },
    version: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 1 },
  },
  { sequelize, tableName: 'tubes', timestamps: false },
)
