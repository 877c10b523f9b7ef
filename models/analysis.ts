import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { type AnalysisParameters } from '@/lib/network/types';
import { database } from '@/lib/db/connection';

/** The share of catalogued works that carry references, and of references that were linked. */
export interface AnalysisCoverage {
  cataloguedWorks: number;
  worksWithReferences: number;
  references: number;
  /** References linked to a catalogued work. */
  linkedReferences: number;
  worksWithoutYear: number;
}

/** What the pages show without opening the result. */
export interface AnalysisSummary {
  works: number;
  cataloguedWorks: number;
  citedOnlyWorks: number;
  citations: number;
  danglingWorks: number;
  loops: number;
  loopWorks: number;
  backwardLinks: number;
  skippedForReferences: number;
  lastYear: number | null;
  pageRankIterations: number;
  pageRankResidual: number;
  bases: { basis: 'cocitation' | 'coupling' | 'citation'; clusters: number; linkedWorks: number; pairs: number; modularity: number; agreementMean: number | null; agreementMinimum: number | null }[];
  elapsedMs: number;
}

/** One computation over a portfolio with fixed parameters; never changes once finished. */
export class Analysis extends Model<InferAttributes<Analysis>, InferCreationAttributes<Analysis>> {
  declare id: CreationOptional<number>;
  declare portfolioId: number;
  declare createdById: CreationOptional<number | null>;
  declare parameters: AnalysisParameters;
  declare state: 'queued' | 'running' | 'finished' | 'failed' | 'cancelled';
  declare progressStage: CreationOptional<string | null>;
  declare progressDone: CreationOptional<number>;
  declare progressTotal: CreationOptional<number>;
  declare inputFingerprint: CreationOptional<string | null>;
  declare resultFingerprint: CreationOptional<string | null>;
  declare verifiedAt: CreationOptional<Date | null>;
  declare verified: CreationOptional<'same' | 'different' | null>;
  declare engine: CreationOptional<string | null>;
  declare coverage: CreationOptional<AnalysisCoverage | null>;
  declare summary: CreationOptional<AnalysisSummary | null>;
  declare error: CreationOptional<string | null>;
  declare startedAt: CreationOptional<Date | null>;
  declare finishedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Analysis.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    portfolioId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
    createdById: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    parameters: { type: DataTypes.JSON, allowNull: false },
    state: { type: DataTypes.STRING(12), allowNull: false },
    progressStage: { type: DataTypes.STRING(40), allowNull: true },
    progressDone: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, defaultValue: 0 },
    progressTotal: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, defaultValue: 0 },
    inputFingerprint: { type: DataTypes.CHAR(64), allowNull: true },
    resultFingerprint: { type: DataTypes.CHAR(64), allowNull: true },
    verifiedAt: { type: DataTypes.DATE(3), allowNull: true },
    verified: { type: DataTypes.STRING(12), allowNull: true },
    engine: { type: DataTypes.STRING(40), allowNull: true },
    coverage: { type: DataTypes.JSON, allowNull: true },
    summary: { type: DataTypes.JSON, allowNull: true },
    error: { type: DataTypes.TEXT, allowNull: true },
    startedAt: { type: DataTypes.DATE(3), allowNull: true },
    finishedAt: { type: DataTypes.DATE(3), allowNull: true },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
    updatedAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'Analysis', tableName: 'analyses', timestamps: true },
);
