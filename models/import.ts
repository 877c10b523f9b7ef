import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { type ColumnKind } from '@/lib/bibliography/readers/delimited-columns';
import { type Format } from '@/lib/bibliography/record';
import { database } from '@/lib/db/connection';

/** Where an import is on its way; the only moves are those of lib/imports. */
export type ImportState = 'uploaded' | 'reading' | 'checking' | 'review' | 'accepting' | 'accepted' | 'undoing' | 'set-aside' | 'undone' | 'failed';

/** records = new + known + review + rejected, always. */
export interface ImportCounts {
  records: number;
  new: number;
  known: number;
  review: number;
  rejected: number;
  problems: number;
  references: number;
  linked: number;
}

/** One uploaded file on its way into a portfolio. */
export class Import extends Model<InferAttributes<Import>, InferCreationAttributes<Import>> {
  declare id: CreationOptional<number>;
  declare portfolioId: number;
  declare uploadedById: CreationOptional<number | null>;
  declare fileName: string;
  declare chosenFormat: CreationOptional<Format | null>;
  declare format: CreationOptional<Format | null>;
  declare encoding: CreationOptional<string | null>;
  /** Of a table: what a person said its columns hold; null where their heads decide. */
  declare columns: CreationOptional<(ColumnKind | null)[] | null>;
  declare sha256: string;
  declare bytes: number;
  declare storageKey: string;
  declare state: ImportState;
  declare autoAccept: CreationOptional<boolean>;
  declare progressStage: CreationOptional<string | null>;
  declare progressDone: CreationOptional<number>;
  declare progressTotal: CreationOptional<number>;
  declare startedAt: CreationOptional<Date | null>;
  declare checkedVersion: CreationOptional<number | null>;
  declare counts: CreationOptional<ImportCounts | null>;
  declare error: CreationOptional<string | null>;
  declare acceptedAt: CreationOptional<Date | null>;
  declare acceptedById: CreationOptional<number | null>;
  declare undoneAt: CreationOptional<Date | null>;
  declare standing: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Import.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    portfolioId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
    uploadedById: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    fileName: { type: DataTypes.STRING(255), allowNull: false },
    chosenFormat: { type: DataTypes.STRING(20), allowNull: true },
    format: { type: DataTypes.STRING(20), allowNull: true },
    encoding: { type: DataTypes.STRING(20), allowNull: true },
    columns: { type: DataTypes.JSON, allowNull: true },
    sha256: { type: DataTypes.CHAR(64), allowNull: false },
    bytes: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
    storageKey: { type: DataTypes.STRING(200), allowNull: false },
    state: { type: DataTypes.STRING(12), allowNull: false },
    autoAccept: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    progressStage: { type: DataTypes.STRING(24), allowNull: true },
    progressDone: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, defaultValue: 0 },
    progressTotal: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, defaultValue: 0 },
    startedAt: { type: DataTypes.DATE(3), allowNull: true },
    checkedVersion: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    counts: { type: DataTypes.JSON, allowNull: true },
    error: { type: DataTypes.TEXT, allowNull: true },
    acceptedAt: { type: DataTypes.DATE(3), allowNull: true },
    acceptedById: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    undoneAt: { type: DataTypes.DATE(3), allowNull: true },
    standing: { type: DataTypes.CHAR(64), allowNull: true },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
    updatedAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'Import', tableName: 'imports', timestamps: true },
);
