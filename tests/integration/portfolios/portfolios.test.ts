import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { GET as getGrants, PUT as putGrants } from '@/app/api/portfolios/[portfolioId]/grants/route';
import { POST as restore } from '@/app/api/portfolios/[portfolioId]/restore/route';
import { DELETE as deletePortfolio, GET as getPortfolio, PATCH as patchPortfolio } from '@/app/api/portfolios/[portfolioId]/route';
import { GET as getPortfolios, POST as postPortfolio } from '@/app/api/portfolios/route';
import { measureCoverage } from '@/lib/analyses/input';
import { closeDatabase } from '@/lib/db/connection';
import { AuditEvent } from '@/models/audit-event';
import { PortfolioGrant } from '@/models/portfolio-grant';
import { type User } from '@/models/user';
import { call, createPortfolio, createUnit, createUser, grant, unique } from '@/tests/integration/factories';
import { makeSmallLibrary, type SmallLibrary } from '../works/small-library';

let library: SmallLibrary;
beforeAll(async () => {
  library = await makeSmallLibrary();
});
afterAll(closeDatabase);

const make = (as: User | null, json: unknown) => call(postPortfolio, '/api/portfolios', { method: 'POST', as, json });
const on = (handler: typeof getPortfolio, as: User | null, id: string | number, method = 'GET', json?: unknown) => call(handler, `/api/portfolios/${id}`, { as, method, json, params: { portfolioId: String(id) } });

describe('making a portfolio', () => {
  it('is for curators, and needs a name, a period in order and people who exist', async () => {
    expect((await make(null, { name: 'x' })).status).toBe(401);
    for (const role of ['evaluator', 'author', 'reader'] as const) expect((await make(await createUser(role), { name: 'x' })).status).toBe(403);
    const as = library.librarian;
    for (const json of [{}, { name: '  ' }, { name: 'x'.repeat(201) }, { name: 'x', periodFrom: 2020, periodTo: 2010 }, { name: 'x', unitId: '999999' }, { name: 'x', colour: 'red' }, { name: 'x', grants: [{ email: 'nobody@test.example', level: 'view' }] }, { name: 'x', grants: [{ level: 'view' }] }]) {
      expect((await make(as, json)).status).toBe(422);
    }
  });

  it('gives it to whoever makes it and to the people named, by id or e-mail', async () => {
    const unit = await createUnit();
    const [evaluator, reader] = [await createUser('evaluator'), await createUser('reader')];
    const name = unique('Reed beds');
    const made = await make(library.librarian, {
      name: `  ${name} `, description: 'All on reeds', unitId: String(unit.id), periodFrom: 2016, periodTo: 2025, grants: [{ userId: String(evaluator.id), level: 'contribute' }, { email: reader.email.toUpperCase(), level: 'view' }],
    });
    expect(made.status).toBe(201);
    expect(made.body).toEqual({
      id: expect.stringMatching(/^\d+$/), name, description: 'All on reeds', unit: { id: String(unit.id), name: unit.name }, periodFrom: 2016, periodTo: 2025, demonstration: false, level: 'manage', works: 0, updatedAt: expect.any(String),
    });
    expect((await on(getPortfolio, reader, made.body.id)).body).toMatchObject({ level: 'view', grants: null });
    expect((await on(getPortfolio, library.librarian, made.body.id)).body.grants.map((row: { userId: string; level: string }) => [row.userId, row.level]).sort()).toEqual(
      [[String(evaluator.id), 'contribute'], [String(reader.id), 'view'], [String(library.librarian.id), 'manage']].sort(),
    );
    expect(await AuditEvent.count({ where: { action: 'portfolio.created', subjectId: made.body.id } })).toBe(1);
  });
});

describe('the list of portfolios', () => {
  it('holds what the person was given, and everything for administrators', async () => {
    expect((await call(getPortfolios, '/api/portfolios')).status).toBe(401);
    const { body } = await call(getPortfolios, '/api/portfolios', { as: library.reader });
    expect(body).toMatchObject({ total: 1, page: 1, items: [{ id: String(library.reeds.id), level: 'view', works: 4 }] });
    const all = await call(getPortfolios, `/api/portfolios?q=${library.peat.name}`, { as: library.administrator });
    expect(all.body).toMatchObject({ total: 1, items: [{ id: String(library.peat.id), level: 'manage', works: 2 }] });
    expect((await call(getPortfolios, '/api/portfolios', { as: library.stranger })).body).toMatchObject({ items: [], total: 0 });
  });

  it('is paged in a stable order', async () => {
    const as = await createUser('reader');
    for (let index = 0; index < 5; index += 1) await grant(await createPortfolio({ name: 'Same name' }), as, 'view');
    const ids = [];
    for (const page of [1, 2, 3]) ids.push(...(await call(getPortfolios, `/api/portfolios?page=${page}&pageSize=2`, { as })).body.items.map((item: { id: string }) => Number(item.id)));
    expect(ids).toEqual([...ids].sort((a, b) => a - b));
    expect(new Set(ids).size).toBe(5);
  });
});

