import { type DirectedNetwork } from '@/lib/network/types';

/**
 * Degrees: how many distinct works of the network cite a work (in-degree), and how many it cites (out-degree).
 * Formula: row lengths of the network and of its transpose. Source: Price (1965), Science 149:510, doi 10.1126/science.149.3683.510.
 * Cost O(works + links). Assumes rows without duplicates and self-links, as `buildNetwork` gives them. A work without links has degree 0.
 */
export function countCitations(network: DirectedNetwork): Uint32Array {
  const degrees = new Uint32Array(network.size);
  for (let place = 0; place < network.targets.length; place += 1) degrees[network.targets[place]] += 1;
  return degrees;
}

export function countReferences(network: DirectedNetwork): Uint32Array {
  const degrees = new Uint32Array(network.size);
  for (let work = 0; work < network.size; work += 1) degrees[work] = network.offsets[work + 1] - network.offsets[work];
  return degrees;
}

/** Links that run against time: the citing work is older than the cited one. Links with an unknown year at either end are not counted. */
export function countBackwardLinks(network: DirectedNetwork, years: readonly (number | null)[]): number {
  let backward = 0;
  for (let work = 0; work < network.size; work += 1) {
    const year = years[work];
    if (year === null) continue;
    for (let place = network.offsets[work]; place < network.offsets[work + 1]; place += 1) {
      const citedYear = years[network.targets[place]];
      if (citedYear !== null && year < citedYear) backward += 1;
    }
  }
  return backward;
}
