import { type Actor } from '@/lib/access/permissions';
import { countSameAuthor, type KnownNames } from '@/lib/analyses/reading/same-authors';
import { type EvidenceView } from '@/lib/api/types';
import { parseName } from '@/lib/bibliography/names';
import { type PersonName } from '@/lib/bibliography/record';
import { visiblePortfolios } from '@/lib/catalogue/reading/visibility';
import { select, selectIn } from '@/lib/db/bulk';
import { type Analysis } from '@/models/analysis';

/** Which way the citations of a figure run, seen from the work: those that lead to it, or those that go out from it. */
export type Direction = 'received' | 'given';

export interface NeighbourRow {
  workId: number;
  title: string | null;
  year: number | null;
  references: number;
  pageRank: number;
  outDegree: number;
}

interface Subject {
  analysis: Pick<Analysis, 'id' | 'parameters'>;
  workId: number;
  direction: Direction;
}

/** Only catalogued works published in the period cite; everything else in an analysis is only cited. */
function citingCondition({ analysis }: Subject, replacements: Record<string, unknown>): string {
  const { periodFrom, periodTo } = analysis.parameters;
  Object.assign(replacements, { periodFrom, periodTo });
  return `citing.catalogued = 1${periodFrom === null ? '' : ' AND citing.year >= :periodFrom'}${periodTo === null ? '' : ' AND citing.year <= :periodTo'}`;
}

/** The other ends of the work's citations within the analysis, as the catalogue holds them now. */
export async function readNeighbours(subject: Subject): Promise<NeighbourRow[]> {
  const { analysis, workId, direction } = subject;
  const replacements: Record<string, unknown> = { analysisId: analysis.id, workId };
  const condition = citingCondition(subject, replacements);
  const [own, other] = direction === 'received' ? ['cited', 'citing'] : ['citing', 'cited'];
  return select<NeighbourRow>(
    null,
    `SELECT ${other}.workId, ${other}.title, ${other}.year, citation.referenceCount AS \`references\`, ${other}.pageRank, ${other}.outDegree
     FROM citations citation
     JOIN analysis_works citing ON citing.analysisId = :analysisId AND citing.workId = citation.citingWorkId
     JOIN analysis_works cited ON cited.analysisId = :analysisId AND cited.workId = citation.citedWorkId
     WHERE citation.${own}WorkId = :workId AND citation.citingWorkId <> citation.citedWorkId AND ${condition}
     ORDER BY ${other}.position`,
    replacements,
  );
}

/** The references behind those citations: the table expression, its condition, and what stands in it. */
function referencesOf(subject: Subject): { sql: string; replacements: Record<string, unknown> } {
  const replacements: Record<string, unknown> = { analysisId: subject.analysis.id, workId: subject.workId };
  const condition = citingCondition(subject, replacements);
  const sql = `FROM reference_variants variant
    JOIN cited_references reference ON reference.variantHash = variant.hash
    JOIN import_records record ON record.id = reference.recordId AND record.citing = 1
    JOIN imports import ON import.id = record.importId
    JOIN analysis_works citing ON citing.analysisId = :analysisId AND citing.workId = record.workId
    ${subject.direction === 'given' ? 'JOIN analysis_works cited ON cited.analysisId = :analysisId AND cited.workId = variant.workId' : ''}
    WHERE ${subject.direction === 'received' ? 'variant.workId' : 'record.workId'} = :workId AND variant.workId <> record.workId AND ${condition}`;
  return { sql, replacements };
}

/** How many references were linked in which way. */
export async function countLinks(subject: Subject): Promise<Record<string, number>> {
  const { sql, replacements } = referencesOf(subject);
  const rows = await select<{ how: string | null; total: number }>(null, `SELECT variant.how, COUNT(*) AS total ${sql} GROUP BY variant.how`, replacements);
  return Object.fromEntries(rows.map((row) => [row.how ?? 'drawn', Number(row.total)]));
}

/** Where the references were read: one page of those in portfolios that the person may see, and how many stand elsewhere. */
export async function readPlaces(actor: Actor, subject: Subject, paging: { page: number; pageSize: number }): Promise<Pick<EvidenceView, 'places' | 'placesTotal' | 'placesHidden'>> {
  const { sql, replacements } = referencesOf(subject);
  const visible = visiblePortfolios(actor);
  const all = { ...replacements, ...visible.replacements, limit: paging.pageSize, offset: (paging.page - 1) * paging.pageSize };
  const [[counts], rows] = await Promise.all([
    select<{ total: number; seen: number }>(null, `SELECT COUNT(*) AS total, COALESCE(SUM(import.portfolioId IN (${visible.sql})), 0) AS seen ${sql}`, all),
    select<{ importId: number; portfolioId: number; fileName: string; line: number; raw: string; workId: number; title: string | null }>(
      null,
      `SELECT import.id AS importId, import.portfolioId, import.fileName, reference.line, reference.raw, citing.workId, citing.title ${sql} AND import.portfolioId IN (${visible.sql})
       ORDER BY import.id, reference.line, reference.recordId, reference.position LIMIT :limit OFFSET :offset`,
      all,
    ),
  ]);
  return {
    places: rows.map((row) => ({ importId: String(row.importId), portfolioId: String(row.portfolioId), fileName: row.fileName, line: row.line, raw: row.raw, citingWorkId: String(row.workId), citingTitle: row.title })),
    placesTotal: Number(counts.seen),
    placesHidden: Number(counts.total) - Number(counts.seen),
  };
}

interface NamesRow {
  id: number;
  authors: string | PersonName[] | null;
  authorsLabel: string | null;
}

/** Cited-only works have no list of authors; what references gave, their first author, stands in the label. */
function namesOf(row: NamesRow | undefined): KnownNames {
  const listed = typeof row?.authors === 'string' ? (JSON.parse(row.authors) as PersonName[]) : (row?.authors ?? []);
  if (listed.length > 0) return { names: listed, partly: false };
  const first = row?.authorsLabel ? parseName(row.authorsLabel.replace(/ et al\.?$/, '')) : undefined;
  return { names: first ? [first] : [], partly: true };
}

/** Same-author citations among the given ones. */
export async function readSameAuthor(workId: number, others: readonly number[]): Promise<{ same: number; undetermined: number }> {
  const rows = await selectIn<NamesRow, number>(null, 'SELECT id, authors, authorsLabel FROM works WHERE id IN (?)', [workId, ...others]);
  const byId = new Map(rows.map((row) => [row.id, row]));
  return countSameAuthor(namesOf(byId.get(workId)), others.map((id) => namesOf(byId.get(id))));
}

/** Works of one publication year: how many there are, are cited less, and are cited as often. */
export async function readYearGroup(analysisId: number, year: number, inDegree: number): Promise<{ works: number; fewer: number; same: number }> {
  const [row] = await select<{ works: number; fewer: number; same: number }>(
    null,
    'SELECT COUNT(*) AS works, COALESCE(SUM(inDegree < :inDegree), 0) AS fewer, COALESCE(SUM(inDegree = :inDegree), 0) AS same FROM analysis_works WHERE analysisId = :analysisId AND year = :year',
    { analysisId, year, inDegree },
  );
  return { works: Number(row.works), fewer: Number(row.fewer), same: Number(row.same) };
}

export function countYears(rows: readonly NeighbourRow[]): { year: number; works: number }[] {
  const years = new Map<number, number>();
  for (const { year } of rows) if (year !== null) years.set(year, (years.get(year) ?? 0) + 1);
  return [...years].sort((a, b) => a[0] - b[0]).map(([year, works]) => ({ year, works }));
}
