import { splitDisconnectedGroups } from '@/lib/network/connected-groups';
import { refineGroups } from '@/lib/network/leiden-refinement';
import { contractLevel, flattenGroups, renumberGroups, startLevel, Scratch, type LevelNetwork } from '@/lib/network/level-network';
import { moveNodes } from '@/lib/network/local-moving';
import { type Partition } from '@/lib/network/louvain';
import { createRandom, type Random } from '@/lib/network/random';
import { type WeightedNetwork } from '@/lib/network/types';

export interface LeidenOptions {
  scratch?: Scratch;
  maximumIterations?: number;
  /** Groups to begin with, numbered below the number of works; by default each work is alone. */
  start?: Int32Array;
}

/**
 * Leiden: local moving, refinement inside groups, contraction of the refined parts; the next level starts from the groups before refinement.
 * The whole is repeated from its own result until a round moves nothing. Source: Traag, Waltman & Van Eck (2019), doi 10.1038/s41598-019-41695-z.
 * Cost about O(links) a level, few levels, few rounds. The result depends on the seed. Works without links form groups of one.
 * Every group is connected: parts are by construction, and what a search cut short might leave is split at the end (`split`).
 */
export function clusterByLeiden(network: WeightedNetwork, resolution: number, seed: number, options: LeidenOptions = {}): Partition {
  const { scratch = new Scratch(), maximumIterations = 20, start } = options;
  const random = createRandom(seed);
  const base = startLevel(network);
  let groups: Int32Array = start?.slice() ?? Int32Array.from({ length: network.size }, (_, work) => work);
  let iterations = 0;
  let stable = network.size === 0;
  while (!stable && iterations < maximumIterations) {
    const round = runRound(base, groups, resolution, random, scratch);
    groups = round.groups;
    iterations += 1;
    stable = round.moves === 0;
  }
  return { ...splitDisconnectedGroups(network, groups), iterations, stable };
}

function runRound(base: LevelNetwork, start: Int32Array, resolution: number, random: Random, scratch: Scratch): { groups: Int32Array; moves: number } {
  const lifts: Int32Array[] = [];
  let level = base;
  let groups: Int32Array = start.slice();
  let moves = 0;
  for (;;) {
    moves += moveNodes(level, groups, resolution, random, scratch);
    const count = renumberGroups(groups);
    if (count === level.size) break;
    const parts = refineGroups(level, groups, count, resolution, random, scratch);
    const partCount = renumberGroups(parts);
    if (partCount === level.size) break;
    const above = new Int32Array(partCount);
    for (let node = 0; node < level.size; node += 1) above[parts[node]] = groups[node];
    lifts.push(parts);
    level = contractLevel(level, parts, partCount, scratch);
    groups = above;
  }
  const flat = flattenGroups(groups, lifts);
  renumberGroups(flat);
  return { groups: flat, moves };
}
