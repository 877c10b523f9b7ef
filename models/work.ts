import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { type PersonName, type WorkType, type Identifiers } from '@/lib/bibliography/record';
import { database } from '@/lib/db/connection';

/** Anything that can cite or be cited. Derived from the records that stand on it; never edited in place. */
export class Work extends Model<InferAttributes<Work>, InferCreationAttributes<Work>> {
  declare id: CreationOptional<number>;
  declare workKey: Buffer;
  declare catalogued: boolean;
  declare type: CreationOptional<WorkType>;
  declare title: CreationOptional<string | null>;
  declare titleSort: CreationOptional<string | null>;
  declare authors: CreationOptional<PersonName[] | null>;
  declare authorsLabel: CreationOptional<string | null>;
  declare firstFamily: CreationOptional<string | null>;
  declare year: CreationOptional<number | null>;
  declare venue: CreationOptional<string | null>;
  declare volume: CreationOptional<string | null>;
  declare issue: CreationOptional<string | null>;
  declare firstPage: CreationOptional<string | null>;
  declare lastPage: CreationOptional<string | null>;
  declare articleNumber: CreationOptional<string | null>;
  declare publisher: CreationOptional<string | null>;
  declare doi: CreationOptional<string | null>;
  declare identifiers: CreationOptional<Identifiers | null>;
  declare abstract: CreationOptional<string | null>;
  declare keywords: CreationOptional<string[] | null>;
  declare language: CreationOptional<string | null>;
  declare url: CreationOptional<string | null>;
  declare retracted: CreationOptional<boolean>;
  declare recordCount: CreationOptional<number>;
  declare referenceCount: CreationOptional<number>;
  declare citingCount: CreationOptional<number>;
  declare citedCount: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Work.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    workKey: { type: 'BINARY(16)', allowNull: false },
    catalogued: { type: DataTypes.BOOLEAN, allowNull: false },
    type: { type: DataTypes.STRING(20), allowNull: false, defaultValue: 'other' },
    title: { type: DataTypes.TEXT, allowNull: true },
    titleSort: { type: DataTypes.STRING(160), allowNull: true },
    authors: { type: DataTypes.JSON, allowNull: true },
    authorsLabel: { type: DataTypes.STRING(300), allowNull: true },
    firstFamily: { type: DataTypes.STRING(120), allowNull: true },
    year: { type: DataTypes.SMALLINT, allowNull: true },
    venue: { type: DataTypes.STRING(600), allowNull: true },
    volume: { type: DataTypes.STRING(60), allowNull: true },
    issue: { type: DataTypes.STRING(60), allowNull: true },
    firstPage: { type: DataTypes.STRING(60), allowNull: true },
    lastPage: { type: DataTypes.STRING(60), allowNull: true },
    articleNumber: { type: DataTypes.STRING(60), allowNull: true },
    publisher: { type: DataTypes.STRING(300), allowNull: true },
    doi: { type: DataTypes.STRING(300), allowNull: true },
    identifiers: { type: DataTypes.JSON, allowNull: true },
    abstract: { type: DataTypes.TEXT('medium'), allowNull: true },
    keywords: { type: DataTypes.JSON, allowNull: true },
    language: { type: DataTypes.STRING(40), allowNull: true },
    url: { type: DataTypes.STRING(1000), allowNull: true },
    retracted: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    recordCount: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
    referenceCount: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
    citingCount: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
    citedCount: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
    updatedAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'Work', tableName: 'works', timestamps: true },
);
