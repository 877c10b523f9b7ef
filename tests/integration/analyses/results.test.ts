import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { GET as getClusters } from '@/app/api/analyses/[analysisId]/clusters/route';
import { GET as getEvidence } from '@/app/api/analyses/[analysisId]/evidence/route';
import { GET as getMap } from '@/app/api/analyses/[analysisId]/map/route';
import { GET as getWorks } from '@/app/api/analyses/[analysisId]/works/route';
import { topWorksInLoops } from '@/lib/analyses/reading/works';
import { type AnalysisWorkItem } from '@/lib/api/types';
import { closeDatabase } from '@/lib/db/connection';
import { type User } from '@/models/user';
import { call } from '@/tests/integration/factories';
import { madeMap, makeAnalysis, type MadeAnalysis } from './made-analysis';

let made: MadeAnalysis;
const nameOf = (id: string) => Object.entries(made.id).find(([, value]) => value === id)?.[0];
beforeAll(async () => {
  made = await makeAnalysis();
});
afterAll(closeDatabase);

const get = (handler: Parameters<typeof call>[0], what: string, query = '', as: User | null = made.reader, headers: Record<string, string> = {}) =>
  call(handler, `/api/analyses/${made.analysis.id}/${what}${query}`, { as, headers, params: { analysisId: String(made.analysis.id) } });

async function listed(query = ''): Promise<(string | undefined)[]> {
  const { status, body } = await get(getWorks, 'works', query);
  expect(status).toBe(200);
  return (body.items as AnalysisWorkItem[]).map((item) => nameOf(item.id));
}

describe('the ranking', () => {
  it('answers 401 without a session, 422 to what it does not know, 404 to strangers', async () => {
    expect((await get(getWorks, 'works', '', null)).status).toBe(401);
    for (const query of ['?sort=raw', '?yearFrom=x', '?cluster=a', '?off=A,,B', '?basis=friendship', '?pageSize=201', '?page=0', '?catalogued=maybe']) expect((await get(getWorks, 'works', query)).status).toBe(422);
    expect((await get(getWorks, 'works', '', made.stranger)).status).toBe(404);
  });

  it('gives every figure of a work, with its cluster and the interval of its rank', async () => {
    const { body } = await get(getWorks, 'works');
    expect(body).toMatchObject({ total: 7, page: 1, pageSize: 50 });
    expect(body.items[0]).toEqual({
      id: made.id.table, workId: made.id.table, title: '=Water table, "oxidation"', authors: 'Brae', year: 2009, venue: 'Annals of Wetness', doi: '10.5555/table', catalogued: true, retracted: false, inDegree: 4, outDegree: 0,
      pageRank: 2.4, pageRankHigh: 2.4, rank: 1, rankLow: 1, rankHigh: 3, citationRank: 1, citationRankLow: 1, citationRankHigh: 1, agePercentile: 50, citationsPerYear: 4 / 11, inLoop: true,
      clusters: { cocitation: { letter: 'A', number: 0, firmness: 0.95 }, coupling: null, citation: null },
    });
  });

  it('orders ties by year, newest first, then title; undated works last', async () => {
    expect(await listed()).toEqual(['table', 'book', 'reed', 'soil', 'ditch', 'wind', 'note']);
    expect(await listed('?sort=-pageRank')).toEqual(await listed());
    expect(await listed('?sort=pageRank')).toEqual(['soil', 'ditch', 'wind', 'note', 'reed', 'book', 'table']);
  });

  it('puts works without the value last both ways', async () => {
    expect((await listed('?sort=year'))).toEqual(['book', 'table', 'reed', 'ditch', 'wind', 'soil', 'note']);
    expect((await listed('?sort=-year'))).toEqual(['soil', 'ditch', 'wind', 'reed', 'table', 'book', 'note']);
    for (const sort of ['agePercentile', '-agePercentile', 'citationsPerYear', '-citationsPerYear']) expect((await listed(`?sort=${sort}`)).at(-1)).toBe('note');
    expect((await listed('?sort=-inDegree')).slice(0, 3)).toEqual(['table', 'book', 'reed']);
    expect((await listed('?sort=-outDegree')).slice(0, 2)).toEqual(['ditch', 'wind']);
  });

  it('finds words of title, authors and venue as they are typed, wildcards included', async () => {
    expect(await listed('?q=100%25')).toEqual(['reed']);
    expect(await listed('?q=reed_beds')).toEqual(['ditch']);
    expect(await listed('?q=quist+ditch')).toEqual(['ditch']);
    expect(await listed('?q=10.5555/soil')).toEqual(['soil']);
    expect(await listed('?q=%5C')).toEqual([]);
  });

  it('filters by years, cluster and kind, and pages without loss', async () => {
    expect(await listed('?yearFrom=2009&yearTo=2012')).toEqual(['table', 'reed']);
    expect(await listed('?cluster=A')).toEqual(['table', 'book', 'reed']);
    expect(await listed('?cluster=none')).toEqual(['soil', 'note']);
    expect(await listed('?off=A')).toEqual(['soil', 'ditch', 'wind', 'note']);
    expect(await listed('?off=A,-')).toEqual(['ditch', 'wind']);
    expect(await listed('?cluster=A&basis=coupling')).toEqual([]);
    expect(await listed('?cluster=ZZ')).toEqual([]);
    expect(await listed('?catalogued=false')).toEqual(['book']);
    const pages = [await listed('?pageSize=3'), await listed('?pageSize=3&page=2'), await listed('?pageSize=3&page=3')];
    expect(pages.flat()).toEqual(await listed());
    expect(await listed('?page=9')).toEqual([]);
  });

  it('knows which works among the first ten lie in a loop', async () => {
    expect((await topWorksInLoops(made.analysis.id)).map((work) => nameOf(work.id))).toEqual(['table']);
  });
});

