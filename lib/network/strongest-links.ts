import { type WeightedPairs } from '@/lib/network/compressed-rows';

/**
 * Keeps, of all pairs, those that are among the `strongest` heaviest links of at least one of their two works.
 * Clusters and maps rest on a work's nearest relations; the thousands of weak ones add noise and cost, and their number grows with the square of
 * the portfolio. Keeping the top few of each document is usual practice: Boyack & Klavans (2010), JASIST 61:2389, doi 10.1002/asi.21419.
 * Links as heavy as a work's last one kept are kept too, so that no tie is broken by chance or order.
 * A heap of each work's heaviest links finds the weight of the last one. Cost O(pairs * log strongest) time, O(works * strongest) memory.
 * A work with fewer links keeps them all.
 */
export function keepStrongestPairs(pairs: WeightedPairs, strongest: number): WeightedPairs {
  const { size, offsets, partners, weights } = pairs;
  const thresholds = findThresholds(pairs, strongest);
  const keptOffsets = new Uint32Array(size + 1);
  const keptPartners = new Uint32Array(partners.length);
  const keptWeights = new Float64Array(partners.length);
  let kept = 0;
  for (let work = 0; work < size; work += 1) {
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) {
      const weight = weights[place];
      if (weight < thresholds[work] && weight < thresholds[partners[place]]) continue;
      keptPartners[kept] = partners[place];
      keptWeights[kept] = weight;
      kept += 1;
    }
    keptOffsets[work + 1] = kept;
  }
  return { size, offsets: keptOffsets, partners: keptPartners.slice(0, kept), weights: keptWeights.slice(0, kept) };
}

/** Weight of each work's `strongest`-th heaviest link; 0 where it has no more than that. */
function findThresholds({ size, offsets, partners, weights }: WeightedPairs, strongest: number): Float64Array {
  const heaps = new Float64Array(size * strongest);
  const filled = new Uint32Array(size);
  const offer = (work: number, weight: number): void => {
    const base = work * strongest;
    if (filled[work] < strongest) {
      raise(heaps, base, filled[work], weight);
      filled[work] += 1;
    } else if (weight > heaps[base]) replaceRoot(heaps, base, strongest, weight);
  };
  for (let work = 0; work < size; work += 1) {
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) {
      offer(work, weights[place]);
      offer(partners[place], weights[place]);
    }
  }
  return Float64Array.from({ length: size }, (_, work) => (filled[work] < strongest ? 0 : heaps[work * strongest]));
}

/** Adds a value at the end of a heap whose least value is at the root. */
function raise(heaps: Float64Array, base: number, length: number, value: number): void {
  let place = length;
  while (place > 0) {
    const parent = (place - 1) >>> 1;
    if (heaps[base + parent] <= value) break;
    heaps[base + place] = heaps[base + parent];
    place = parent;
  }
  heaps[base + place] = value;
}

function replaceRoot(heaps: Float64Array, base: number, length: number, value: number): void {
  let place = 0;
  for (;;) {
    let child = 2 * place + 1;
    if (child >= length) break;
    if (child + 1 < length && heaps[base + child + 1] < heaps[base + child]) child += 1;
    if (heaps[base + child] >= value) break;
    heaps[base + place] = heaps[base + child];
    place = child;
  }
  heaps[base + place] = value;
}
