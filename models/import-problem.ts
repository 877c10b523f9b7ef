import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** A problem met while reading a file, with its line. */
export class ImportProblem extends Model<InferAttributes<ImportProblem>, InferCreationAttributes<ImportProblem>> {
  declare id: CreationOptional<number>;
  declare importId: number;
  declare position: CreationOptional<number | null>;
  declare line: number;
  declare severity: 'error' | 'warning';
  declare code: string;
  declare message: string;
  declare entryKey: CreationOptional<string | null>;
}

ImportProblem.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    importId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
    position: { type: DataTypes.INTEGER.UNSIGNED, allowNull: true },
    line: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    severity: { type: DataTypes.STRING(8), allowNull: false },
    code: { type: DataTypes.STRING(60), allowNull: false },
    message: { type: DataTypes.STRING(500), allowNull: false },
    entryKey: { type: DataTypes.STRING(255), allowNull: true },
  },
  { sequelize: database(), modelName: 'ImportProblem', tableName: 'import_problems', timestamps: false },
);
