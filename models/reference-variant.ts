import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** One way in which a work is cited: equal references share it, and linking is decided once for all of them. */
export class ReferenceVariant extends Model<InferAttributes<ReferenceVariant>, InferCreationAttributes<ReferenceVariant>> {
  declare hash: Buffer;
  declare doi: CreationOptional<string | null>;
  declare pmid: CreationOptional<string | null>;
  declare identifierKey: CreationOptional<Buffer | null>;
  declare fieldKey: CreationOptional<Buffer | null>;
  declare titleKey: CreationOptional<Buffer | null>;
  declare ownKey: Buffer;
  declare author: CreationOptional<string | null>;
  declare family: CreationOptional<string | null>;
  declare year: CreationOptional<number | null>;
  declare title: CreationOptional<string | null>;
  declare source: CreationOptional<string | null>;
  declare volume: CreationOptional<string | null>;
  declare issue: CreationOptional<string | null>;
  declare page: CreationOptional<string | null>;
  declare raw: string;
  declare standing: CreationOptional<number>;
  declare workId: CreationOptional<number | null>;
  declare how: CreationOptional<'doi' | 'pmid' | 'fields' | 'title' | 'drawn' | null>;
}

ReferenceVariant.init(
  {
    hash: { type: 'BINARY(16)', allowNull: false, primaryKey: true },
    doi: { type: DataTypes.STRING(300), allowNull: true },
    pmid: { type: DataTypes.STRING(20), allowNull: true },
    identifierKey: { type: 'BINARY(16)', allowNull: true },
    fieldKey: { type: 'BINARY(16)', allowNull: true },
    titleKey: { type: 'BINARY(16)', allowNull: true },
    ownKey: { type: 'BINARY(16)', allowNull: false },
    author: { type: DataTypes.STRING(200), allowNull: true },
    family: { type: DataTypes.STRING(120), allowNull: true },
    year: { type: DataTypes.SMALLINT, allowNull: true },
    title: { type: DataTypes.STRING(600), allowNull: true },
    source: { type: DataTypes.STRING(300), allowNull: true },
    volume: { type: DataTypes.STRING(60), allowNull: true },
    issue: { type: DataTypes.STRING(60), allowNull: true },
    page: { type: DataTypes.STRING(60), allowNull: true },
    raw: { type: DataTypes.STRING(1000), allowNull: false },
    standing: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
    workId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    how: { type: DataTypes.STRING(12), allowNull: true },
  },
  { sequelize: database(), modelName: 'ReferenceVariant', tableName: 'reference_variants', timestamps: false },
);
