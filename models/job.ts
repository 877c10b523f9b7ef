import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** A piece of work for the worker. */
export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
  declare id: CreationOptional<number>;
  declare kind: string;
  declare payload: Record<string, unknown>;
  declare state: CreationOptional<'queued' | 'running' | 'done' | 'failed' | 'cancelled'>;
  declare uniqueKey: CreationOptional<string | null>;
  declare portfolioId: CreationOptional<number | null>;
  declare createdById: CreationOptional<number | null>;
  declare attempts: CreationOptional<number>;
  declare maximumAttempts: CreationOptional<number>;
  declare runAfter: CreationOptional<Date>;
  declare leaseUntil: CreationOptional<Date | null>;
  declare worker: CreationOptional<string | null>;
  declare cancelRequested: CreationOptional<boolean>;
  declare progressStage: CreationOptional<string | null>;
  declare progressDone: CreationOptional<number>;
  declare progressTotal: CreationOptional<number>;
  declare error: CreationOptional<string | null>;
  declare startedAt: CreationOptional<Date | null>;
  declare finishedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Job.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    kind: { type: DataTypes.STRING(40), allowNull: false },
    payload: { type: DataTypes.JSON, allowNull: false },
    state: { type: DataTypes.STRING(12), allowNull: false, defaultValue: 'queued' },
    uniqueKey: { type: DataTypes.STRING(120), allowNull: true },
    portfolioId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    createdById: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    attempts: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
    maximumAttempts: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 3 },
    runAfter: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
    leaseUntil: { type: DataTypes.DATE(3), allowNull: true },
    worker: { type: DataTypes.STRING(80), allowNull: true },
    cancelRequested: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    progressStage: { type: DataTypes.STRING(40), allowNull: true },
    progressDone: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, defaultValue: 0 },
    progressTotal: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, defaultValue: 0 },
    error: { type: DataTypes.TEXT, allowNull: true },
    startedAt: { type: DataTypes.DATE(3), allowNull: true },
    finishedAt: { type: DataTypes.DATE(3), allowNull: true },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
    updatedAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'Job', tableName: 'jobs', timestamps: true },
);
