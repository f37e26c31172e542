import { type CreationOptional, DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Role } from '#app/auth/permissions.ts'
import { sequelize } from '../sequelize.server.ts'

/** Somebody who may sign in. Never deleted, because what they charted names them; disabled instead. */
export class UserRow extends Model<InferAttributes<UserRow>, InferCreationAttributes<UserRow>> {
  declare id: string
  declare name: string
  declare email: string
  declare role: Role
  declare supervised: CreationOptional<boolean>
  declare passwordHash: string
  declare passwordSetAt: Date
  declare oneTimeUntil: Date | null
  declare addedAt: Date
  declare addedBy: string | null
  declare disabledAt: CreationOptional<Date | null>
}

UserRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    name: { type: DataTypes.STRING(120), allowNull: false },
    email: { type: DataTypes.STRING(254), allowNull: false },
    role: { type: DataTypes.STRING(32), allowNull: false },
    supervised: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    passwordHash: { type: DataTypes.STRING(200), allowNull: false },
    passwordSetAt: { type: DataTypes.DATE(3), allowNull: false },
    oneTimeUntil: { type: DataTypes.DATE(3) },
    addedAt: { type: DataTypes.DATE(3), allowNull: false },
    addedBy: { type: DataTypes.UUID },
    disabledAt: { type: DataTypes.DATE(3) },
  },
  { sequelize, tableName: 'users', timestamps: false },
)
