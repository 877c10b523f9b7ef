import { type WeightedNetwork } from '@/lib/network/types';

/**
 * Modularity with resolution: how much more weight lies inside groups than the strengths of their works would lead one to expect.
 *   Q = sum over groups of [ e_c / M - resolution * (K_c / 2M)^2 ]
 * e_c: weight inside group c, each link once; K_c: sum of the strengths of its works; M: total weight.
 * Sources: Newman & Girvan (2004), doi 10.1103/PhysRevE.69.026113; resolution: Reichardt & Bornholdt (2006), doi 10.1103/PhysRevE.74.016110.
 * Cost O(works + links). A work with a negative group number counts as a group of its own. Without links Q is undefined: null.
 */
export function computeModularity(network: WeightedNetwork, groups: Int32Array, resolution: number): number | null {
  const { size, offsets, neighbours, weights } = network;
  let highest = -1;
  for (let work = 0; work < size; work += 1) highest = Math.max(highest, groups[work]);
  const strengths = new Float64Array(highest + 1);
  let twiceInside = 0;
  let twiceTotal = 0;
  let squares = 0;
  for (let work = 0; work < size; work += 1) {
    const group = groups[work];
    let strength = 0;
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) {
      strength += weights[place];
      if (group >= 0 && groups[neighbours[place]] === group) twiceInside += weights[place];
    }
    twiceTotal += strength;
    if (group >= 0) strengths[group] += strength;
    else squares += strength * strength;
  }
  if (twiceTotal === 0) return null;
  for (let group = 0; group <= highest; group += 1) squares += strengths[group] * strengths[group];
  return twiceInside / twiceTotal - (resolution * squares) / (twiceTotal * twiceTotal);
}
