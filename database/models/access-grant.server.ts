import { DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** A reason that opened a patient of another ward for a while. */
export class AccessGrantRow extends Model<InferAttributes<AccessGrantRow>, InferCreationAttributes<AccessGrantRow>> {
  declare id: string
  declare userId: string
  declare patientId: string
  declare wardId: string
  declare reason: string
  declare grantedAt: Date
  declare endsAt: Date
}

AccessGrantRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    userId: { type: DataTypes.UUID, allowNull: false },
    patientId: { type: DataTypes.UUID, allowNull: false },
    wardId: { type: DataTypes.UUID, allowNull: false },
    reason: { type: DataTypes.STRING(500), allowNull: false },
    grantedAt: { type: DataTypes.DATE(3), allowNull: false },
    endsAt: { type: DataTypes.DATE(3), allowNull: false },
  },
  { sequelize, tableName: 'access_grants', timestamps: false },
)
