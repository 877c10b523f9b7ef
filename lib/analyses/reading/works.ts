import { escapeLike } from '@/lib/access/escape-like';
import { type AnalysisWorksQuery, type WorkFilters, type WorkSort } from '@/lib/analyses/reading/queries';
import { type Page } from '@/lib/api/schemas';
import { type AnalysisWorkItem, type ClusterRef } from '@/lib/api/types';
import { select, selectIn } from '@/lib/db/bulk';
import { type Basis } from '@/lib/network/types';

interface WorkRow {
  position: number;
  workId: number;
  catalogued: number;
  title: string | null;
  authorsLabel: string | null;
  year: number | null;
  venue: string | null;
  doi: string | null;
  retracted: number;
  inDegree: number;
  outDegree: number;
  pageRank: number;
  pageRankHigh: number;
  rank: number;
  rankLow: number;
  rankHigh: number;
  citationRank: number;
  citationRankLow: number;
  citationRankHigh: number;
  agePercentile: number | null;
  citationsPerYear: number | null;
  inLoop: number;
  cocitationCluster: number | null;
  cocitationFirmness: number | null;
  couplingCluster: number | null;
  couplingFirmness: number | null;
  citationCluster: number | null;
  citationFirmness: number | null;
}

const columns = `position, workId, catalogued, title, authorsLabel, year, venue, doi, retracted, inDegree, outDegree, pageRank, pageRankHigh, \`rank\`, rankLow, rankHigh, citationRank, citationRankLow, citationRankHigh,
  agePercentile, citationsPerYear, inLoop, cocitationCluster, cocitationFirmness, couplingCluster, couplingFirmness, citationCluster, citationFirmness`;

/** Letters of the clusters of an analysis, by basis and number. */
export type ClusterLetters = Record<Basis, Map<number, string>>;

export async function readLetters(analysisId: number): Promise<ClusterLetters> {
  const letters: ClusterLetters = { cocitation: new Map(), coupling: new Map(), citation: new Map() };
  const rows = await select<{ basis: Basis; number: number; letter: string }>(null, 'SELECT basis, number, letter FROM analysis_clusters WHERE analysisId = ?', [analysisId]);
  for (const row of rows) letters[row.basis].set(row.number, row.letter);
  return letters;
}

function clusterOf(letters: ClusterLetters, basis: Basis, number: number | null, firmness: number | null): ClusterRef | null {
  const letter = number === null ? undefined : letters[basis].get(number);
  return number === null || letter === undefined ? null : { letter, number, firmness };
}

function present(row: WorkRow, letters: ClusterLetters): AnalysisWorkItem {
  return {
    id: String(row.workId),
    workId: String(row.workId),
    title: row.title,
    authors: row.authorsLabel,
    year: row.year,
    venue: row.venue,
    doi: row.doi,
    catalogued: Boolean(row.catalogued),
    retracted: Boolean(row.retracted),
    inDegree: row.inDegree,
    outDegree: row.outDegree,
    pageRank: row.pageRank,
    pageRankHigh: row.pageRankHigh,
    rank: row.rank,
    rankLow: row.rankLow,
    rankHigh: row.rankHigh,
    citationRank: row.citationRank,
    citationRankLow: row.citationRankLow,
    citationRankHigh: row.citationRankHigh,
    agePercentile: row.agePercentile,
    citationsPerYear: row.citationsPerYear,
    inLoop: Boolean(row.inLoop),
    clusters: {
      cocitation: clusterOf(letters, 'cocitation', row.cocitationCluster, row.cocitationFirmness),
      coupling: clusterOf(letters, 'coupling', row.couplingCluster, row.couplingFirmness),
      citation: clusterOf(letters, 'citation', row.citationCluster, row.citationFirmness),
    },
  };
}

/**
 * What each sort orders by. PageRank is ordered through its rank, so that works tied within the tolerance of ranks stand as tied here too.
 * `reversed`: the column runs against the sort's name (rank 1 is the highest PageRank).
 */
const sortColumns: Record<WorkSort, { column: string; reversed?: true; nullable?: true }> = {
  rank: { column: '`rank`' },
  pageRank: { column: '`rank`', reversed: true },
  pageRankHigh: { column: 'pageRankHigh' },
  inDegree: { column: 'inDegree' },
  outDegree: { column: 'outDegree' },
  year: { column: 'year', nullable: true },
  title: { column: 'title', nullable: true },
  agePercentile: { column: 'agePercentile', nullable: true },
  citationsPerYear: { column: 'citationsPerYear', nullable: true },
  citationRank: { column: 'citationRank' },
};

/** Works without the value stand last both ways; ties go by year (newest first), title and id, and end in the position. */
function orderOf({ field, descending }: AnalysisWorksQuery['sort']): string {
  const { column, reversed, nullable } = sortColumns[field];
  const direction = descending !== Boolean(reversed) ? 'DESC' : 'ASC';
  return `${nullable ? `${column} IS NULL, ` : ''}${column} ${direction}, year IS NULL, year DESC, title IS NULL, title, workId, position`;
}

interface Condition {
  sql: string;
  replacements: Record<string, unknown>;
}

const clusterColumns: Record<Basis, string> = { cocitation: 'cocitationCluster', coupling: 'couplingCluster', citation: 'citationCluster' };

