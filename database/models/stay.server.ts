import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** One stay of a patient, from admission to discharge. The columns that triggers and the server compute are left out. */
export class StayRow extends Model<InferAttributes<StayRow>, InferCreationAttributes<StayRow>> {
  declare id: string
  declare patientId: string
  declare wardId: string
  declare bedId: string
  declare admittedAt: Date
  declare dischargedAt: CreationOptional<Date | null>
  declare dischargeReason: CreationOptional<string | null>
  declare dischargeNote: CreationOptional<string | null>
}

StayRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    patientId: { type: DataTypes.UUID, allowNull: false },
    wardId: { type: DataTypes.UUID, allowNull: false },
    bedId: { type: DataTypes.UUID, allowNull: false },
    admittedAt: { type: DataTypes.DATE(3), allowNull: false },
    dischargedAt: { type: DataTypes.DATE(3), allowNull: true },
    dischargeReason: { type: DataTypes.STRING(32), allowNull: true },
    dischargeNote: { type: DataTypes.STRING(500), allowNull: true },
  },
  { sequelize, tableName: 'stays', timestamps: false },
)
