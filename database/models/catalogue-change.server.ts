import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

type Values = Readonly<Record<string, string>>

/** Who changed what in the catalogue. Rows are never updated or deleted. */
export class CatalogueChangeRow extends Model<
  InferAttributes<CatalogueChangeRow>,
  InferCreationAttributes<CatalogueChangeRow>
> {
  declare id: CreationOptional<number>
  declare subject: 'line' | 'tube' | 'inner cannula'
  declare subjectId: string
  declare what: string
  declare changedBy: string
  declare oldValues: Values | null
  declare newValues: Values
}

CatalogueChangeRow.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
    subject: { type: DataTypes.STRING(16), allowNull: false },
    subjectId: { type: DataTypes.UUID, allowNull: false },
    what: { type: DataTypes.STRING(64), allowNull: false },
    changedBy: { type: DataTypes.UUID, allowNull: false },
    oldValues: { type: DataTypes.JSON, allowNull: true },
    newValues: { type: DataTypes.JSON, allowNull: false },
  },
  { sequelize, tableName: 'catalogue_changes', timestamps: false },
)
