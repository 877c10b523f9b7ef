import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** A curated set of works of a unit, a project or a question, with a period. */
export class Portfolio extends Model<InferAttributes<Portfolio>, InferCreationAttributes<Portfolio>> {
  declare id: CreationOptional<number>;
  declare unitId: CreationOptional<number | null>;
  declare name: string;
  declare description: CreationOptional<string>;
  declare periodFrom: CreationOptional<number | null>;
  declare periodTo: CreationOptional<number | null>;
  declare createdById: CreationOptional<number | null>;
  declare demonstration: CreationOptional<boolean>;
  declare seedKey: CreationOptional<string | null>;
  declare deletedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Portfolio.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    unitId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    name: { type: DataTypes.STRING(200), allowNull: false },
    description: { type: DataTypes.STRING(2000), allowNull: false, defaultValue: '' },
    periodFrom: { type: DataTypes.SMALLINT, allowNull: true },
    periodTo: { type: DataTypes.SMALLINT, allowNull: true },
    createdById: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    demonstration: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    seedKey: { type: DataTypes.STRING(60), allowNull: true },
    deletedAt: { type: DataTypes.DATE(3), allowNull: true },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
    updatedAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'Portfolio', tableName: 'portfolios', timestamps: true },
);