describe('clusters', () => {
  it('come with terms, core works by PageRank and the clusters that they cite', async () => {
    const { body } = await get(getClusters, 'clusters');
    expect(body.total).toBe(2);
    expect(body.items[0]).toMatchObject({ id: 'A', letter: 'A', name: 'Water table', size: 3, firmness: 0.8, conductance: 0.25, firstYear: 2004, terms: [{ term: 'water table', works: 3, logLikelihood: 8.1 }], citesClusters: [{ letter: 'A', citations: 1 }] });
    expect((body.items[0].coreWorks as { workId: string; rank: number }[]).map((work) => [nameOf(work.workId), work.rank])).toEqual([['table', 1], ['book', 2], ['reed', 3]]);
    expect(body.items[1]).toMatchObject({ letter: 'B', conductance: null, citesClusters: [{ letter: 'A', citations: 5 }] });
  });
});

describe('the map', () => {
  it('is given as it was stored, and not sent again to a browser that has it', async () => {
    const first = await get(getMap, 'map');
    expect(first.body).toEqual(madeMap(made.analysis.id, made.id));
    const again = await get(getMap, 'map', '', made.reader, { 'if-none-match': first.headers.get('etag') as string });
    expect(again.status).toBe(304);
    expect((await get(getMap, 'map', '', made.stranger, { 'if-none-match': first.headers.get('etag') as string })).status).toBe(404);
  });
});

describe('evidence', () => {
  const counted = (body: { counted: { label: string; value: string }[] }) => Object.fromEntries(body.counted.map(({ label, value }) => [label, value]));
  const of = (name: string, measure: string, as: User | null = made.librarian, more = '') => get(getEvidence, 'evidence', `?work=${made.id[name]}&measure=${measure}${more}`, as);

  it('counts distinct citing works, the references behind them, same-author citations and ways of linking', async () => {
    const { body } = await of('table', 'inDegree');
    expect(body).toMatchObject({ value: 4, rank: { rank: 1, low: 1, high: 1 }, work: { id: made.id.table, retracted: false }, placesTotal: 5, placesHidden: 0 });
    expect(counted(body)).toEqual({ 'Distinct works citing it': '4', 'References behind them': '5', 'Same-author citations among them': '1', 'Linked by DOI / fields / title': '5 / 0 / 0' });
    expect(body.citingByYear).toEqual([{ year: 2012, works: 1 }, { year: 2018, works: 2 }, { year: 2020, works: 1 }]);
    expect(body.method).toMatchObject({ name: 'Citations here', doi: '10.1126/science.122.3159.108' });
    expect(body.cautions[0]).toContain('67% of their references');
  });

  it('shows places only in files that the person was given, and counts the others', async () => {
    const { body } = await of('table', 'inDegree', made.reader);
    expect(body).toMatchObject({ value: 4, placesTotal: 4, placesHidden: 1 });
    expect(body.places[0]).toMatchObject({ fileName: 'reeds.txt', raw: expect.stringContaining('10.5555/table'), citingWorkId: made.id.reed });
    expect(body.places[0].line).toBeGreaterThan(1);
    expect(JSON.stringify(body)).not.toContain('secret-peat');
    const second = await of('table', 'inDegree', made.reader, '&pageSize=3&page=2');
    expect(second.body.places).toEqual([body.places[3]]);
  });

  it('says that the same author cannot be told where a work names nobody', async () => {
    const { body } = await of('book', 'inDegree');
    expect(counted(body)).toMatchObject({ 'Distinct works citing it': '3', 'Same-author citations among them': '0', 'Same author not determinable': '3', 'Linked by DOI / fields / title / equal wording': '0 / 0 / 0 / 3' });
  });

  it('takes PageRank apart into what citing works hand on and what every work has', async () => {
    const rows = counted((await of('reed', 'pageRank')).body);
    // ditch (0.575) cites three works: 0.5 x 0.575 / 3.
    expect(rows).toMatchObject({ 'PageRank (the mean work has 1)': '0.80', 'Handed on by 1 citing works': '0.10', 'What every work has (fresh starts)': '0.70', 'from “Ditch blocking in reed_beds”': '0.10' });
  });

  it('counts the year group behind a percentile and the years behind citations per year', async () => {
    expect(counted((await of('ditch', 'agePercentile')).body)).toEqual({ 'Works of 2018 in the analysis': '2', 'With fewer citations here': '0', 'With as many (0), itself included': '2' });
    expect(counted((await of('table', 'citationsPerYear')).body)).toMatchObject({ 'Years from 2009 to 2020, at least one': '11' });
    expect((await of('note', 'agePercentile')).body).toMatchObject({ value: null, counted: [{ value: 'unknown: no percentile' }] });
  });

  it('lists the references that a work gives, for what it cites here', async () => {
    const { body } = await of('ditch', 'outDegree');
    expect(body).toMatchObject({ value: 3, placesTotal: 3, citingByYear: [] });
  });

  it('answers 404 for a work outside the analysis and 422 for another measure', async () => {
    expect((await get(getEvidence, 'evidence', '?work=999999999&measure=inDegree')).status).toBe(404);
    expect((await get(getEvidence, 'evidence', `?work=${made.id.table}&measure=hIndex`)).status).toBe(422);
    expect((await of('table', 'inDegree', made.stranger)).status).toBe(404);
  });
});
