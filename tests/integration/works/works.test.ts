import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { DELETE as removeWorks, GET as getWorks, POST as addWorks } from '@/app/api/portfolios/[portfolioId]/works/route';
import { GET as getSearch } from '@/app/api/search/route';
import { GET as getCiting } from '@/app/api/works/[workId]/citing/route';
import { GET as getReferences } from '@/app/api/works/[workId]/references/route';
import { GET as getWork } from '@/app/api/works/[workId]/route';
import { type WorkListItem } from '@/lib/api/types';
import { closeDatabase } from '@/lib/db/connection';
import { type Portfolio } from '@/models/portfolio';
import { PortfolioGrant } from '@/models/portfolio-grant';
import { PortfolioWork } from '@/models/portfolio-work';
import { type User } from '@/models/user';
import { Work } from '@/models/work';
import { call } from '@/tests/integration/factories';
import { makeSmallLibrary, type SmallLibrary } from './small-library';

let library: SmallLibrary;
const idOf: Record<string, string> = {};

beforeAll(async () => {
  library = await makeSmallLibrary();
  for (const work of await Work.findAll()) idOf[work.doi?.replace('10.5555/', '') ?? work.authorsLabel ?? ''] = String(work.id);
});
afterAll(closeDatabase);

const list = async (as: User | null, portfolio: Portfolio, query = '') => call(getWorks, `/api/portfolios/${portfolio.id}/works${query}`, { as, params: { portfolioId: String(portfolio.id) } });
const titles = async (query: string, portfolio = library.reeds) => {
  const { status, body } = await list(library.librarian, portfolio, query);
  expect(status).toBe(200);
  return (body.items as WorkListItem[]).map((item) => item.title);
};
const table = 'Water table and oxidation of the peat';
const reed = 'Reed beds of the north, 100% flooded';
const ditch = 'Ditch blocking of pH in reed beds';
const note = 'An undated note';

describe('the works of a portfolio', () => {
  it('answers 401 to strangers, 422 to a sort or filter that it does not know, 404 without a grant', async () => {
    expect((await list(null, library.reeds)).status).toBe(401);
    for (const query of ['?sort=raw', '?yearFrom=x', '?type=poem', '?pageSize=201', '?catalogued=maybe']) expect((await list(library.librarian, library.reeds, query)).status).toBe(422);
    expect((await list(library.stranger, library.reeds)).status).toBe(404);
    expect((await list(library.reader, library.peat)).status).toBe(404);
  });

  it('lists members with what stands on them, newest first, undated ones last both ways', async () => {
    const { body } = await list(library.reader, library.reeds);
    expect(body).toMatchObject({ total: 4, page: 1, pageSize: 50 });
    expect(body.items[0]).toEqual({
      id: idOf.ditch, title: ditch, authors: expect.stringContaining('Quist'), year: 2018, venue: 'Annals of Wetness', type: 'article', doi: '10.5555/ditch', catalogued: true, retracted: false, references: 3, citationsHere: 0, records: 1,
    });
    expect(await titles('')).toEqual([ditch, reed, table, note]);
    expect(await titles('?sort=year')).toEqual([table, reed, ditch, note]);
  });

  it('counts each citing member once, and only members of this portfolio', async () => {
    const here = async (portfolio: Portfolio) => Object.fromEntries(((await list(library.librarian, portfolio)).body.items as WorkListItem[]).map((item) => [item.doi, item.citationsHere]));
    expect(await here(library.reeds)).toEqual({ '10.5555/ditch': 0, '10.5555/reed': 1, '10.5555/table': 2, '10.5555/note': 0 });
    expect(await here(library.peat)).toEqual({ '10.5555/soil': 0, '10.5555/table': 1 });
    expect((await titles('?sort=-citationsHere')).slice(0, 2)).toEqual([table, reed]);
  });

  it('sorts by title and references with a total order, and pages without losing or doubling a work', async () => {
    expect(await titles('?sort=title')).toEqual([note, ditch, reed, table]);
    expect(await titles('?sort=-references')).toEqual([ditch, reed, table, note]);
    const paged = [];
    for (const page of [1, 2, 3]) paged.push(...(await titles(`?sort=citationsHere&pageSize=2&page=${page}`)));
    expect(paged).toEqual(await titles('?sort=citationsHere'));
  });

  it.each([
    ['reed', [ditch, reed]],
    ['reed bed', [ditch, reed]],
    ['of the reed', [reed]],
    ['ph reed', [ditch]],
    ['ditch block', [ditch]],
    ['garcia', [reed]],
    ['Garci', [reed]],
    ['2009 water', [table]],
    ['water reed', []],
    ['10.5555/TABLE', [table]],
    ['https://doi.org/10.5555/table', [table]],
    ['10.5555/tab', []],
    ['+water -oxidation*', [table]],
    ['"reed beds"', [ditch, reed]],
    ["%' OR 7=7 --", []],
    ['(((', []],
    ['@5 <reed> ~beds', [ditch, reed]],
    ['100%', [reed]],
    ['100_', []],
  ])('finds %j', async (q, expected) => {
    expect(await titles(`?q=${encodeURIComponent(q)}`)).toEqual(expected);
  });

  it('filters by type, years and retraction', async () => {
    expect(await titles('?yearFrom=2010&yearTo=2012')).toEqual([reed]);
    expect(await titles('?type=book')).toEqual([]);
    expect(await titles('?retracted=false&type=article')).toHaveLength(4);
    await Work.update({ retracted: true }, { where: { id: Number(idOf.note) } });
    expect(await titles('?retracted=true')).toEqual([note]);
    await Work.update({ retracted: false }, { where: { id: Number(idOf.note) } });
  });

  it('shows cited-only works apart, and everything together on request', async () => {
    const { body } = await list(library.reader, library.reeds, '?catalogued=false&sort=-citationsHere');
    expect(body.items.map((item: WorkListItem) => [item.year, item.citationsHere, item.catalogued, item.references])).toEqual([[2004, 2, false, 0], [2020, 1, false, 0]]);
    expect(body.total).toBe(2);
    expect((await list(library.reader, library.reeds, '?catalogued=false&q=tolland')).body.total).toBe(1);
    expect((await list(library.reader, library.reeds, '?catalogued=all')).body.total).toBe(6);
    expect((await list(library.reader, library.reeds, '?catalogued=all&q=reed')).body.total).toBe(2);
    expect((await list(library.reader, library.reeds, '?catalogued=all&q=tolland')).body.total).toBe(1);
  });
});

