import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** A work in a portfolio: by an import, by hand, or taken out by hand. */
export class PortfolioWork extends Model<InferAttributes<PortfolioWork>, InferCreationAttributes<PortfolioWork>> {
  declare portfolioId: number;
  declare workId: number;
  declare membership: 'import' | 'hand' | 'removed';
  declare addedById: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
}

PortfolioWork.init(
  {
    portfolioId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    workId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    membership: { type: DataTypes.STRING(8), allowNull: false },
    addedById: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'PortfolioWork', tableName: 'portfolio_works', timestamps: false },
);
