import { z } from 'zod';

import { type Page } from '@/lib/api/schemas';
import { type AnalysisClusterItem } from '@/lib/api/types';
import { select } from '@/lib/db/bulk';
import { type Basis, type ClusterResult } from '@/lib/network/types';
import { storage } from '@/lib/services/storage';

interface ClusterRow {
  number: number;
  letter: string;
  name: string;
  size: number;
  terms: ClusterResult['terms'] | string;
  firmness: number | null;
  conductance: number | null;
  firstYear: number | null;
  medianYear: number | null;
  lastYear: number | null;
}

interface CoreRow {
  cluster: number;
  workId: number;
  title: string | null;
  authorsLabel: string | null;
  year: number | null;
  inDegree: number;
  rank: number;
}

const clusterColumn: Record<Basis, string> = { cocitation: 'cocitationCluster', coupling: 'couplingCluster', citation: 'citationCluster' };
const coreWorks = 5;

/** The works of highest PageRank of each of the given clusters. */
async function readCores(analysisId: number, basis: Basis, numbers: number[]): Promise<Map<number, CoreRow[]>> {
  const cores = new Map<number, CoreRow[]>();
  if (numbers.length === 0) return cores;
  const column = clusterColumn[basis];
  const rows = await select<CoreRow>(
    null,
    `SELECT cluster, workId, title, authorsLabel, year, inDegree, \`rank\` FROM (
       SELECT ${column} AS cluster, workId, title, authorsLabel, year, inDegree, \`rank\`,
         ROW_NUMBER() OVER (PARTITION BY ${column} ORDER BY \`rank\`, year IS NULL, year DESC, title, position) AS place
       FROM analysis_works WHERE analysisId = :analysisId AND ${column} IN (:numbers)) placed
     WHERE place <= ${coreWorks} ORDER BY cluster, place`,
    { analysisId, numbers },
  );
  for (const row of rows) cores.set(row.cluster, [...(cores.get(row.cluster) ?? []), row]);
  return cores;
}

/** Citations between clusters: citing row to cited column, in the order of `letters`. */
const flows = z.object({ letters: z.array(z.string()), citations: z.array(z.array(z.number())) });

export async function readFlows(analysisId: number, basis: Basis): Promise<z.output<typeof flows>> {
  return flows.parse(JSON.parse((await storage().read(`analyses/${analysisId}/flows-${basis}.json`)).toString('utf8')));
}

/** Clusters of a finished analysis on one basis, largest first. */
export async function listClusters(analysisId: number, query: { basis: Basis; page: number; pageSize: number }): Promise<Page<AnalysisClusterItem>> {
  const { basis, page, pageSize } = query;
  const replacements = { analysisId, basis, limit: pageSize, offset: (page - 1) * pageSize };
  const [[{ total }], rows, flow] = await Promise.all([
    select<{ total: number }>(null, 'SELECT COUNT(*) AS total FROM analysis_clusters WHERE analysisId = :analysisId AND basis = :basis', replacements),
    select<ClusterRow>(
      null,
      `SELECT number, letter, name, size, terms, firmness, conductance, firstYear, medianYear, lastYear FROM analysis_clusters
       WHERE analysisId = :analysisId AND basis = :basis ORDER BY number LIMIT :limit OFFSET :offset`,
      replacements,
    ),
    readFlows(analysisId, basis),
  ]);
  const cores = await readCores(analysisId, basis, rows.map((row) => row.number));
  const items = rows.map((row) => ({
    id: row.letter,
    basis,
    number: row.number,
    letter: row.letter,
    name: row.name,
    size: row.size,
    firmness: row.firmness,
    conductance: row.conductance,
    firstYear: row.firstYear,
    medianYear: row.medianYear,
    lastYear: row.lastYear,
    terms: typeof row.terms === 'string' ? (JSON.parse(row.terms) as ClusterResult['terms']) : row.terms,
    coreWorks: (cores.get(row.number) ?? []).map((core) => ({ workId: String(core.workId), title: core.title, authors: core.authorsLabel, year: core.year, inDegree: core.inDegree, rank: core.rank })),
    citesClusters: (flow.citations[row.number] ?? []).flatMap((citations, cited) => (citations > 0 ? [{ letter: flow.letters[cited], citations }] : [])),
  }));
  return { items, total: Number(total), page, pageSize };
}

/** Letters, names and sizes of the clusters on one basis, for choosing one; at most 200. */
export async function chooseCluster(analysisId: number, basis: Basis): Promise<{ letter: string; number: number; name: string; size: number }[]> {
  return select(null, 'SELECT letter, number, name, size FROM analysis_clusters WHERE analysisId = ? AND basis = ? ORDER BY number LIMIT 200', [analysisId, basis]);
}
