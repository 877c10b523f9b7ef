import { type TopicTerms } from '@/lib/evaluation/topic-terms';
import { buildBasisNetwork, type BasisNetwork } from '@/lib/network/basis-pairs';
import { clusterRepeatedly } from '@/lib/network/clustering';
import { type Rows } from '@/lib/network/compressed-rows';
import { computeConductance } from '@/lib/network/conductance';
import { numberBySize } from '@/lib/network/connected-groups';
import { layOutMap } from '@/lib/network/layout/map-layout';
import { chooseMapLinks, networkOfLinks } from '@/lib/network/map-links';
import { deriveSeed } from '@/lib/network/random';
import { type Scope } from '@/lib/network/scope';
import { bases, type AnalysisParameters, type Basis, type BasisResult, type ClusterResult, type DirectedNetwork, type Progress, type WeightedNetwork } from '@/lib/network/types';

/** Groups smaller than this are no clusters: a pair of works is a link, not a topic. */
export const smallestCluster = 3;
/** Strongest links of each work that the map draws, besides the spanning forest: about five links a work in all. */
const drawnLinks = 4;

export interface BasisRequest {
  basis: Basis;
  scope: Scope;
  /** Reference lists that are not too long. */
  lists: Rows;
  parameters: AnalysisParameters;
  topics: TopicTerms;
  progress: Progress;
}

/** Clusters, their terms and the map of one basis. Works without links, and works in groups of one or two, have cluster -1. */
export function computeBasis({ basis, scope, lists, parameters, topics, progress }: BasisRequest): BasisResult {
  const title = basis === 'cocitation' ? 'co-citation' : basis;
  const seed = deriveSeed(parameters.seed, bases.indexOf(basis) + 1);
  progress(`${title}: pairs`, 0);
  const built = buildBasisNetwork(basis, scope, lists, parameters.similarity);
  const { network, works } = built;
  const size = scope.works.length;
  progress(`${title}: clusters`, 0);
  const clustering = clusterRepeatedly(network, parameters, deriveSeed(seed, 1), (done) => progress(`${title}: clusters`, done / Math.max(1, parameters.repeats)));
  const { groups, sizes } = numberBySize(clustering.groups, clustering.count, smallestCluster);
  progress(`${title}: map`, 0);
  const links = chooseMapLinks(network, drawnLinks, basis === 'citation' ? preferSpecific(network) : network.weights);
  const layout = layOutMap(networkOfLinks(network.size, links), groups, deriveSeed(seed, 2), (share) => progress(`${title}: map`, share));
  const cluster = spread(size, works, groups, new Int32Array(size).fill(-1));
  const firmness = spread(size, works, clustering.firmness, new Float64Array(size).fill(NaN));
  for (let work = 0; work < size; work += 1) if (cluster[work] < 0) firmness[work] = NaN;
  progress(`${title}: terms`, 0);
  return {
    basis,
    linkedWorks: network.size,
    pairs: built.pairs,
    modularity: clustering.modularity,
    agreementMean: clustering.agreementMean,
    agreementMinimum: clustering.agreementMinimum,
    cluster,
    firmness,
    clusters: describeClusters(built, groups, sizes, cluster, firmness, scope, topics),
    x: spread(size, works, layout.x, new Float64Array(size).fill(NaN)),
    y: spread(size, works, layout.y, new Float64Array(size).fill(NaN)),
    linkSource: links.source.map((work) => works[work]),
    linkTarget: links.target.map((work) => works[work]),
    linkWeight: links.weight,
    clusterCitations: countClusterCitations(scope.network, cluster, sizes.length),
  };
}

/**
 * Direct citations all weigh 1 or 2. The map prefers those between works with few links, c / sqrt(k_i k_j): a citation of a work that
 * everybody cites places nobody.
 */
function preferSpecific({ size, offsets, neighbours, weights }: WeightedNetwork): Float64Array {
  const preferences = new Float64Array(weights.length);
  for (let work = 0; work < size; work += 1) {
    const degree = offsets[work + 1] - offsets[work];
    for (let link = offsets[work]; link < offsets[work + 1]; link += 1) {
      preferences[link] = weights[link] / Math.sqrt(degree * (offsets[neighbours[link] + 1] - offsets[neighbours[link]]));
    }
  }
  return preferences;
}

function spread<T extends Int32Array | Float64Array>(size: number, works: Uint32Array, values: ArrayLike<number>, into: T): T {
  for (let number = 0; number < works.length; number += 1) into[works[number]] = values[number];
  return into;
}

function describeClusters(built: BasisNetwork, groups: Int32Array, sizes: number[], cluster: Int32Array, firmness: Float64Array, scope: Scope, topics: TopicTerms): ClusterResult[] {
  const letters = sizes.map((_, number) => letterOf(number));
  const described = topics.describe(cluster, letters);
  const conductance = computeConductance(built.network, groups, sizes.length);
  const years: number[][] = sizes.map(() => []);
  const firmnessSums = new Float64Array(sizes.length);
  cluster.forEach((number, work) => {
    if (number < 0) return;
    firmnessSums[number] += firmness[work];
    const { year } = scope.works[work];
    if (year !== null) years[number].push(year);
  });
  return sizes.map((size, number) => ({
    letter: letters[number],
    size,
    terms: described[number].terms.map(({ term, works, logLikelihood }) => ({ term, works, logLikelihood })),
    name: described[number].name,
    firmness: firmnessSums[number] / size,
    conductance: conductance[number],
    ...summariseYears(years[number]),
  }));
}

function summariseYears(years: number[]): Pick<ClusterResult, 'firstYear' | 'medianYear' | 'lastYear'> {
  if (years.length === 0) return { firstYear: null, medianYear: null, lastYear: null };
  years.sort((one, other) => one - other);
  const upper = years[years.length >> 1];
  const lower = years[(years.length - 1) >> 1];
  return { firstYear: years[0], medianYear: (lower + upper) / 2, lastYear: years[years.length - 1] };
}

/** A, B, ... Z, AA, AB, ... */
export function letterOf(number: number): string {
  let letters = '';
  for (let rest = number + 1; rest > 0; rest = Math.floor((rest - 1) / 26)) letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
  return letters;
}

/** Citations from cluster to cluster, row-major; works without a cluster are left out. */
function countClusterCitations(network: DirectedNetwork, cluster: Int32Array, count: number): Float64Array {
  const citations = new Float64Array(count * count);
  for (let work = 0; work < network.size; work += 1) {
    if (cluster[work] < 0) continue;
    for (let link = network.offsets[work]; link < network.offsets[work + 1]; link += 1) {
      const cited = cluster[network.targets[link]];
      if (cited >= 0) citations[cluster[work] * count + cited] += 1;
    }
  }
  return citations;
}
