import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { type GrantLevel } from '@/lib/access/permissions';
import { database } from '@/lib/db/connection';

/** What one person may do in one portfolio. */
export class PortfolioGrant extends Model<InferAttributes<PortfolioGrant>, InferCreationAttributes<PortfolioGrant>> {
  declare portfolioId: number;
  declare userId: number;
  declare level: GrantLevel;
  declare grantedById: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
}

PortfolioGrant.init(
  {
    portfolioId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    userId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    level: { type: DataTypes.STRING(12), allowNull: false },
    grantedById: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'PortfolioGrant', tableName: 'portfolio_grants', timestamps: false },
);
