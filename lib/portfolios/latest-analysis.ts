import { type AnalysisView } from '@/lib/api/types';
import { Analysis } from '@/models/analysis';
import { User } from '@/models/user';

/** The newest analysis of the portfolio, in whatever state it is, or null. */
export async function latestAnalysis(portfolioId: number): Promise<AnalysisView | null> {
  const row = await Analysis.findOne({ where: { portfolioId }, order: [['id', 'DESC']] });
  if (!row) return null;
  const creator = row.createdById === null ? null : await User.findByPk(row.createdById, { attributes: ['name'] });
  return {
    id: String(row.id),
    portfolioId: String(row.portfolioId),
    state: row.state,
    parameters: row.parameters,
    progress: { stage: row.progressStage, done: Number(row.progressDone), total: Number(row.progressTotal) },
    coverage: row.coverage,
    summary: row.summary,
    fingerprints: { input: row.inputFingerprint, result: row.resultFingerprint },
    verified: row.verified,
    engine: row.engine,
    error: row.error,
    createdBy: creator?.name ?? null,
    createdAt: row.createdAt.toISOString(),
    startedAt: row.startedAt?.toISOString() ?? null,
    finishedAt: row.finishedAt?.toISOString() ?? null,
  };
}
