import { type Actor } from '@/lib/access/permissions';
import { database } from '@/lib/db/connection';
import { conflict } from '@/lib/errors';
import { enqueue, requestCancel } from '@/lib/jobs/queue';
import { type AnalysisParameters } from '@/lib/network/types';
import { Analysis } from '@/models/analysis';

/** Queues an analysis with fixed parameters. */
export async function requestAnalysis(actor: Pick<Actor, 'userId'>, portfolioId: number, parameters: AnalysisParameters): Promise<Analysis> {
  return database().transaction(async (transaction) => {
    const row = await Analysis.create({ portfolioId, createdById: actor.userId, parameters, state: 'queued' }, { transaction });
    await enqueue('analysis.run', { analysisId: row.id }, { portfolioId, createdById: actor.userId, transaction });
    return row;
  });
}

/** Stops an analysis: a waiting one at once, a running one within seconds. A finished one never changes. */
export async function cancelAnalysis(analysis: Analysis): Promise<void> {
  await requestCancel('analysis.run', 'analysisId', analysis.id);
  const [stopped] = await Analysis.update({ state: 'cancelled', progressStage: null, finishedAt: new Date() }, { where: { id: analysis.id, state: ['queued', 'running'] } });
  if (stopped === 0) throw conflict('The analysis has ended already.');
}

/** Queues a verification: the analysis is run again on its stored input and its fingerprints are compared. Gives the job's id. */
export async function requestVerification(actor: Pick<Actor, 'userId'>, analysis: Analysis): Promise<number> {
  if (analysis.state !== 'finished') throw conflict('Only a finished analysis can be verified.');
  return enqueue('analysis.verify', { analysisId: analysis.id }, { portfolioId: analysis.portfolioId, createdById: actor.userId });
}
