import { compute } from '@/lib/analyses/compute';
import { loadNetwork, measureCoverage, readInput, storeInput } from '@/lib/analyses/input';
import { storeResult } from '@/lib/analyses/store';
import { run } from '@/lib/db/bulk';
import { ExpectedError } from '@/lib/errors';
import { type JobHandler } from '@/lib/jobs/handlers';
import { type ClaimedJob, type JobPayloads } from '@/lib/jobs/queue';
import { Analysis } from '@/models/analysis';

const idOf = (job: ClaimedJob) => (job.payload as JobPayloads['analysis.run']).analysisId;

/** Computes and stores one analysis. */
export const analysisRunJob: JobHandler = {
  async progress(job, stage, done, total) {
    await run(null, 'UPDATE analyses SET progressStage = ?, progressDone = ?, progressTotal = ? WHERE id = ?', [stage.slice(0, 40), Math.round(done), Math.round(total), idOf(job)]);
  },
  async run(context) {
    const row = await Analysis.findByPk(idOf(context.job));
    if (!row || !['queued', 'running'].includes(row.state)) return;
    const startedAt = new Date();
    await row.update({ state: 'running', startedAt });
    await context.progress('loading', 0, 1000);
    const network = await loadNetwork(row.portfolioId);
    if (!network.input.works.some((work) => work.catalogued)) throw new ExpectedError(422, 'nothing-to-analyse', 'Nothing to analyse', 'The portfolio holds no catalogued works yet. Import reference exports and accept them first.');
    const coverage = await measureCoverage(row.portfolioId);
    await storeInput(row.id, network.input);
    const computed = await compute({ input: network.input, parameters: row.parameters }, context);
    await context.progress('storing', 0, 1000);
    await storeResult(row, network, computed, coverage, Date.now() - startedAt.getTime());
  },
  async ended(job, how, message) {
    await Analysis.update({ state: how, error: message, progressStage: null, finishedAt: new Date() }, { where: { id: idOf(job), state: ['queued', 'running'] } });
  },
};

/** Runs a finished analysis again on its stored input and compares the fingerprints. */
export const analysisVerifyJob: JobHandler = {
  async run(context) {
    const row = await Analysis.findByPk(idOf(context.job));
    if (!row || row.state !== 'finished') return;
    const computed = await compute({ input: await readInput(row.id), parameters: row.parameters }, context);
    const same = computed.inputFingerprint === row.inputFingerprint && computed.resultFingerprint === row.resultFingerprint;
    await row.update({ verified: same ? 'same' : 'different', verifiedAt: new Date() });
  },
};
