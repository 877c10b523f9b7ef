import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { type Basis, type ClusterResult } from '@/lib/network/types';
import { database } from '@/lib/db/connection';

/** A cluster of an analysis. */
export class AnalysisCluster extends Model<InferAttributes<AnalysisCluster>, InferCreationAttributes<AnalysisCluster>> {
  declare analysisId: number;
  declare basis: Basis;
  declare number: number;
  declare letter: string;
  declare name: string;
  declare size: number;
  declare terms: ClusterResult['terms'];
  declare firmness: CreationOptional<number | null>;
  declare conductance: CreationOptional<number | null>;
  declare firstYear: CreationOptional<number | null>;
  declare medianYear: CreationOptional<number | null>;
  declare lastYear: CreationOptional<number | null>;
}

AnalysisCluster.init(
  {
    analysisId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    basis: { type: DataTypes.STRING(12), allowNull: false, primaryKey: true },
    number: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false, primaryKey: true },
    letter: { type: DataTypes.STRING(4), allowNull: false },
    name: { type: DataTypes.STRING(300), allowNull: false },
    size: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    terms: { type: DataTypes.JSON, allowNull: false },
    firmness: { type: DataTypes.DOUBLE, allowNull: true },
    conductance: { type: DataTypes.DOUBLE, allowNull: true },
    firstYear: { type: DataTypes.SMALLINT, allowNull: true },
    medianYear: { type: DataTypes.DOUBLE, allowNull: true },
    lastYear: { type: DataTypes.SMALLINT, allowNull: true },
  },
  { sequelize: database(), modelName: 'AnalysisCluster', tableName: 'analysis_clusters', timestamps: false },
);
