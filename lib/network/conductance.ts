import { type WeightedNetwork } from '@/lib/network/types';

/**
 * Conductance of each group: the weight of the links that leave it over the weight of all link ends inside it, or outside if that is less.
 *   phi(C) = cut(C) / min(K_C, 2M - K_C)
 * 0 is sealed off; above one half more leads out than stays. Source: Kannan, Vempala & Vetta (2004), doi 10.1145/990308.990313.
 * Cost O(works + links). Works with a negative group number belong to no group. Undefined (null) where the smaller side has no links.
 */
export function computeConductance(network: WeightedNetwork, groups: Int32Array, count: number): (number | null)[] {
  const { size, offsets, neighbours, weights } = network;
  const strengths = new Float64Array(count);
  const cuts = new Float64Array(count);
  let total = 0;
  for (let work = 0; work < size; work += 1) {
    const group = groups[work];
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) {
      total += weights[place];
      if (group < 0) continue;
      strengths[group] += weights[place];
      if (groups[neighbours[place]] !== group) cuts[group] += weights[place];
    }
  }
  return Array.from(cuts, (cut, group) => {
    const smaller = Math.min(strengths[group], total - strengths[group]);
    // Sums of the same weights in another order can leave a remainder of rounding where there is no other side.
    return smaller > 1e-12 * total ? cut / smaller : null;
  });
}
