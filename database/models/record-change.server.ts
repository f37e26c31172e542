import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '../sequelize.server.ts'

/** Who changed what of a patient, a stay, a ward or a bed. Rows are never updated or deleted. */
export class RecordChangeRow extends Model<InferAttributes<RecordChangeRow>, InferCreationAttributes<RecordChangeRow>> {
  declare id: CreationOptional<number>
  declare subject: 'patient' | 'stay' | 'ward' | 'bed'
  declare subjectId: string
  declare what: string
  declare changedBy: string
  declare oldValues: Readonly<Record<string, unknown>> | null
  declare newValues: Readonly<Record<string, unknown>>
}

RecordChangeRow.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, primaryKey: true, autoIncrement: true },
    subject: { type: DataTypes.STRING(16), allowNull: false },
    subjectId: { type: DataTypes.UUID, allowNull: false },
    what: { type: DataTypes.STRING(64), allowNull: false },
    changedBy: { type: DataTypes.UUID, allowNull: false },
    oldValues: { type: DataTypes.JSON, allowNull: true },
    newValues: { type: DataTypes.JSON, allowNull: false },
  },
  { sequelize, tableName: 'record_changes', timestamps: false },
)
