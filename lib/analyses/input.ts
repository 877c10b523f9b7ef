import { gunzipSync, gzipSync } from 'node:zlib';

import { Transaction } from 'sequelize';

import { standingMember } from '@/lib/catalogue/reading/work-items';
import { select, selectIn } from '@/lib/db/bulk';
import { database } from '@/lib/db/connection';
import { type AnalysisInput, type AnalysisWorkInput } from '@/lib/network/types';
import { readCoverage } from '@/lib/portfolios/coverage';
import { storage } from '@/lib/services/storage';
import { type AnalysisCoverage } from '@/models/analysis';

/** The network of a portfolio as an analysis takes it, with the database ids of its works beside it. */
export interface LoadedNetwork {
  input: AnalysisInput;
  /** Work id of each work of the input. */
  workIds: number[];
}

interface WorkRow {
  id: number;
  workKey: Buffer;
  year: number | null;
  catalogued: number;
  title: string | null;
  keywords: string | string[] | null;
}

const keywordsOf = (value: WorkRow['keywords']): string[] => (typeof value === 'string' ? (JSON.parse(value) as string[]) : (value ?? []));

/** Members of the portfolio, everything that they cite, and the citations, read in keyset batches, all as they stood at one moment. */
export async function loadNetwork(portfolioId: number): Promise<LoadedNetwork> {
  return database().transaction({ isolationLevel: Transaction.ISOLATION_LEVELS.REPEATABLE_READ }, (snapshot) => readNetwork(snapshot, portfolioId));
}

async function readNetwork(snapshot: Transaction, portfolioId: number): Promise<LoadedNetwork> {
  const members = await select<{ id: number }>(
    snapshot,
    `SELECT work.id FROM portfolio_works membership JOIN works work ON work.id = membership.workId AND work.catalogued = 1 WHERE ${standingMember} ORDER BY work.id`,
    { portfolioId },
  );
  const memberIds = members.map((row) => row.id);
  const citingIds: number[] = [];
  const citedIds: number[] = [];
  for (let from = 0; from < memberIds.length; from += 1_000) {
    const rows = await select<{ citingWorkId: number; citedWorkId: number }>(snapshot, 'SELECT citingWorkId, citedWorkId FROM citations WHERE citingWorkId IN (?)', [memberIds.slice(from, from + 1_000)]);
    for (const row of rows) {
      citingIds.push(row.citingWorkId);
      citedIds.push(row.citedWorkId);
    }
  }
  const memberSet = new Set(memberIds);
  const workIds = [...new Set([...memberIds, ...citedIds])].sort((a, b) => a - b);
  const indexOf = new Map(workIds.map((id, index) => [id, index]));
  const works: AnalysisWorkInput[] = new Array(workIds.length);
  const rows = await selectIn<WorkRow, number>(snapshot, 'SELECT id, workKey, year, catalogued, title, keywords FROM works WHERE id IN (?)', workIds);
  for (const row of rows) {
    works[indexOf.get(row.id) as number] = {
      key: row.workKey.toString('hex'),
      year: row.year,
      // A catalogued work of another portfolio is, for this one, a work that is only cited: its references are not part of the portfolio.
      catalogued: memberSet.has(row.id),
      title: row.title ?? '',
      keywords: keywordsOf(row.keywords),
    };
  }
  return {
    input: { works, citing: Uint32Array.from(citingIds, (id) => indexOf.get(id) as number), cited: Uint32Array.from(citedIds, (id) => indexOf.get(id) as number) },
    workIds,
  };
}

export async function measureCoverage(portfolioId: number): Promise<AnalysisCoverage> {
  const { cataloguedWorks, worksWithReferences, references, linkedReferences } = await readCoverage(portfolioId);
  const [{ worksWithoutYear }] = await select<{ worksWithoutYear: number }>(
    null,
    `SELECT COUNT(*) AS worksWithoutYear FROM portfolio_works membership JOIN works work ON work.id = membership.workId AND work.catalogued = 1 WHERE ${standingMember} AND work.year IS NULL`,
    { portfolioId },
  );
  return { cataloguedWorks, worksWithReferences, references, linkedReferences, worksWithoutYear: Number(worksWithoutYear) };
}

const inputKey = (analysisId: number) => `analyses/${analysisId}/input.json.gz`;

/** Keeps the input, so that the analysis can be run again and verified whatever has become of the portfolio since. */
export async function storeInput(analysisId: number, input: AnalysisInput): Promise<void> {
  const works = input.works.map((work) => [work.key, work.year, work.catalogued ? 1 : 0, work.title, work.keywords]);
  await storage().write(inputKey(analysisId), gzipSync(JSON.stringify({ works, citing: [...input.citing], cited: [...input.cited] }), { level: 4 }));
}

export async function readInput(analysisId: number): Promise<AnalysisInput> {
  const stored = JSON.parse(gunzipSync(await storage().read(inputKey(analysisId))).toString()) as { works: [string, number | null, number, string, string[]][]; citing: number[]; cited: number[] };
  return {
    works: stored.works.map(([key, year, catalogued, title, keywords]) => ({ key, year, catalogued: catalogued === 1, title, keywords })),
    citing: Uint32Array.from(stored.citing),
    cited: Uint32Array.from(stored.cited),
  };
}
