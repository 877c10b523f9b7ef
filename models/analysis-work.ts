import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { database } from '@/lib/db/connection';

/** The measures of one work in one analysis, with its label as it was then. */
export class AnalysisWork extends Model<InferAttributes<AnalysisWork>, InferCreationAttributes<AnalysisWork>> {
  declare analysisId: number;
  declare position: number;
  declare workId: number;
  declare catalogued: boolean;
  declare title: CreationOptional<string | null>;
  declare authorsLabel: CreationOptional<string | null>;
  declare year: CreationOptional<number | null>;
  declare venue: CreationOptional<string | null>;
  declare doi: CreationOptional<string | null>;
  declare retracted: CreationOptional<boolean>;
  declare inDegree: number;
  declare outDegree: number;
  declare pageRank: number;
  declare pageRankHigh: number;
  declare rank: number;
  declare rankLow: number;
  declare rankHigh: number;
  declare citationRank: number;
  declare citationRankLow: number;
  declare citationRankHigh: number;
  declare agePercentile: CreationOptional<number | null>;
  declare citationsPerYear: CreationOptional<number | null>;
  declare inLoop: boolean;
  declare cocitationCluster: CreationOptional<number | null>;
  declare cocitationFirmness: CreationOptional<number | null>;
  declare couplingCluster: CreationOptional<number | null>;
  declare couplingFirmness: CreationOptional<number | null>;
  declare citationCluster: CreationOptional<number | null>;
  declare citationFirmness: CreationOptional<number | null>;
}

AnalysisWork.init(
  {
    analysisId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, primaryKey: true },
    position: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false, primaryKey: true },
    workId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
    catalogued: { type: DataTypes.BOOLEAN, allowNull: false },
    title: { type: DataTypes.STRING(1000), allowNull: true },
    authorsLabel: { type: DataTypes.STRING(300), allowNull: true },
    year: { type: DataTypes.SMALLINT, allowNull: true },
    venue: { type: DataTypes.STRING(300), allowNull: true },
    doi: { type: DataTypes.STRING(300), allowNull: true },
    retracted: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    inDegree: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    outDegree: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    pageRank: { type: DataTypes.DOUBLE, allowNull: false },
    pageRankHigh: { type: DataTypes.DOUBLE, allowNull: false },
    rank: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    rankLow: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    rankHigh: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    citationRank: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    citationRankLow: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    citationRankHigh: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
    agePercentile: { type: DataTypes.DOUBLE, allowNull: true },
    citationsPerYear: { type: DataTypes.DOUBLE, allowNull: true },
    inLoop: { type: DataTypes.BOOLEAN, allowNull: false },
    cocitationCluster: { type: DataTypes.SMALLINT, allowNull: true },
    cocitationFirmness: { type: DataTypes.DOUBLE, allowNull: true },
    couplingCluster: { type: DataTypes.SMALLINT, allowNull: true },
    couplingFirmness: { type: DataTypes.DOUBLE, allowNull: true },
    citationCluster: { type: DataTypes.SMALLINT, allowNull: true },
    citationFirmness: { type: DataTypes.DOUBLE, allowNull: true },
  },
  { sequelize: database(), modelName: 'AnalysisWork', tableName: 'analysis_works', timestamps: false },
);
