import { type Actor } from '@/lib/access/permissions';
import { type Loaded } from '@/lib/api/route';
import { type Page } from '@/lib/api/schemas';
import { type AnalysisView } from '@/lib/api/types';
import { conflict } from '@/lib/errors';
import { Analysis } from '@/models/analysis';
import { User } from '@/models/user';

/** The analysis of an address; the grant on its portfolio decides who may see it. */
export async function loadAnalysis({ params }: { actor: Actor; params: { analysisId: number } }): Promise<Loaded<Analysis>> {
  const row = await Analysis.findByPk(params.analysisId);
  return row && { row, portfolioId: row.portfolioId };
}

/** A row that was just made has no value yet, not even null, where none was given. */
function present(row: Analysis, createdBy: string | null): AnalysisView {
  return {
    id: String(row.id),
    portfolioId: String(row.portfolioId),
    state: row.state,
    parameters: row.parameters,
    progress: { stage: row.progressStage ?? null, done: Number(row.progressDone), total: Number(row.progressTotal) },
    coverage: row.coverage ?? null,
    summary: row.summary ?? null,
    fingerprints: { input: row.inputFingerprint ?? null, result: row.resultFingerprint ?? null },
    verified: row.verified ?? null,
    engine: row.engine ?? null,
    error: row.error ?? null,
    createdBy,
    createdAt: row.createdAt.toISOString(),
    startedAt: row.startedAt?.toISOString() ?? null,
    finishedAt: row.finishedAt?.toISOString() ?? null,
  };
}

export async function presentAnalyses(rows: readonly Analysis[]): Promise<AnalysisView[]> {
  const ids = [...new Set(rows.map((row) => row.createdById).filter((id) => id !== null && id !== undefined))];
  const names = new Map((await User.findAll({ where: { id: ids }, attributes: ['id', 'name'] })).map((user) => [user.id, user.name]));
  return rows.map((row) => present(row, names.get(row.createdById ?? -1) ?? null));
}

export async function presentAnalysis(row: Analysis): Promise<AnalysisView> {
  return (await presentAnalyses([row]))[0];
}

/** Analyses of a portfolio, newest first. */
export async function listAnalyses(portfolioId: number, query: { page: number; pageSize: number; state?: Analysis['state'] }): Promise<Page<AnalysisView>> {
  const { rows, count } = await Analysis.findAndCountAll({
    where: { portfolioId, ...(query.state ? { state: query.state } : {}) },
    order: [['id', 'DESC']],
    limit: query.pageSize,
    offset: (query.page - 1) * query.pageSize,
  });
  return { items: await presentAnalyses(rows), total: count, page: query.page, pageSize: query.pageSize };
}

/** Refuses what only a finished analysis can answer, in words that say what to do. */
export function assertFinished(row: Analysis): void {
  if (row.state === 'finished') return;
  if (row.state === 'queued' || row.state === 'running') throw conflict('The analysis has not finished yet. Its results can be read once it has.');
  throw conflict(`The analysis ${row.state === 'failed' ? 'failed' : 'was cancelled'}; it has no results. Run a new one.`);
}
