import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { POST as cancel } from '@/app/api/analyses/[analysisId]/cancel/route';
import { GET as getAnalysis } from '@/app/api/analyses/[analysisId]/route';
import { POST as verify } from '@/app/api/analyses/[analysisId]/verify/route';
import { GET as getWorks } from '@/app/api/analyses/[analysisId]/works/route';
import { GET as getJob } from '@/app/api/jobs/[jobId]/route';
import { GET as listAnalyses, POST as request } from '@/app/api/portfolios/[portfolioId]/analyses/route';
import { closeDatabase } from '@/lib/db/connection';
import { defaultParameters } from '@/lib/network/types';
import { Analysis } from '@/models/analysis';
import { type User } from '@/models/user';
import { call, createUser } from '@/tests/integration/factories';
import { auditActions, makeAnalysis, newest, type MadeAnalysis } from './made-analysis';

let made: MadeAnalysis;
beforeAll(async () => {
  made = await makeAnalysis();
});
afterAll(closeDatabase);

const inPortfolio = (as: User | null, portfolioId = made.reeds.id) => ({ as, params: { portfolioId: String(portfolioId) } });
const ask = (as: User | null, json: unknown, portfolioId = made.reeds.id) => call(request, `/api/portfolios/${portfolioId}/analyses`, { ...inPortfolio(as, portfolioId), method: 'POST', json });
const of = (as: User | null, id: number | string, method = 'GET') => ({ as, method, params: { analysisId: String(id) } });

describe('asking for an analysis', () => {
  it('is refused to strangers, to those who may not, and without a session', async () => {
    expect((await ask(null, {})).status).toBe(401);
    expect((await ask(made.stranger, {})).status).toBe(404);
    expect((await ask(made.reader, {})).status).toBe(403);
    expect((await ask(made.librarian, {})).status).toBe(403);
    expect((await ask(made.evaluator, {}, made.peat.id)).status).toBe(404);
  });

  it.each([
    ['an unknown parameter', { speed: 1 }, 'parameters'],
    ['damping of 1', { damping: 1 }, 'parameters.damping'],
    ['text for a number', { repeats: '20' }, 'parameters.repeats'],
    ['too many repeats', { repeats: 101 }, 'parameters.repeats'],
    ['half a replicate', { replicates: 0.5 }, 'parameters.replicates'],
    ['a seed beyond 32 bits', { seed: 2 ** 32 }, 'parameters.seed'],
    ['another similarity', { similarity: 'pearson' }, 'parameters.similarity'],
    ['a period that ends before it begins', { periodFrom: 2010, periodTo: 2009 }, 'parameters.periodTo'],
  ])('refuses %s and names the field', async (_, parameters, field) => {
    const before = await Analysis.count();
    const { status, body } = await ask(made.evaluator, { parameters });
    expect(status).toBe(422);
    expect(Object.keys(body.errors)).toContain(field);
    expect(await Analysis.count()).toBe(before);
  });

  it('queues one with the defaults filled in, and writes it to the audit log', async () => {
    const { status, body } = await ask(made.evaluator, { parameters: { damping: 0.85, periodFrom: 2000 } });
    expect(status).toBe(202);
    expect(body).toMatchObject({ portfolioId: String(made.reeds.id), state: 'queued', parameters: { ...defaultParameters, damping: 0.85, periodFrom: 2000 }, createdBy: made.evaluator.name, summary: null });
    expect(await newest(made.reeds.id)).toEqual(body);
    expect(await auditActions(body.id)).toEqual(['analysis.requested']);
    expect((await ask(made.evaluator, {})).body.parameters).toEqual(defaultParameters);
  });
});

describe('an analysis on its way', () => {
  it('says that its results are not there yet', async () => {
    const { body } = await ask(made.evaluator, {});
    const answer = await call(getWorks, `/api/analyses/${body.id}/works`, of(made.reader, body.id));
    expect(answer.status).toBe(409);
    expect(answer.body.detail).toMatch(/not finished/);
  });

  it('is cancelled by those who may run it, once', async () => {
    const { body } = await ask(made.evaluator, {});
    const path = `/api/analyses/${body.id}/cancel`;
    expect((await call(cancel, path, of(made.reader, body.id, 'POST'))).status).toBe(403);
    expect((await call(cancel, path, of(made.stranger, body.id, 'POST'))).status).toBe(404);
    const cancelled = await call(cancel, path, of(made.evaluator, body.id, 'POST'));
    expect(cancelled).toMatchObject({ status: 202, body: { state: 'cancelled' } });
    expect((await call(cancel, path, of(made.evaluator, body.id, 'POST'))).status).toBe(409);
    expect(await auditActions(body.id)).toEqual(['analysis.requested', 'analysis.cancelled']);
  });
});

describe('a finished analysis', () => {
  it('is listed and read with its fingerprints by everybody who holds the portfolio', async () => {
    const { body } = await call(getAnalysis, `/api/analyses/${made.analysis.id}`, of(made.reader, made.analysis.id));
    expect(body).toMatchObject({ state: 'finished', fingerprints: { input: 'a'.repeat(64), result: 'b'.repeat(64) }, coverage: { references: 9 }, summary: { works: 7 }, finishedAt: '2026-05-14T10:00:05.000Z' });
    const list = await call(listAnalyses, `/api/portfolios/${made.reeds.id}/analyses?state=finished`, inPortfolio(made.reader));
    expect(list.body).toMatchObject({ total: 1, page: 1, items: [{ id: String(made.analysis.id) }] });
    expect((await call(getAnalysis, `/api/analyses/${made.analysis.id}`, of(made.stranger, made.analysis.id))).status).toBe(404);
  });

  it('is not cancelled', async () => {
    expect((await call(cancel, `/api/analyses/${made.analysis.id}/cancel`, of(made.evaluator, made.analysis.id, 'POST'))).status).toBe(409);
    expect((await made.analysis.reload()).state).toBe('finished');
  });

  it('is verified by a job that those who see the portfolio can follow', async () => {
    expect((await call(verify, `/api/analyses/${made.analysis.id}/verify`, of(made.reader, made.analysis.id, 'POST'))).status).toBe(403);
    const { status, body } = await call(verify, `/api/analyses/${made.analysis.id}/verify`, of(made.evaluator, made.analysis.id, 'POST'));
    expect(status).toBe(202);
    const job = (as: User | null) => call(getJob, `/api/jobs/${body.jobId}`, { as, params: { jobId: body.jobId } });
    expect(await job(made.reader)).toMatchObject({ status: 200, body: { id: body.jobId, kind: 'analysis.verify', state: 'queued', error: null } });
    expect((await job(made.stranger)).status).toBe(404);
    expect((await job(await createUser('administrator'))).status).toBe(200);
    expect((await job(null)).status).toBe(401);
  });
});
