import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { PatientFacts } from '#app/care/kind.ts'
import { sequelize } from '../sequelize.server.ts'

/** A person with an airway to look after: who they are, and the facts that hold until somebody changes them. */
export class PatientRow extends Model<InferAttributes<PatientRow>, InferCreationAttributes<PatientRow>> {
  declare id: string
  declare recordNumber: string
  declare familyName: string
  declare givenName: string
  declare bornOn: string
  declare sex: 'female' | 'male' | 'other' | 'not known'
  declare allergies: string | null
  declare upperAirway: PatientFacts['upperAirway']
  declare laryngoscopy: CreationOptional<'1' | '2' | '3' | '4' | null>
  declare airwayNotes: CreationOptional<string | null>
  declare ventilated: boolean
  declare oxygen: string | null
  declare spo2Low: number | null
  declare spo2High: number | null
  declare demo: CreationOptional<boolean>
  declare version: CreationOptional<number>
}

PatientRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    recordNumber: { type: DataTypes.STRING(32), allowNull: false },
    familyName: { type: DataTypes.STRING(80), allowNull: false },
    givenName: { type: DataTypes.STRING(80), allowNull: false },
    bornOn: { type: DataTypes.DATEONLY, allowNull: false },
    sex: { type: DataTypes.STRING(16), allowNull: false },
    allergies: { type: DataTypes.STRING(500), allowNull: true },
    upperAirway: { type: DataTypes.STRING(16), allowNull: false },
    laryngoscopy: { type: DataTypes.CHAR(1), allowNull: true },
    airwayNotes: { type: DataTypes.STRING(500), allowNull: true },
    ventilated: { type: DataTypes.BOOLEAN, allowNull: false },
    oxygen: { type: DataTypes.STRING(120), allowNull: true },
    spo2Low: { type: DataTypes.TINYINT.UNSIGNED, allowNull: true, field: 'spo2_low' },
    spo2High: { type: DataTypes.TINYINT.UNSIGNED, allowNull: true, field: 'spo2_high' },
    demo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    version: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 1 },
  },
  { sequelize, tableName: 'patients', timestamps: false },
)
