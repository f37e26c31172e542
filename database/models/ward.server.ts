import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { EmergencyNumber } from '#app/care/emergency.ts'
import type { PressureUnit } from '#app/clinical/units.ts'
import { sequelize } from '../sequelize.server.ts'

/** A ward with the things that rules and signs need of it. */
export class WardRow extends Model<InferAttributes<WardRow>, InferCreationAttributes<WardRow>> {
  declare id: string
  declare name: string
  declare shiftTimes: readonly string[]
  declare pressureUnit: PressureUnit
  declare emergencyNumbers: CreationOptional<readonly EmergencyNumber[]>
  declare retired: CreationOptional<boolean>
}

WardRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    name: { type: DataTypes.STRING(80), allowNull: false },
    shiftTimes: { type: DataTypes.JSON, allowNull: false },
    pressureUnit: { type: DataTypes.STRING(8), allowNull: false },
    emergencyNumbers: { type: DataTypes.JSON, allowNull: false, defaultValue: [] },
    retired: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
  },
  { sequelize, tableName: 'wards', timestamps: false },
)
