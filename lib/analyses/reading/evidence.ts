import { type Actor } from '@/lib/access/permissions';
import { countLinks, countYears, readNeighbours, readPlaces, readSameAuthor, readYearGroup, type NeighbourRow } from '@/lib/analyses/reading/evidence-rows';
import { cautionsOf, methods, parametersOf } from '@/lib/analyses/reading/methods';
import { type Measure } from '@/lib/analyses/reading/queries';
import { readAnalysisWork } from '@/lib/analyses/reading/works';
import { type AnalysisWorkItem, type EvidenceView } from '@/lib/api/types';
import { notFound } from '@/lib/errors';
import { type Analysis } from '@/models/analysis';

type Counted = EvidenceView['counted'];

const number = (value: number) => value.toLocaleString('en-GB');
const decimal = (value: number, digits = 2) => value.toLocaleString('en-GB', { minimumFractionDigits: digits, maximumFractionDigits: digits });
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);

const linkNames: [string, string][] = [['doi', 'DOI'], ['pmid', 'PubMed number'], ['fields', 'fields'], ['title', 'title'], ['drawn', 'equal wording']];

/** "Linked by DOI / fields / title: 133 / 27 / 4", with the ways that occur. DOI and fields always stand there, also at 0. */
function linkRow(links: Record<string, number>): Counted[number] {
  const shown = linkNames.filter(([how]) => how === 'doi' || how === 'fields' || how === 'title' || (links[how] ?? 0) > 0);
  return { label: `Linked by ${shown.map(([, name]) => name).join(' / ')}`, value: shown.map(([how]) => number(links[how] ?? 0)).join(' / ') };
}

/** Says so where the catalogue no longer holds what the analysis counted: an analysis never changes, the catalogue does. */
function driftRow(counted: number, found: number): Counted {
  return counted === found ? [] : [{ label: 'In the catalogue today (it has changed since)', value: number(found) }];
}

interface Gathered {
  item: AnalysisWorkItem;
  neighbours: NeighbourRow[];
  links: Record<string, number>;
  sameAuthor: { same: number; undetermined: number };
}

function countCitations({ item, neighbours, links, sameAuthor }: Gathered): Counted {
  return [
    { label: 'Distinct works citing it', value: number(item.inDegree) },
    ...driftRow(item.inDegree, neighbours.length),
    { label: 'References behind them', value: number(sum(neighbours.map((row) => row.references))) },
    { label: 'Same-author citations among them', value: number(sameAuthor.same) },
    ...(sameAuthor.undetermined > 0 ? [{ label: 'Same author not determinable', value: number(sameAuthor.undetermined) }] : []),
    linkRow(links),
  ];
}

function countGiven({ item, neighbours, links }: Gathered): Counted {
  return [
    { label: 'Distinct works that it cites', value: number(item.outDegree) },
    ...driftRow(item.outDegree, neighbours.length),
    { label: 'References behind them', value: number(sum(neighbours.map((row) => row.references))) },
    linkRow(links),
  ];
}

const clip = (text: string | null) => (text === null ? 'Untitled work' : text.length > 60 ? `${text.slice(0, 57).trimEnd()}…` : text);

/** Each citing work passes on damping x its own PageRank, shared out among the works that it cites. */
function countPageRank({ item, neighbours }: Gathered, damping: number): Counted {
  const shares = neighbours.filter((row) => row.outDegree > 0).map((row) => ({ row, share: (damping * row.pageRank) / row.outDegree }));
  const carried = sum(shares.map(({ share }) => share));
  const strongest = [...shares].sort((a, b) => b.share - a.share).slice(0, 3);
  return [
    { label: 'PageRank (the mean work has 1)', value: decimal(item.pageRank) },
    { label: `Handed on by ${number(neighbours.length)} citing works`, value: decimal(carried) },
    { label: 'What every work has (fresh starts)', value: decimal(Math.max(0, item.pageRank - carried)) },
    ...driftRow(item.inDegree, neighbours.length),
    ...strongest.map(({ row, share }) => ({ label: `from “${clip(row.title)}”`, value: decimal(share) })),
    { label: 'PageRank at 0.85, for comparison', value: decimal(item.pageRankHigh) },
    ...(item.inLoop ? [{ label: 'In a loop of works citing each other', value: 'yes' }] : []),
  ];
}

async function countPercentile(analysisId: number, { item }: Gathered): Promise<Counted> {
  if (item.year === null) return [{ label: 'Publication year', value: 'unknown: no percentile' }];
  const group = await readYearGroup(analysisId, item.year, item.inDegree);
  return [
    { label: `Works of ${item.year} in the analysis`, value: number(group.works) },
    { label: 'With fewer citations here', value: number(group.fewer) },
    { label: `With as many (${number(item.inDegree)}), itself included`, value: number(group.same) },
  ];
}

function countPerYear({ item }: Gathered, lastYear: number | null): Counted {
  if (item.year === null || lastYear === null) return [{ label: 'Publication year', value: 'unknown: no figure' }];
  return [
    { label: 'Citations here', value: number(item.inDegree) },
    { label: `Years from ${item.year} to ${lastYear}, at least one`, value: number(Math.max(1, lastYear - item.year)) },
  ];
}

async function countRows(measure: Measure, analysis: Analysis, gathered: Gathered): Promise<Counted> {
  switch (measure) {
    case 'inDegree':
      return countCitations(gathered);
    case 'outDegree':
      return countGiven(gathered);
    case 'pageRank':
      return countPageRank(gathered, analysis.parameters.damping);
    case 'agePercentile':
      return countPercentile(analysis.id, gathered);
    case 'citationsPerYear':
      return countPerYear(gathered, analysis.summary?.lastYear ?? null);
  }
}

function rankOf(measure: Measure, item: AnalysisWorkItem): EvidenceView['rank'] {
  if (measure === 'pageRank') return { rank: item.rank, low: item.rankLow, high: item.rankHigh };
  if (measure === 'inDegree') return { rank: item.citationRank, low: item.citationRankLow, high: item.citationRankHigh };
  return null;
}

/**
 * What stands behind one figure of one work in a finished analysis: how it is counted, where the references were read, by which method.
 *
 * @throws ExpectedError 404 when the work takes no part in the analysis
 */
export async function readEvidence(actor: Actor, analysis: Analysis, query: { work: number; measure: Measure; page: number; pageSize: number }): Promise<EvidenceView> {
  const { work, measure } = query;
  const item = await readAnalysisWork(analysis.id, work);
  if (!item) throw notFound('This work takes no part in the analysis.');
  const subject = { analysis, workId: work, direction: measure === 'outDegree' ? ('given' as const) : ('received' as const) };
  const neighbours = await readNeighbours(subject);
  const [links, places, sameAuthor] = await Promise.all([countLinks(subject), readPlaces(actor, subject, query), readSameAuthor(work, neighbours.map((row) => row.workId))]);
  const method = methods[measure];
  return {
    work: { id: item.id, title: item.title, authors: item.authors, year: item.year, retracted: item.retracted },
    measure,
    value: item[measure],
    rank: rankOf(measure, item),
    counted: await countRows(measure, analysis, { item, neighbours, links, sameAuthor }),
    ...places,
    citingByYear: measure === 'outDegree' ? [] : countYears(neighbours),
    method: { name: method.name, definition: method.definition, source: method.source, doi: method.doi, parameters: parametersOf(measure, analysis.parameters) },
    coverage: analysis.coverage,
    cautions: cautionsOf(measure, analysis.coverage),
  };
}
