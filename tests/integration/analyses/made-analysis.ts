import { listAnalyses } from '@/lib/analyses/reading/analyses';
import { type AnalysisMap } from '@/lib/api/types';
import { select } from '@/lib/db/bulk';
import { defaultParameters } from '@/lib/network/types';
import { addWorks } from '@/lib/portfolios/membership';
import { storage } from '@/lib/services/storage';
import { Analysis } from '@/models/analysis';
import { AnalysisCluster } from '@/models/analysis-cluster';
import { AnalysisWork } from '@/models/analysis-work';
import { type Portfolio } from '@/models/portfolio';
import { type User } from '@/models/user';
import { Work } from '@/models/work';
import { createPortfolio, createUser, grant } from '@/tests/integration/factories';
import { accept, emptyCatalogue, upload } from '@/tests/integration/pipeline';
import { actorOf, taggedFile } from '@/tests/integration/works/small-library';

export interface MadeAnalysis {
  librarian: User;
  evaluator: User;
  reader: User;
  stranger: User;
  reeds: Portfolio;
  peat: Portfolio;
  analysis: Analysis;
  /** Work ids by the end of their DOI; "book" is the cited-only work. */
  id: Record<string, string>;
}

const table = 'BRAE B, 2009, J REED STUD, V4, P11, DOI 10.5555/table';
const reed = 'GARCIA A, 2012, J REED STUD, DOI 10.5555/reed';
const book = 'TOLLAND T, 2004, STREAM INDEX BOOK';

/**
 * Seven works. Who cites: reed -> table, book; ditch -> table, reed, book; wind -> table (twice, in other words), book; soil -> table.
 * "wind" is by Brae, who also wrote "table". "soil" stands in a file of the portfolio `peat`, which the reader was not given, and is a
 * member of `reeds` by hand. "note" has no year and cites nothing.
 */
async function makeCatalogue(librarian: User, reeds: Portfolio, peat: Portfolio): Promise<Record<string, string>> {
  const actor = actorOf(librarian);
  await accept(
    actor,
    await upload(actor, reeds.id, 'reeds.txt', taggedFile([
      { title: '=Water table, "oxidation"', author: 'Brae, Bo', year: 2009, doi: '10.5555/table' },
      { title: 'Reed beds of the north, 100% flooded', author: 'García, Ana', year: 2012, doi: '10.5555/reed', cites: [table, book] },
      { title: 'Ditch blocking in reed_beds', author: 'Quist, Cy', year: 2018, doi: '10.5555/ditch', cites: [table, reed, book] },
      { title: 'Wind over reeds', author: 'Brae, Bo', year: 2018, doi: '10.5555/wind', cites: [table, 'BRAE BO, 2009, J REED STUDIES, V4, P11, DOI 10.5555/TABLE', book] },
      { title: 'An undated note', author: 'Quist, Cy', doi: '10.5555/note' },
    ])),
  );
  await accept(actor, await upload(actor, peat.id, 'secret-peat.txt', taggedFile([{ title: 'Soil respiration', author: 'Haldane, Hy', year: 2020, doi: '10.5555/soil', cites: [table] }])));
  const id: Record<string, string> = {};
  for (const work of await Work.findAll()) id[work.doi?.replace('10.5555/', '') ?? 'book'] = String(work.id);
  await addWorks(actor, reeds.id, [Number(id.soil)]);
  return id;
}

interface Figures {
  inDegree: number;
  outDegree: number;
  pageRank: number;
  rank: number;
  agePercentile: number | null;
  cluster: number | null;
  firmness: number | null;
  inLoop?: boolean;
}

/** Figures made by hand; PageRank need not be right here, its computation is tested elsewhere. */
const figures: Record<string, Figures> = {
  table: { inDegree: 4, outDegree: 0, pageRank: 2.4, rank: 1, agePercentile: 50, cluster: 0, firmness: 0.95, inLoop: true },
  book: { inDegree: 3, outDegree: 0, pageRank: 1.5, rank: 2, agePercentile: 50, cluster: 0, firmness: 0.9 },
  reed: { inDegree: 1, outDegree: 2, pageRank: 0.8, rank: 3, agePercentile: 50, cluster: 0, firmness: 0.55 },
  ditch: { inDegree: 0, outDegree: 3, pageRank: 0.575, rank: 4, agePercentile: 50, cluster: 1, firmness: 1 },
  wind: { inDegree: 0, outDegree: 2, pageRank: 0.575, rank: 4, agePercentile: 50, cluster: 1, firmness: 1 },
  soil: { inDegree: 0, outDegree: 1, pageRank: 0.575, rank: 4, agePercentile: 50, cluster: null, firmness: null },
  note: { inDegree: 0, outDegree: 0, pageRank: 0.575, rank: 4, agePercentile: null, cluster: null, firmness: null },
};

