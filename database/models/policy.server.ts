import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Policy, RuleSet } from '#app/care/policy.ts'
import { sequelize } from '../sequelize.server.ts'

/** One reviewed set of values. Rows are never updated or deleted: a change is a new version. */
export class PolicyRow extends Model<InferAttributes<PolicyRow>, InferCreationAttributes<PolicyRow>> {
  declare id: string
  declare name: string
  declare version: number
  declare wardId: string | null
  declare ruleSet: CreationOptional<RuleSet>
  declare reviewedBy: string
  declare reviewerId: CreationOptional<string | null>
  declare reviewedOn: string
  declare startsAt: Date
  declare reason: string
  declare createdBy: string | null
  declare values: Policy['values']
}

PolicyRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    name: { type: DataTypes.STRING(120), allowNull: false },
    version: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    wardId: { type: DataTypes.UUID, allowNull: true },
    ruleSet: { type: DataTypes.STRING(8), allowNull: false, defaultValue: 'adults' },
    reviewedBy: { type: DataTypes.STRING(120), allowNull: false },
    reviewerId: { type: DataTypes.UUID, allowNull: true },
    reviewedOn: { type: DataTypes.DATEONLY, allowNull: false },
    startsAt: { type: DataTypes.DATE(3), allowNull: false },
    reason: { type: DataTypes.STRING(500), allowNull: false },
    createdBy: { type: DataTypes.UUID, allowNull: true },
    values: { type: DataTypes.JSON, allowNull: false, field: 'setting_values' },
  },
  { sequelize, tableName: 'policies', timestamps: false },
)