describe('the overview of a portfolio', () => {
  it('counts works, references and links as analyses count them', async () => {
    const { body } = await on(getPortfolio, library.reader, library.reeds.id);
    expect(body).toMatchObject({
      works: 4, coverage: { cataloguedWorks: 4, worksWithReferences: 3, references: 6, linkedReferences: 3, citedOnlyWorks: 2 },
      years: [{ year: 2009, works: 1 }, { year: 2012, works: 1 }, { year: 2018, works: 1 }], imports: { accepted: 1, open: 0, failed: 0 }, openMatches: 0, latestAnalysis: null, grants: null,
    });
    const { worksWithoutYear, ...counted } = await measureCoverage(library.reeds.id);
    expect(worksWithoutYear).toBe(1);
    expect(body.coverage).toMatchObject(counted);
  });

  it('exists only for those who were given it', async () => {
    expect((await on(getPortfolio, null, library.peat.id)).status).toBe(401);
    for (const as of [library.reader, library.stranger]) {
      const { status, body } = await on(getPortfolio, as, library.peat.id);
      expect(status).toBe(404);
      expect(JSON.stringify(body)).not.toContain(library.peat.name);
    }
    expect((await on(getPortfolio, library.administrator, library.peat.id)).body.level).toBe('manage');
  });
});

describe('changing a portfolio', () => {
  it('changes what is named and leaves the rest', async () => {
    const portfolio = await createPortfolio({ description: 'Kept', periodFrom: 2000, periodTo: 2010 });
    await grant(portfolio, library.librarian, 'manage');
    const contributor = await createUser('librarian');
    await grant(portfolio, contributor, 'contribute');
    expect((await on(patchPortfolio, contributor, portfolio.id, 'PATCH', { name: 'Taken' })).status).toBe(403);
    expect((await on(patchPortfolio, library.stranger, portfolio.id, 'PATCH', { name: 'Taken' })).status).toBe(404);
    expect((await on(patchPortfolio, library.librarian, portfolio.id, 'PATCH', { periodFrom: 2011 })).status).toBe(422);
    expect((await on(patchPortfolio, library.librarian, portfolio.id, 'PATCH', { name: 'Renamed', periodTo: null })).body).toMatchObject({ name: 'Renamed', description: 'Kept', periodFrom: 2000, periodTo: null });
  });

  it('deletes it for everybody, and brings it back for those who could delete it', async () => {
    const portfolio = await createPortfolio();
    await grant(portfolio, library.librarian, 'manage');
    await grant(portfolio, library.reader, 'view');
    expect((await on(restore, library.librarian, portfolio.id, 'POST')).status).toBe(409);
    expect((await on(restore, library.reader, portfolio.id, 'POST')).status).toBe(403);
    expect((await on(deletePortfolio, library.reader, portfolio.id, 'DELETE')).status).toBe(403);
    expect((await on(deletePortfolio, library.librarian, portfolio.id, 'DELETE')).status).toBe(204);
    for (const as of [library.reader, library.librarian, library.administrator]) expect((await on(getPortfolio, as, portfolio.id)).status).toBe(404);
    for (const as of [library.reader, library.stranger]) expect((await on(restore, as, portfolio.id, 'POST')).status).toBe(404);
    expect((await on(restore, library.librarian, portfolio.id, 'POST')).body).toMatchObject({ id: String(portfolio.id), level: 'manage' });
    expect((await on(getPortfolio, library.reader, portfolio.id)).status).toBe(200);
  });
});

describe('giving a portfolio to people', () => {
  it('replaces the whole list, keeps one librarian who manages, and changes nothing on an error', async () => {
    const portfolio = await createPortfolio();
    const [other, evaluator] = [await createUser('librarian'), await createUser('evaluator')];
    await grant(portfolio, library.librarian, 'manage');
    await grant(portfolio, library.reader, 'view');
    const put = (as: User, grants: unknown) => on(putGrants, as, portfolio.id, 'PUT', { grants });
    expect((await on(getGrants, library.reader, portfolio.id)).status).toBe(403);
    expect((await put(library.reader, [])).status).toBe(403);
    expect((await put(library.stranger, [])).status).toBe(404);
    const held = async () => (await PortfolioGrant.findAll({ where: { portfolioId: portfolio.id }, order: [['userId', 'ASC']] })).map((row) => [row.userId, row.level]);
    const before = await held();
    for (const grants of [[], [{ userId: String(evaluator.id), level: 'manage' }], [{ userId: String(library.librarian.id), level: 'own' }], [{ userId: String(library.librarian.id), level: 'manage' }, { email: 'nobody@test.example', level: 'view' }]]) {
      expect((await put(library.librarian, grants)).status).toBe(422);
    }
    expect(await held()).toEqual(before);
    const { body } = await put(library.librarian, [{ userId: String(library.librarian.id), level: 'contribute' }, { email: other.email, level: 'manage' }, { userId: String(evaluator.id), level: 'view' }]);
    expect(body.items).toHaveLength(3);
    expect((await on(getPortfolio, library.reader, portfolio.id)).status).toBe(404);
    expect((await on(getPortfolio, evaluator, portfolio.id)).body.level).toBe('view');
    expect((await put(library.administrator, [])).status).toBe(200);
  });
});