async function storeRows(analysisId: number, id: Record<string, string>): Promise<void> {
  const works = new Map((await Work.findAll()).map((work) => [String(work.id), work]));
  await AnalysisWork.bulkCreate(
    Object.keys(figures).map((name, position) => {
      const work = works.get(id[name]) as Work;
      const { inDegree, outDegree, pageRank, rank, agePercentile, cluster, firmness, inLoop = false } = figures[name];
      return {
        analysisId, position, workId: work.id, catalogued: name !== 'book', title: work.title, authorsLabel: work.authorsLabel, year: work.year, venue: work.venue, doi: work.doi, retracted: name === 'wind',
        inDegree, outDegree, pageRank, pageRankHigh: pageRank, rank, rankLow: Math.max(1, rank - 1), rankHigh: rank + 2, citationRank: rank, citationRankLow: rank, citationRankHigh: rank,
        agePercentile, citationsPerYear: work.year === null ? null : inDegree / Math.max(1, 2020 - work.year), inLoop, cocitationCluster: cluster, cocitationFirmness: firmness,
      };
    }),
  );
  const years = { firstYear: 2004, medianYear: 2009, lastYear: 2012 };
  await AnalysisCluster.bulkCreate([
    { analysisId, basis: 'cocitation', number: 0, letter: 'A', name: 'Water table', size: 3, terms: [{ term: 'water table', works: 3, logLikelihood: 8.1 }], firmness: 0.8, conductance: 0.25, ...years },
    { analysisId, basis: 'cocitation', number: 1, letter: 'B', name: 'Reed <beds>', size: 2, terms: [], firmness: 1, conductance: null, ...years },
  ]);
}

/** The map of the made analysis: five works in two clusters. */
export function madeMap(analysisId: number, id: Record<string, string>): AnalysisMap {
  const drawn = ['table', 'book', 'reed', 'ditch', 'wind'];
  const of = <Value>(value: (figures: Figures) => Value) => drawn.map((name) => value(figures[name]));
  return {
    analysisId: String(analysisId), basis: 'cocitation', ids: drawn.map((name) => id[name]), titles: ['=Water table, "oxidation"', null, 'Reed beds of the north, 100% flooded', 'Ditch <b>blocking</b>\u0007', 'Wind over reeds'],
    authors: ['Brae', 'Tolland', 'García', 'Quist', 'Brae'], years: [2009, 2004, 2012, 2018, 2018], x: [0, 1, 0.4, 8, 8.5], y: [0, 0.2, 1, 6, 6.4], size: of((one) => one.inDegree), pageRank: of((one) => one.pageRank),
    rank: of((one) => one.rank), catalogued: [true, false, true, true, true], retracted: [false, false, false, false, true], cluster: of((one) => one.cluster ?? -1), firmness: of((one) => one.firmness),
    clusters: [{ number: 0, letter: 'A', name: 'Water table', size: 3, firmness: 0.8 }, { number: 1, letter: 'B', name: 'Reed <beds>', size: 2, firmness: 1 }],
    links: { source: [0, 0, 1, 3, 2], target: [1, 2, 2, 4, 3], weight: [3, 1, 1, 1, 0.5] }, notDrawn: 2, similarity: 'association-strength',
  };
}

export async function makeAnalysis(): Promise<MadeAnalysis> {
  await emptyCatalogue();
  const [librarian, evaluator, reader, stranger] = [await createUser('librarian'), await createUser('evaluator'), await createUser('reader'), await createUser('evaluator')];
  const [reeds, peat] = [await createPortfolio({ createdById: librarian.id }), await createPortfolio({ createdById: librarian.id })];
  for (const portfolio of [reeds, peat]) await grant(portfolio, librarian, 'manage');
  await grant(reeds, evaluator, 'view');
  await grant(reeds, reader, 'view');
  const id = await makeCatalogue(librarian, reeds, peat);
  const analysis = await Analysis.create({
    portfolioId: reeds.id, createdById: evaluator.id, parameters: { ...defaultParameters, minimumCitations: 1 }, state: 'finished', inputFingerprint: 'a'.repeat(64), resultFingerprint: 'b'.repeat(64), engine: 'test',
    coverage: { cataloguedWorks: 6, worksWithReferences: 4, references: 9, linkedReferences: 6, worksWithoutYear: 1 },
    summary: {
      works: 7, cataloguedWorks: 6, citedOnlyWorks: 1, citations: 8, danglingWorks: 3, loops: 0, loopWorks: 0, backwardLinks: 0, skippedForReferences: 0, lastYear: 2020, pageRankIterations: 20, pageRankResidual: 1e-13, elapsedMs: 5,
      bases: [{ basis: 'cocitation', clusters: 2, linkedWorks: 5, pairs: 5, modularity: 0.3, agreementMean: 0.9, agreementMinimum: 0.8 }],
    },
    startedAt: new Date('2026-05-14T10:00:00Z'), finishedAt: new Date('2026-05-14T10:00:05Z'),
  });
  await storeRows(analysis.id, id);
  await storage().write(`analyses/${analysis.id}/map-cocitation.json`, JSON.stringify(madeMap(analysis.id, id)));
  await storage().write(`analyses/${analysis.id}/flows-cocitation.json`, JSON.stringify({ letters: ['A', 'B'], citations: [[1, 0], [5, 0]] }));
  return { librarian, evaluator, reader, stranger, reeds, peat, analysis, id };
}

/** Newest analysis of a portfolio, as the list gives it. */
export const newest = async (portfolioId: number) => (await listAnalyses(portfolioId, { page: 1, pageSize: 1 })).items[0];

export const auditActions = async (subjectId: string) => (await select<{ action: string }>(null, "SELECT action FROM audit_events WHERE subjectType = 'analysis' AND subjectId = ? ORDER BY id", [subjectId])).map((row) => row.action);
