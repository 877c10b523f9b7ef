import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SaxesParser } from 'saxes';

import { GET as getExport } from '@/app/api/analyses/[analysisId]/export/route';
import { closeDatabase } from '@/lib/db/connection';
import { type User } from '@/models/user';
import { call } from '@/tests/integration/factories';
import { auditActions, makeAnalysis, type MadeAnalysis } from './made-analysis';

let made: MadeAnalysis;
beforeAll(async () => {
  made = await makeAnalysis();
});
afterAll(closeDatabase);

const get = (query: string, as: User | null = made.evaluator) => call(getExport, `/api/analyses/${made.analysis.id}/export${query}`, { as, params: { analysisId: String(made.analysis.id) } });

/** Rows of a CSV file by RFC 4180. */
function parseCsv(text: string): string[][] {
  expect(text.endsWith('\r\n')).toBe(true);
  const rows: string[][] = [];
  let cells: string[] = [];
  for (const [, quoted, plain, end] of text.matchAll(/(?:"((?:[^"]|"")*)"|([^",\r\n]*))(,|\r\n)/g)) {
    cells.push(quoted === undefined ? plain : quoted.replaceAll('""', '"'));
    if (end === '\r\n') {
      rows.push(cells);
      cells = [];
    }
  }
  return rows;
}

/** Elements of a document by name; throws where it is not well-formed. */
function parseXml(text: string): Map<string, Record<string, string>[]> {
  const found = new Map<string, Record<string, string>[]>();
  const parser = new SaxesParser();
  parser.on('error', (error) => {
    throw error;
  });
  parser.on('opentag', ({ name, attributes }) => found.set(name, [...(found.get(name) ?? []), attributes as Record<string, string>]));
  parser.write(text).close();
  return found;
}

describe('exporting', () => {
  it('is for those who may, within their portfolios', async () => {
    expect((await get('?format=csv', null)).status).toBe(401);
    expect((await get('?format=pdf')).status).toBe(422);
    expect((await get('?format=csv', made.reader)).status).toBe(403);
    expect((await get('?format=csv', made.stranger)).status).toBe(404);
  });

  it('writes CSV with exactly what is filtered, in its order, quoted by the rules, without formulas', async () => {
    const { status, headers, body } = await get('?format=csv&cluster=A&sort=-inDegree');
    expect(status).toBe(200);
    expect(headers.get('content-type')).toContain('text/csv');
    expect(headers.get('content-disposition')).toBe(`attachment; filename="heddle-analysis-${made.analysis.id}-rankings.csv"`);
    const [head, ...rows] = parseCsv(body);
    const column = (name: string) => rows.map((row) => row[head.indexOf(name)]);
    expect(column('Title')).toEqual([`'=Water table, "oxidation"`, expect.any(String), 'Reed beds of the north, 100% flooded']);
    expect(column('Citations here')).toEqual(['4', '3', '1']);
    expect(column('Cluster, cited together')).toEqual(['A', 'A', 'A']);
    expect(column('Cluster, shared references')).toEqual(['', '', '']);
    expect(rows.every((row) => row.length === head.length)).toBe(true);
    expect(parseCsv((await get('?format=csv')).body)).toHaveLength(8);
  });

  it('marks retracted works in the title and leaves missing values empty', async () => {
    const [head, ...rows] = parseCsv((await get('?format=csv&q=wind')).body);
    expect(rows).toHaveLength(1);
    expect(rows[0][head.indexOf('Title')]).toBe('Retracted: Wind over reeds');
    expect(rows[0][head.indexOf('Retracted')]).toBe('yes');
    const [, note] = parseCsv((await get('?format=csv&q=undated')).body);
    expect([note[head.indexOf('Year')], note[head.indexOf('Age-fair percentile')]]).toEqual(['', '']);
  });

  it('heads JSON with parameters, fingerprints, coverage, filters and cautions', async () => {
    const { body } = await get('?format=json&yearFrom=2018&sort=-year');
    expect(body.provenance).toMatchObject({ service: 'Heddle', analysisId: String(made.analysis.id), portfolio: made.reeds.name, fingerprints: { result: 'b'.repeat(64) }, parameters: { damping: 0.5, seed: 1 }, coverage: { references: 9 }, filters: { yearFrom: 2018, sort: '-year' } });
    expect(body.provenance.cautions[0]).toContain('not quality');
    expect((body.works as { title: string }[]).map((work) => work.title)).toEqual(['Soil respiration', 'Ditch blocking in reed_beds', 'Retracted: Wind over reeds']);
  });

  it('writes GraphML that a strict parser takes, whatever titles hold', async () => {
    const { body } = await get('?format=graphml');
    const elements = parseXml(body);
    expect(elements.get('node')).toHaveLength(5);
    expect(elements.get('edge')).toHaveLength(5);
    expect(elements.get('graph')).toEqual([{ id: 'cocitation', edgedefault: 'undirected' }]);
    expect(body).toContain('Ditch &lt;b&gt;blocking&lt;/b&gt;</data>');
    expect(body).toContain('Retracted: Wind over reeds');
    const filtered = parseXml((await get('?format=graphml&cluster=A')).body);
    expect(filtered.get('node')).toHaveLength(3);
    expect(filtered.get('edge')).toHaveLength(3);
  });

  it('draws SVG with a knot for each work, legend, caution and provenance, and no markup of titles', async () => {
    const { body } = await get('?format=svg');
    const elements = parseXml(body);
    expect(elements.get('rect')?.filter((rect) => rect.rx === '1' && rect.width !== '11')).toHaveLength(5);
    expect(elements.has('b')).toBe(false);
    expect(elements.has('script')).toBe(false);
    for (const words of ['A · Water table', 'Reed &lt;beds&gt;', 'not quality', `analysis ${made.analysis.id}, 14 May 2026`, '2 works without a link are not drawn', 'Retracted: Wind over reeds']) expect(body.includes(words), words).toBe(true);
  });

  it('is written to the audit log', async () => {
    expect(await auditActions(String(made.analysis.id))).toContain('analysis.exported');
  });
});
