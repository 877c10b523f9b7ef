import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** Who did what, when. */
export class AuditEvent extends Model<InferAttributes<AuditEvent>, InferCreationAttributes<AuditEvent>> {
  declare id: CreationOptional<number>;
  declare userId: CreationOptional<number | null>;
  declare action: string;
  declare subjectType: CreationOptional<string | null>;
  declare subjectId: CreationOptional<string | null>;
  declare portfolioId: CreationOptional<number | null>;
  declare address: CreationOptional<string | null>;
  declare details: CreationOptional<Record<string, unknown> | null>;
  declare createdAt: CreationOptional<Date>;
}

AuditEvent.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    userId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    action: { type: DataTypes.STRING(60), allowNull: false },
    subjectType: { type: DataTypes.STRING(40), allowNull: true },
    subjectId: { type: DataTypes.STRING(40), allowNull: true },
    portfolioId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    address: { type: DataTypes.STRING(60), allowNull: true },
    details: { type: DataTypes.JSON, allowNull: true },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'AuditEvent', tableName: 'audit_events', timestamps: false },
);
