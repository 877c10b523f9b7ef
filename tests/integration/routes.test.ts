import { readdirSync } from 'node:fs';
import path from 'node:path';

import { type NextRequest } from 'next/server';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { permissions, type Role } from '@/lib/access/permissions';
import { closeDatabase } from '@/lib/db/connection';
import { methods } from '@/lib/api/openapi';
import { defaultParameters } from '@/lib/network/types';
import { Analysis } from '@/models/analysis';
import { Import } from '@/models/import';
import { Job } from '@/models/job';
import { Match } from '@/models/match';
import { ImportRecord } from '@/models/import-record';
import { type User } from '@/models/user';
import { accept, upload } from '@/tests/integration/pipeline';
import { createPortfolio, createUser, grant, makeRequest, unique } from '@/tests/integration/factories';

/** Every route file below app/api, by its address in square brackets. */
const addresses = (readdirSync('app/api', { recursive: true }) as string[]).filter((file) => path.basename(file) === 'route.ts').map((file) => path.posix.dirname(file.split(path.sep).join('/'))).sort();

type Handler = ((request: NextRequest, context: { params: Promise<Record<string, string>> }) => Promise<Response>) & { heddleRoute?: string };
type Module = Partial<Record<(typeof methods)[number], Handler>> & { publicRoute?: string };

const load = async (address: string): Promise<Module> => (await import(path.resolve('app/api', address, 'route.ts'))) as Module;

/** Valid bodies of the routes that take one, so that a refusal comes from access and not from the body. */
const bodies: Record<string, Record<string, unknown>> = {
  'matches/[matchId]': { POST: { decision: 'same' } },
  'imports/[importId]/read': { POST: {} },
  'portfolios/[portfolioId]': { PATCH: { name: 'taken over' } },
  'portfolios/[portfolioId]/grants': { PUT: { grants: [] }, POST: {} },
  'portfolios/[portfolioId]/works': { POST: { workIds: ['1'] }, DELETE: { workIds: ['1'] } },
  'portfolios/[portfolioId]/analyses': { POST: { parameters: {} } },
};

/** Query without which a route cannot be asked at all. */
const queries: Record<string, string> = { 'analyses/[analysisId]/evidence': '?work=1&measure=inDegree', 'analyses/[analysisId]/export': '?format=csv' };

describe('every route', () => {
  it('is found', () => {
    expect(addresses).toContain('portfolios/[portfolioId]/imports');
    expect(addresses.length).toBeGreaterThan(15);
  });

  it.each(addresses)('/api/%s comes from the one wrapper, or says why it is public', async (address) => {
    const routeModule = await load(address);
    if (routeModule.publicRoute) {
      expect(['health', 'auth/[...nextauth]', 'openapi.json']).toContain(address);
      return;
    }
    const handlers = methods.flatMap((method) => routeModule[method] ?? []);
    expect(handlers.length).toBeGreaterThan(0);
    for (const handler of handlers) expect(Object.keys(permissions)).toContain(handler.heddleRoute);
  });
});

const secret = unique('secret-portfolio');
const ids: Record<string, string> = {};
const strangers = new Map<Role, User>();

const exported = (name: string) => `FN Export\nVR 1.0\nPT J\nAU Quist, A\nTI ${secret} reed beds in the north ${name}\nSO Journal of Reed\nPY 2004\nVL 3\nBP 10\nCR BRAE B, 2001, J REED, V1, P2\nER\n\nEF\n`;

beforeAll(async () => {
  const owner = await createUser('librarian');
  const portfolio = await createPortfolio({ name: secret, createdById: owner.id });
  await grant(portfolio, owner, 'manage');
  const actor = { userId: owner.id, name: owner.name, email: owner.email, role: 'librarian' as const, via: 'session' as const };
  const imported = await accept(actor, await upload(actor, portfolio.id, `${secret}.txt`, exported('one')));
  const other = await accept(actor, await upload(actor, portfolio.id, `${secret}-2.txt`, exported('two')));
  const [left] = await ImportRecord.findAll({ where: { importId: imported.id } });
  const [right] = await ImportRecord.findAll({ where: { importId: other.id } });
  const [match] = await Match.findOrCreate({ where: { leftRecordId: right.id, rightRecordId: left.id }, defaults: { kind: 'work', leftRecordId: right.id, rightRecordId: left.id, score: 0.9, weight: 5, reasons: [], state: 'open' } });
  const analysis = await Analysis.create({ portfolioId: portfolio.id, createdById: owner.id, parameters: defaultParameters, state: 'queued' });
  const job = await Job.create({ kind: 'analysis.run', payload: { analysisId: analysis.id }, portfolioId: portfolio.id, createdById: owner.id, state: 'done' });
  Object.assign(ids, { portfolioId: portfolio.id, importId: imported.id, matchId: match.id, analysisId: analysis.id, jobId: job.id, workId: left.workId });
  for (const key of Object.keys(ids)) ids[key] = String(ids[key]);
  expect(await Import.count({ where: { portfolioId: portfolio.id, state: 'accepted' } })).toBe(2);
  for (const role of ['librarian', 'evaluator', 'author', 'reader'] as const) strangers.set(role, await createUser(role));
});
afterAll(closeDatabase);

/** Calls every method of a route as this person. */
async function call(address: string, as: User | null): Promise<{ method: string; status: number; text: string }[]> {
  const routeModule = await load(address);
  const params: Record<string, string> = {};
  for (const [, name] of address.matchAll(/\[(\w+)\]/g)) params[name] = ids[name] ?? '999999999';
  const answers = [];
  for (const method of methods) {
    const handler = routeModule[method];
    if (!handler || routeModule.publicRoute) continue;
    const body = bodies[address]?.[method];
    const request = await makeRequest(`/api/${address.replace(/\[(\w+)\]/g, (_, name: string) => params[name])}${queries[address] ?? ''}`, { method, as, ...(method === 'GET' || body === undefined ? {} : { json: body }) });
    const response = await handler(request, { params: Promise.resolve(params) });
    answers.push({ method, status: response.status, text: await response.text() });
  }
  return answers;
}

describe('a stranger with a valid session', () => {
  const owned = addresses.filter((address) => /\[(portfolioId|importId|matchId|analysisId|jobId|workId)\]/.test(address));

  it.each(owned)('gets 404 on /api/%s, whatever the role, and learns nothing', async (address) => {
    for (const [role, stranger] of strangers) {
      for (const answer of await call(address, stranger)) {
        expect({ role, method: answer.method, status: answer.status }).toEqual({ role, method: answer.method, status: 404 });
        expect(answer.text).not.toContain(secret);
      }
    }
  });

  it.each(addresses.filter((address) => !owned.includes(address)))('finds nothing of it on /api/%s', async (address) => {
    for (const stranger of strangers.values()) for (const answer of await call(address, stranger)) expect(answer.text).not.toContain(secret);
  });
});

describe('somebody who is not signed in', () => {
  it.each(addresses)('gets 401 on /api/%s', async (address) => {
    for (const answer of await call(address, null)) expect({ method: answer.method, status: answer.status }).toEqual({ method: answer.method, status: 401 });
  });
});
