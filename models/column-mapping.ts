import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { type ColumnKind } from '@/lib/bibliography/readers/delimited-columns';
import { database } from '@/lib/db/connection';

/** What one person's tables with a certain head hold, column by column; asked for once, taken again for the next such table. */
export class ColumnMapping extends Model<InferAttributes<ColumnMapping>, InferCreationAttributes<ColumnMapping>> {
  declare userId: number;
  declare headHash: Buffer;
  declare columns: (ColumnKind | null)[];
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

ColumnMapping.init(
  {
    userId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    headHash: { type: 'BINARY(16)', allowNull: false, primaryKey: true },
    columns: { type: DataTypes.JSON, allowNull: false },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
    updatedAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'ColumnMapping', tableName: 'column_mappings', timestamps: true },
);
