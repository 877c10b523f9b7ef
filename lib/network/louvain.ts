import { splitDisconnectedGroups } from '@/lib/network/connected-groups';
import { contractLevel, flattenGroups, renumberGroups, Scratch, startLevel } from '@/lib/network/level-network';
import { moveNodes } from '@/lib/network/local-moving';
import { createRandom } from '@/lib/network/random';
import { type WeightedNetwork } from '@/lib/network/types';

export interface Partition {
  /** Group of each work, numbered 0, 1, ... in order of their smallest work. */
  groups: Int32Array;
  count: number;
  /** Groups gained because some fell apart and were split. */
  split: number;
  /** Leiden: rounds over all levels until nothing moved; Louvain: levels. */
  iterations: number;
  /** False when the greatest number of iterations ended the search. */
  stable: boolean;
}

/**
 * Louvain: works move to the neighbouring group of largest gain in modularity, groups are contracted to nodes, and so on until nothing moves.
 * Source: Blondel, Guillaume, Lambiotte & Lefebvre (2008), J. Stat. Mech. P10008, doi 10.1088/1742-5468/2008/10/P10008.
 * The method can leave groups that fall apart inside; they are split at the end and counted.
 * Cost about O(links) a level, few levels. The result depends on the seed. Works without links form groups of one.
 */
export function clusterByLouvain(network: WeightedNetwork, resolution: number, seed: number, scratch = new Scratch()): Partition {
  const random = createRandom(seed);
  const lifts: Int32Array[] = [];
  let level = startLevel(network);
  let groups: Int32Array = Int32Array.from({ length: level.size }, (_, node) => node);
  let iterations = 0;
  for (;;) {
    const moves = moveNodes(level, groups, resolution, random, scratch);
    iterations += 1;
    const count = renumberGroups(groups);
    if (moves === 0 || count === level.size) break;
    lifts.push(groups);
    level = contractLevel(level, groups, count, scratch);
    groups = Int32Array.from({ length: count }, (_, node) => node);
  }
  return { ...splitDisconnectedGroups(network, flattenGroups(groups, lifts)), iterations, stable: true };
}
