import { type Provenance } from '@/lib/analyses/reading/provenance';
import { type AnalysisWorkItem } from '@/lib/api/types';

/** Marks a retracted work wherever its title leaves the service. */
export const exportedTitle = (title: string | null, retracted: boolean): string | null => (retracted ? `Retracted: ${title ?? 'untitled work'}` : title);

type Value = string | number | null;
interface Column {
  name: string;
  value: (work: AnalysisWorkItem) => Value;
}

const yesNo = (value: boolean) => (value ? 'yes' : 'no');

/** Columns of the table as they are called on screen. */
const columns: Column[] = [
  { name: 'Rank', value: (work) => work.rank },
  { name: 'Rank interval, low', value: (work) => work.rankLow },
  { name: 'Rank interval, high', value: (work) => work.rankHigh },
  { name: 'Title', value: (work) => exportedTitle(work.title, work.retracted) },
  { name: 'Authors', value: (work) => work.authors },
  { name: 'Year', value: (work) => work.year },
  { name: 'Venue', value: (work) => work.venue },
  { name: 'DOI', value: (work) => work.doi },
  { name: 'Catalogued', value: (work) => yesNo(work.catalogued) },
  { name: 'Retracted', value: (work) => yesNo(work.retracted) },
  { name: 'Citations here', value: (work) => work.inDegree },
  { name: 'Rank by citations', value: (work) => work.citationRank },
  { name: 'Rank by citations, low', value: (work) => work.citationRankLow },
  { name: 'Rank by citations, high', value: (work) => work.citationRankHigh },
  { name: 'PageRank (mean 1)', value: (work) => work.pageRank },
  { name: 'PageRank at 0.85', value: (work) => work.pageRankHigh },
  { name: 'Age-fair percentile', value: (work) => work.agePercentile },
  { name: 'Citations per year', value: (work) => work.citationsPerYear },
  { name: 'Works cited here', value: (work) => work.outDegree },
  { name: 'In a loop', value: (work) => yesNo(work.inLoop) },
  { name: 'Cluster, cited together', value: (work) => work.clusters.cocitation?.letter ?? null },
  { name: 'Firmness, cited together', value: (work) => work.clusters.cocitation?.firmness ?? null },
  { name: 'Cluster, shared references', value: (work) => work.clusters.coupling?.letter ?? null },
  { name: 'Firmness, shared references', value: (work) => work.clusters.coupling?.firmness ?? null },
  { name: 'Cluster, citing each other', value: (work) => work.clusters.citation?.letter ?? null },
  { name: 'Firmness, citing each other', value: (work) => work.clusters.citation?.firmness ?? null },
  { name: 'Work', value: (work) => work.workId },
];

/**
 * A cell by RFC 4180. Text that a spreadsheet would take for a formula (it begins with = + - @, a tab or a line break) gets an apostrophe
 * in front; numbers are never touched.
 */
export function csvCell(value: Value): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  const safe = /^[=+\-@\t\r\n]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

const csvLine = (cells: readonly Value[]) => `${cells.map(csvCell).join(',')}\r\n`;

export async function* csvTable(works: AsyncIterable<AnalysisWorkItem[]>): AsyncGenerator<string> {
  yield csvLine(columns.map((column) => column.name));
  for await (const slice of works) yield slice.map((work) => csvLine(columns.map((column) => column.value(work)))).join('');
}

export async function* jsonTable(provenance: Provenance, works: AsyncIterable<AnalysisWorkItem[]>): AsyncGenerator<string> {
  yield `{"provenance":${JSON.stringify(provenance)},"works":[`;
  let separator = '\n';
  for await (const slice of works) {
    for (const work of slice) {
      yield `${separator}${JSON.stringify({ ...work, title: exportedTitle(work.title, work.retracted) })}`;
      separator = ',\n';
    }
  }
  yield '\n]}\n';
}
