import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** One entry of an uploaded file, kept as it was read. */
export class ImportRecord extends Model<InferAttributes<ImportRecord>, InferCreationAttributes<ImportRecord>> {
  declare id: CreationOptional<number>;
  declare importId: number;
  declare position: number;
  declare line: number;
  declare entryKey: CreationOptional<string | null>;
  declare title: CreationOptional<string | null>;
  declare raw: string;
  declare fields: CreationOptional<string | null>;
  declare outcome: CreationOptional<'new' | 'known' | 'review' | 'rejected' | null>;
  declare catalogued: CreationOptional<boolean>;
  declare citing: CreationOptional<boolean>;
  declare referenceCount: CreationOptional<number>;
  declare workId: CreationOptional<number | null>;
}

ImportRecord.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    importId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
    position: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    line: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    entryKey: { type: DataTypes.STRING(255), allowNull: true },
    title: { type: DataTypes.STRING(500), allowNull: true },
    raw: { type: DataTypes.TEXT('medium'), allowNull: false },
    fields: { type: DataTypes.TEXT('long'), allowNull: true },
    outcome: { type: DataTypes.STRING(8), allowNull: true },
    catalogued: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    citing: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    referenceCount: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, defaultValue: 0 },
    workId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
  },
  { sequelize: database(), modelName: 'ImportRecord', tableName: 'import_records', timestamps: false },
);
