import { type Actor } from '@/lib/access/permissions';
import { type Loaded } from '@/lib/api/route';
import { type ProgressView } from '@/lib/api/types';
import { Job } from '@/models/job';

export interface JobView {
  id: string;
  kind: string;
  state: Job['state'];
  progress: ProgressView;
  error: string | null;
  createdAt: string;
  startedAt: string | null;
  finishedAt: string | null;
}

/** The job of an address. Whoever sees its portfolio sees how it goes; one without a portfolio is for administrators. */
export async function loadJob({ actor, params }: { actor: Actor; params: { jobId: number } }): Promise<Loaded<Job>> {
  const row = await Job.findByPk(params.jobId);
  if (!row || (row.portfolioId === null && actor.role !== 'administrator')) return null;
  return { row, portfolioId: row.portfolioId };
}

export function presentJob(row: Job): JobView {
  return {
    id: String(row.id),
    kind: row.kind,
    state: row.state,
    progress: { stage: row.progressStage, done: Number(row.progressDone), total: Number(row.progressTotal) },
    error: row.error,
    createdAt: row.createdAt.toISOString(),
    startedAt: row.startedAt?.toISOString() ?? null,
    finishedAt: row.finishedAt?.toISOString() ?? null,
  };
}
