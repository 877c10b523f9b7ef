import { countCocitations } from '@/lib/network/cocitation';
import { buildUndirectedNetwork, buildWeightedNetwork, transposeNetwork, type Rows, type WeightedPairs } from '@/lib/network/compressed-rows';
import { countCouplings } from '@/lib/network/coupling';
import { renumberMembers } from '@/lib/network/reference-lists';
import { type Scope } from '@/lib/network/scope';
import { computeSimilarities } from '@/lib/network/similarity';
import { keepStrongestPairs } from '@/lib/network/strongest-links';
import { type Basis, type Similarity, type WeightedNetwork } from '@/lib/network/types';

/**
 * The weighted network that clusters and maps of a basis rest on: co-citation and coupling as similarities, thinned to each work's strongest
 * links; direct citations without direction. Works without links are left out.
 */
export interface BasisNetwork {
  /** Number within the analysis of each work of `network`. */
  works: Uint32Array;
  network: WeightedNetwork;
  /** Pairs with a link before the network was thinned. */
  pairs: number;
}

/** Strongest links of each work that clusters rest on; see `strongest-links.ts`. */
export const clusteringLinks = 30;

/** @param lists reference lists that are not too long, members numbered as in `scope.references` */
export function buildBasisNetwork(basis: Basis, scope: Scope, lists: Rows, similarity: Similarity): BasisNetwork {
  if (basis === 'citation') {
    const network = buildUndirectedNetwork(scope.network, transposeNetwork(scope.network));
    return dropUnlinked(network, network.neighbours.length / 2);
  }
  const pairs = measurePairs(basis, scope, lists, similarity);
  return dropUnlinked(buildWeightedNetwork(keepStrongestPairs(pairs, clusteringLinks)), pairs.partners.length);
}

function measurePairs(basis: Exclude<Basis, 'citation'>, scope: Scope, lists: Rows, similarity: Similarity): WeightedPairs {
  const counts =
    basis === 'cocitation'
      ? countCocitations(renumberMembers(lists, scope.numberOfReference), scope.works.length)
      : countCouplings(lists, scope.numberOfReference.length);
  return { size: counts.size, offsets: counts.offsets, partners: counts.partners, weights: computeSimilarities(counts, similarity) };
}

function dropUnlinked({ size, offsets, neighbours, weights }: WeightedNetwork, pairs: number): BasisNetwork {
  const numbers = new Int32Array(size).fill(-1);
  const works: number[] = [];
  for (let work = 0; work < size; work += 1) if (offsets[work + 1] > offsets[work]) numbers[work] = works.push(work) - 1;
  const linkedOffsets = new Uint32Array(works.length + 1);
  works.forEach((work, number) => {
    linkedOffsets[number + 1] = offsets[work + 1];
  });
  return { works: Uint32Array.from(works), network: { size: works.length, offsets: linkedOffsets, neighbours: neighbours.map((work) => numbers[work]), weights }, pairs };
}
