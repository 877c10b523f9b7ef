import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** One cited reference of a record, as it stood in the file. */
export class Reference extends Model<InferAttributes<Reference>, InferCreationAttributes<Reference>> {
  declare recordId: number;
  declare position: number;
  declare line: number;
  declare variantHash: Buffer;
  declare raw: string;
}

Reference.init(
  {
    recordId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    position: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, primaryKey: true },
    line: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    variantHash: { type: 'BINARY(16)', allowNull: false },
    raw: { type: DataTypes.STRING(4000), allowNull: false },
  },
  { sequelize: database(), modelName: 'Reference', tableName: 'cited_references', timestamps: false },
);
