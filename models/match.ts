import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

import { type MatchReason } from '@/lib/linking/score';
import { database } from '@/lib/db/connection';

/** A proposal that the works of two records are the same. */
export class Match extends Model<InferAttributes<Match>, InferCreationAttributes<Match>> {
  declare id: CreationOptional<number>;
  declare kind: 'work';
  declare leftRecordId: number;
  declare rightRecordId: number;
  declare score: number;
  declare weight: number;
  declare reasons: MatchReason[];
  declare state: 'open' | 'same' | 'different' | 'later';
  declare decidedById: CreationOptional<number | null>;
  declare decidedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

Match.init(
  {
    id: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false, autoIncrement: true, primaryKey: true },
    kind: { type: DataTypes.STRING(12), allowNull: false },
    leftRecordId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
    rightRecordId: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
    score: { type: DataTypes.DOUBLE, allowNull: false },
    weight: { type: DataTypes.DOUBLE, allowNull: false },
    reasons: { type: DataTypes.JSON, allowNull: false },
    state: { type: DataTypes.STRING(12), allowNull: false },
    decidedById: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
    decidedAt: { type: DataTypes.DATE(3), allowNull: true },
    createdAt: { type: DataTypes.DATE(3), allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize: database(), modelName: 'Match', tableName: 'matches', timestamps: false },
);