function conditionOf(analysisId: number, filters: WorkFilters, letters: ClusterLetters): Condition {
  const where = ['analysisId = :analysisId'];
  const replacements: Record<string, unknown> = { analysisId };
  const add = (sql: string, name: string, value: unknown) => {
    where.push(sql);
    replacements[name] = value;
  };
  // DOIs stand apart: their column is compared byte by byte, and would make the whole text so.
  (filters.q ?? '').split(/\s+/).filter(Boolean).slice(0, 12).forEach((word, index) => add(`(CONCAT_WS(' ', title, authorsLabel, venue) LIKE :word${index} OR doi LIKE LOWER(:word${index}))`, `word${index}`, `%${escapeLike(word)}%`));
  if (filters.yearFrom !== undefined) add('year >= :yearFrom', 'yearFrom', filters.yearFrom);
  if (filters.yearTo !== undefined) add('year <= :yearTo', 'yearTo', filters.yearTo);
  if (filters.catalogued !== undefined) add('catalogued = :catalogued', 'catalogued', filters.catalogued === 'true' ? 1 : 0);
  if (filters.cluster === 'none') where.push(`${clusterColumns[filters.basis]} IS NULL`);
  else if (filters.cluster !== undefined) {
    // A letter that no cluster has fits no work.
    const number = [...letters[filters.basis]].find(([, letter]) => letter === filters.cluster)?.[0] ?? -1;
    add(`${clusterColumns[filters.basis]} = :cluster`, 'cluster', number);
  }
  if (filters.off !== undefined) {
    const off = new Set(filters.off.split(','));
    const column = clusterColumns[filters.basis];
    if (off.has('-')) where.push(`${column} IS NOT NULL`);
    const numbers = [...letters[filters.basis]].flatMap(([number, letter]) => (off.has(letter) ? [number] : []));
    if (numbers.length > 0) add(`(${column} IS NULL OR ${column} NOT IN (:off))`, 'off', numbers);
  }
  return { sql: where.join(' AND '), replacements };
}

/** One page of the ranking. */
export async function listAnalysisWorks(analysisId: number, query: AnalysisWorksQuery): Promise<Page<AnalysisWorkItem>> {
  const letters = await readLetters(analysisId);
  const condition = conditionOf(analysisId, query, letters);
  const [[{ total }], places] = await Promise.all([
    select<{ total: number }>(null, `SELECT COUNT(*) AS total FROM analysis_works WHERE ${condition.sql}`, condition.replacements),
    // Only keys are sorted: wide rows would not fit into the sort buffer of a large analysis.
    select<{ position: number }>(null, `SELECT position FROM analysis_works WHERE ${condition.sql} ORDER BY ${orderOf(query.sort)} LIMIT :limit OFFSET :offset`, {
      ...condition.replacements,
      limit: query.pageSize,
      offset: (query.page - 1) * query.pageSize,
    }),
  ]);
  return { items: await readAt(analysisId, places.map((row) => row.position), letters), total: Number(total), page: query.page, pageSize: query.pageSize };
}

/** Works at the given positions, in the order given. */
async function readAt(analysisId: number, positions: readonly number[], letters: ClusterLetters): Promise<AnalysisWorkItem[]> {
  const rows = await selectIn<WorkRow, number>(null, `SELECT ${columns} FROM analysis_works WHERE position IN (?) AND analysisId = ?`, positions, [analysisId]);
  const byPosition = new Map(rows.map((row) => [row.position, row]));
  return positions.flatMap((position) => byPosition.get(position) ?? []).map((row) => present(row, letters));
}

/** Every work that fits, in order, in slices: an export of any size holds one slice and the list of positions. */
export async function* walkAnalysisWorks(analysisId: number, query: WorkFilters & Pick<AnalysisWorksQuery, 'sort'>): AsyncGenerator<AnalysisWorkItem[]> {
  const letters = await readLetters(analysisId);
  const condition = conditionOf(analysisId, query, letters);
  const places = await select<{ position: number }>(null, `SELECT position FROM analysis_works WHERE ${condition.sql} ORDER BY ${orderOf(query.sort)}`, condition.replacements);
  for (let from = 0; from < places.length; from += 2_000) yield readAt(analysisId, places.slice(from, from + 2_000).map((row) => row.position), letters);
}

/** Ids of the works that fit, or null where nothing is filtered. */
export async function workIdsOf(analysisId: number, filters: WorkFilters): Promise<Set<string> | null> {
  const { q, yearFrom, yearTo, cluster, off, catalogued } = filters;
  if (!q && [yearFrom, yearTo, cluster, off, catalogued].every((value) => value === undefined)) return null;
  const condition = conditionOf(analysisId, filters, await readLetters(analysisId));
  const rows = await select<{ workId: number }>(null, `SELECT workId FROM analysis_works WHERE ${condition.sql}`, condition.replacements);
  return new Set(rows.map((row) => String(row.workId)));
}

export async function readAnalysisWork(analysisId: number, workId: number): Promise<AnalysisWorkItem | null> {
  const [row] = await select<WorkRow>(null, `SELECT ${columns} FROM analysis_works WHERE analysisId = ? AND workId = ?`, [analysisId, workId]);
  return row ? present(row, await readLetters(analysisId)) : null;
}

/** Works among the ten of highest PageRank that lie in a loop of works citing each other; there PageRank circulates and lifts them. */
export async function topWorksInLoops(analysisId: number): Promise<AnalysisWorkItem[]> {
  const rows = await select<WorkRow>(null, `SELECT ${columns} FROM analysis_works WHERE analysisId = ? AND \`rank\` <= 10 AND inLoop = 1 ORDER BY \`rank\`, position LIMIT 10`, [analysisId]);
  if (rows.length === 0) return [];
  const letters = await readLetters(analysisId);
  return rows.map((row) => present(row, letters));
}
