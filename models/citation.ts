import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** Citing work to cited work; one row a pair, derived from references. */
export class Citation extends Model<InferAttributes<Citation>, InferCreationAttributes<Citation>> {
  declare citingWorkId: number;
  declare citedWorkId: number;
  declare referenceCount: number;
}

Citation.init(
  {
    citingWorkId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    citedWorkId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    referenceCount: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
  },
  { sequelize: database(), modelName: 'Citation', tableName: 'citations', timestamps: false },
);