describe('taking works out of a portfolio and putting them back', () => {
  const change = (handler: typeof addWorks, as: User, portfolio: Portfolio, ids: string[], method = handler === addWorks ? 'POST' : 'DELETE') =>
    call(handler, `/api/portfolios/${portfolio.id}/works`, { as, method, json: { workIds: ids }, params: { portfolioId: String(portfolio.id) } });

  it('is refused to those who may only look, and to foreign portfolios', async () => {
    expect((await change(removeWorks, library.reader, library.reeds, [idOf.note])).status).toBe(403);
    expect((await change(addWorks, library.reader, library.peat, [idOf.note])).status).toBe(404);
    expect((await change(addWorks, library.librarian, library.reeds, [])).status).toBe(422);
    expect(await titles('')).toHaveLength(4);
  });

  it('marks what an import brought as removed, drops it from counts, and brings it back as it was', async () => {
    expect((await change(removeWorks, library.librarian, library.reeds, [idOf.ditch, idOf.ditch])).body).toEqual({ changed: 1 });
    expect(await titles('')).toEqual([reed, table, note]);
    const { body } = await list(library.librarian, library.reeds, '?sort=-citationsHere');
    expect(body.items[0]).toMatchObject({ title: table, citationsHere: 1 });
    expect((await PortfolioWork.findOne({ where: { portfolioId: library.reeds.id, workId: Number(idOf.ditch) } }))?.membership).toBe('removed');
    expect((await change(addWorks, library.librarian, library.reeds, [idOf.ditch])).body).toEqual({ changed: 1 });
    expect((await PortfolioWork.findOne({ where: { portfolioId: library.reeds.id, workId: Number(idOf.ditch) } }))?.membership).toBe('import');
    expect(await titles('')).toEqual([ditch, reed, table, note]);
  });

  it('adds by hand what the person may see, forgets it on removal, and changes nothing when one work is wrong', async () => {
    expect((await change(addWorks, library.librarian, library.reeds, [idOf.soil, '999999999'])).status).toBe(422);
    expect((await change(addWorks, library.librarian, library.reeds, [idOf.soil, idOf['TOLLAND T'] ?? String((await Work.findOne({ where: { year: 2004 } }))?.id)])).status).toBe(422);
    expect(await titles('')).toHaveLength(4);
    expect((await change(addWorks, library.librarian, library.reeds, [idOf.soil])).body).toEqual({ changed: 1 });
    expect((await PortfolioWork.findOne({ where: { portfolioId: library.reeds.id, workId: Number(idOf.soil) } }))?.membership).toBe('hand');
    expect(await titles('?q=respiration')).toEqual(['Soil respiration revisited']);
    expect((await change(removeWorks, library.librarian, library.reeds, [idOf.soil])).body).toEqual({ changed: 1 });
    expect(await PortfolioWork.count({ where: { portfolioId: library.reeds.id, workId: Number(idOf.soil) } })).toBe(0);
  });

  it('does not let somebody pull in a work of a portfolio that they were not given', async () => {
    await PortfolioGrant.destroy({ where: { portfolioId: library.peat.id, userId: library.librarian.id } });
    expect((await change(addWorks, library.librarian, library.reeds, [idOf.soil])).status).toBe(422);
    await PortfolioGrant.create({ portfolioId: library.peat.id, userId: library.librarian.id, level: 'manage' });
  });
});

