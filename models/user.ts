import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { type Role } from '@/lib/access/permissions';
import { database } from '@/lib/db/connection';

/** A person with an account. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: CreationOptional<number>;
  declare email: string;
  declare name: string;
  declare role: Role;
  declare passwordHash: CreationOptional<string | null>;
  declare sessionVersion: CreationOptional<number>;
  declare disabledAt: CreationOptional<Date | null>;
  declare lastSignInAt: CreationOptional<Date | null>;
  declare demonstration: CreationOptional<boolean>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

User.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    email: { type: DataTypes.STRING(254), allowNull: false },
    name: { type: DataTypes.STRING(200), allowNull: false },
    role: { type: DataTypes.STRING(16), allowNull: false },
    passwordHash: { type: DataTypes.STRING(255), allowNull: true },
    sessionVersion: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
    disabledAt: { type: DataTypes.DATE(3), allowNull: true },
    lastSignInAt: { type: DataTypes.DATE(3), allowNull: true },
    demonstration: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
    updatedAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'User', tableName: 'users', timestamps: true },
);
