import { DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** Of one tube and one inner cannula: the maker says that they go together. */
export class InnerCannulaFitRow extends Model<
  InferAttributes<InnerCannulaFitRow>,
  InferCreationAttributes<InnerCannulaFitRow>
> {
  declare tubeId: string
  declare innerCannulaId: string
}

InnerCannulaFitRow.init(
  {
    tubeId: { type: DataTypes.UUID, primaryKey: true },
    innerCannulaId: { type: DataTypes.UUID, primaryKey: true },
  },
  { sequelize, tableName: 'inner_cannula_fits', timestamps: false },
)