describe('one work', () => {
  const open = (handler: typeof getWork, as: User | null, id: string, tail = '') => call(handler, `/api/works/${id}${tail}`, { as, params: { workId: id } });

  it('exists only for those who hold a portfolio with it or with a work that cites it', async () => {
    for (const handler of [getWork, getReferences, getCiting]) {
      expect((await open(handler, null, idOf.soil)).status).toBe(401);
      expect((await open(handler, library.reader, idOf.soil)).status).toBe(404);
      expect((await open(handler, library.stranger, idOf.table)).status).toBe(404);
      expect((await open(handler, library.administrator, idOf.soil)).status).toBe(200);
      expect((await open(handler, library.reader, '0x1')).status).toBe(422);
    }
    const book = await Work.findOne({ where: { catalogued: false, year: 2004 } });
    const unseen = await Work.findOne({ where: { catalogued: false, year: 1999 } });
    expect((await open(getWork, library.reader, String(book?.id))).status).toBe(200);
    expect((await open(getWork, library.reader, String(unseen?.id))).status).toBe(404);
  });

  it('shows its records with file, line and raw text, and hides and counts those of other portfolios', async () => {
    const { body } = await open(getWork, library.reader, idOf.table);
    expect(body).toMatchObject({ title: table, year: 2009, doi: '10.5555/table', catalogued: true, hiddenRecords: 1, portfolios: [{ id: String(library.reeds.id) }], cited: 3 });
    expect(body.records).toEqual([expect.objectContaining({ fileName: 'reeds.txt', format: 'tagged', line: 3, references: 1, raw: expect.stringContaining('TI Water table') })]);
    expect(JSON.stringify(body)).not.toContain('peat.txt');
    expect((await open(getWork, library.librarian, idOf.table)).body).toMatchObject({ hiddenRecords: 0, records: { length: 2 } });
  });

  it('lists its references as they were read, with the works that they were linked to and how', async () => {
    const { body } = await open(getReferences, library.reader, idOf.ditch, '/references');
    expect(body).toMatchObject({ total: 3, page: 1 });
    expect(body.items.map((item: { raw: string; line: number }) => [item.raw.slice(0, 6), item.line > 0])).toEqual([['BRAE B', true], ['GARCIA', true], ['LATER ', true]]);
    expect(body.items[0]).toMatchObject({ fileName: 'reeds.txt', work: { id: idOf.table, catalogued: true } });
    expect(body.items[2].work).toMatchObject({ catalogued: false, year: 2020 });
    for (const item of body.items) expect(typeof item.how).toBe('string');
    expect((await open(getReferences, library.reader, idOf.ditch, '/references?page=2&pageSize=2')).body.items).toEqual([body.items[2]]);
  });

  it('lists what cites it, as far as the person may see', async () => {
    expect((await open(getCiting, library.reader, idOf.table)).body).toMatchObject({ total: 2, items: [{ id: idOf.ditch }, { id: idOf.reed }] });
    expect((await open(getCiting, library.librarian, idOf.table)).body.total).toBe(3);
  });
});

describe('the search of the header', () => {
  const find = async (as: User | null, q: string) => call(getSearch, `/api/search?q=${encodeURIComponent(q)}`, { as });

  it('finds portfolios, works and DOIs that the person may see, and nothing else', async () => {
    expect((await find(null, 'water')).status).toBe(401);
    expect((await find(library.reader, 'water')).body.works.map((work: WorkListItem) => work.id)).toEqual([idOf.table]);
    expect((await find(library.reader, 'soil')).body.works).toEqual([]);
    expect((await find(library.librarian, 'soil')).body.works).toHaveLength(1);
    expect((await find(library.reader, 'doi:10.5555/ditch')).body.works.map((work: WorkListItem) => work.id)).toEqual([idOf.ditch]);
    expect((await find(library.reader, '10.5555/soil')).body.works).toEqual([]);
    expect((await find(library.reader, library.reeds.name)).body.portfolios).toEqual([{ id: String(library.reeds.id), name: library.reeds.name }]);
    expect((await find(library.reader, library.peat.name)).body.portfolios).toEqual([]);
    expect((await find(library.stranger, 'water')).body).toEqual({ portfolios: [], works: [] });
    expect((await find(library.reader, '')).body).toEqual({ portfolios: [], works: [] });
  });
});
