import { percentilesWithin } from '@/lib/evaluation/percentiles';
import { TopicTerms } from '@/lib/evaluation/topic-terms';
import { computeBasis } from '@/lib/network/basis-result';
import { bootstrapRanks } from '@/lib/network/bootstrap-ranks';
import { findStrongComponents } from '@/lib/network/components';
import { transposeNetwork } from '@/lib/network/compressed-rows';
import { countBackwardLinks, countCitations, countReferences } from '@/lib/network/degrees';
import { computePageRank, type PageRankResult } from '@/lib/network/pagerank';
import { ComponentPageRank } from '@/lib/network/pagerank-by-components';
import { deriveSeed } from '@/lib/network/random';
import { rankDescending } from '@/lib/network/ranks';
import { capReferenceLists } from '@/lib/network/reference-lists';
import { selectScope, type Scope } from '@/lib/network/scope';
import { bases, type AnalysisInput, type AnalysisParameters, type AnalysisResult, type DirectedNetwork, type Progress } from '@/lib/network/types';

export { serialiseInput, serialiseResult } from '@/lib/network/serialise';

/** Raised whenever a change moves a number: fingerprints can be compared within one version only. */
export const engineVersion = 'network 1';

/** The second damping, shown beside the chosen one. */
const highDamping = 0.85;

/**
 * Computes one analysis: ranks with intervals, clusters and maps on all bases, and how they came about. Pure and synchronous.
 * The same works, citations and parameters give the same bytes (`serialiseResult`), whatever the order in which they come.
 * Throws a RangeError for parameters out of range, works that share a key, and citations of works that do not exist; and whatever `progress`
 * throws, which is how an analysis is cancelled. An input without catalogued works gives an empty result.
 */
export function analyseNetwork(input: AnalysisInput, parameters: AnalysisParameters, progress: Progress): AnalysisResult {
  requireParameters(parameters);
  progress('network', 0);
  const scope = selectScope(input, parameters);
  const { network, works } = scope;
  const inDegree = countCitations(network);
  const { loops, inLoop } = findLoops(network);
  const lastYear = findLastYear(scope);
  progress('ranks', 0);
  const pageRank = computePageRank(network, { damping: parameters.damping });
  const pageRankHigh = computePageRank(network, { damping: highDamping });
  requireConverged(pageRank, parameters.damping);
  requireConverged(pageRankHigh, highDamping);
  const ranks = rankWithIntervals(network, pageRank.values, inDegree, parameters, progress);
  const { lists, skipped } = capReferenceLists(scope.references, parameters.maximumReferences);
  progress('words', 0);
  const topics = new TopicTerms(works);
  const references = countReferences(network);
  const years = works.map((work) => work.year);
  return {
    workIndex: scope.workIndex,
    inDegree,
    outDegree: references,
    pageRank: scaleToMean(pageRank.values),
    pageRankHigh: scaleToMean(pageRankHigh.values),
    ...ranks,
    agePercentile: percentilesWithin(inDegree, years),
    citationsPerYear: Float64Array.from(inDegree, (citations, work) => perYear(citations, years[work], lastYear)),
    inLoop,
    bases: bases.map((basis) => computeBasis({ basis, scope, lists, parameters, topics, progress })),
    run: {
      works: works.length,
      citations: network.targets.length,
      cataloguedWorks: count(scope.catalogued, 1),
      citedOnlyWorks: count(scope.catalogued, 0),
      pageRankIterations: pageRank.iterations,
      pageRankResidual: pageRank.residual,
      pageRankConverged: pageRank.converged,
      danglingWorks: count(references, 0),
      loops,
      loopWorks: count(inLoop, 1),
      backwardLinks: countBackwardLinks(network, years),
      skippedForReferences: skipped,
      lastYear,
      seed: parameters.seed,
      engine: engineVersion,
    },
  };
}

function requireParameters(parameters: AnalysisParameters): void {
  const { damping, resolution, repeats, replicates, periodFrom, periodTo } = parameters;
  if (!(damping > 0 && damping < 1)) throw new RangeError(`Damping must lie between 0 and 1; it is ${damping}.`);
  if (!(resolution > 0 && Number.isFinite(resolution))) throw new RangeError(`Resolution must be greater than 0; it is ${resolution}.`);
  if (!(Number.isInteger(repeats) && repeats >= 1)) throw new RangeError(`Repeats must be a whole number of at least 1; there are ${repeats}.`);
  if (!(Number.isInteger(replicates) && replicates >= 0)) throw new RangeError(`Replicates must be a whole number of at least 0; there are ${replicates}.`);
  if (periodFrom !== null && periodTo !== null && periodFrom > periodTo) throw new RangeError(`The period begins in ${periodFrom}, after its end in ${periodTo}.`);
}

/** A rank read off values that still move would be a guess. */
function requireConverged(result: PageRankResult, damping: number): void {
  if (!result.converged) throw new Error(`PageRank at damping ${damping} did not settle in ${result.iterations} rounds; the last one still moved ${result.residual}.`);
}

type Ranks = Pick<AnalysisResult, 'rank' | 'rankLow' | 'rankHigh' | 'citationRank' | 'citationRankLow' | 'citationRankHigh'>;

function rankWithIntervals(network: DirectedNetwork, pageRank: Float64Array, inDegree: Uint32Array, parameters: AnalysisParameters, progress: Progress): Ranks {
  const rank = rankDescending(pageRank);
  const citationRank = rankDescending(inDegree);
  const intervals = bootstrapRanks({
    network,
    pageRank: new ComponentPageRank(network, transposeNetwork(network)),
    damping: parameters.damping,
    replicates: parameters.replicates,
    seed: deriveSeed(parameters.seed, 0),
    rank,
    citationRank,
    onReplicate: (done) => progress('rank intervals', done / parameters.replicates),
  });
  return {
    rank,
    rankLow: intervals.pageRank.low,
    rankHigh: intervals.pageRank.high,
    citationRank,
    citationRankLow: intervals.citations.low,
    citationRankHigh: intervals.citations.high,
  };
}

function findLoops(network: DirectedNetwork): { loops: number; inLoop: Uint8Array } {
  const { component, sizes } = findStrongComponents(network);
  return { loops: sizes.reduce((sum, size) => sum + (size > 1 ? 1 : 0), 0), inLoop: Uint8Array.from(component, (number) => (sizes[number] > 1 ? 1 : 0)) };
}

/** Last year of a catalogued work: cited-only works carry years as somebody typed them into a reference. */
function findLastYear({ works, catalogued }: Scope): number | null {
  let last: number | null = null;
  works.forEach(({ year }, work) => {
    if (catalogued[work] === 1 && year !== null && (last === null || year > last)) last = year;
  });
  return last;
}

function perYear(citations: number, year: number | null, lastYear: number | null): number {
  return year === null || lastYear === null ? NaN : citations / Math.max(1, lastYear - year);
}

const scaleToMean = (values: Float64Array): Float64Array => values.map((value) => value * values.length);

function count(values: ArrayLike<number>, wanted: number): number {
  let found = 0;
  for (let place = 0; place < values.length; place += 1) if (values[place] === wanted) found += 1;
  return found;
}
