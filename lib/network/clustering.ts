import { comparePartitions, countGroups, visitTable } from '@/lib/network/agreement';
import { clusterByLeiden } from '@/lib/network/leiden';
import { Scratch } from '@/lib/network/level-network';
import { clusterByLouvain } from '@/lib/network/louvain';
import { computeModularity } from '@/lib/network/modularity';
import { deriveSeed } from '@/lib/network/random';
import { type AnalysisParameters, type WeightedNetwork } from '@/lib/network/types';

/**
 * Which partition to publish, and how firm it is.
 * The method runs once for each of `repeats` seeds, Leiden for two rounds each. Chosen is the partition of highest modularity; where several come
 * within 1e-12 of it, the one with the highest mean adjusted Rand index to all others, then the first. With Leiden it is then run on until nothing
 * moves, which can only raise its modularity; the later rounds of every repeat would cost as much as all else and change next to nothing. Firmness of a work: over all repeats, the mean share
 * of its published group-mates that are with it in that repeat. Agreement: mean and least adjusted Rand index over all pairs of repeats.
 * Sources: Hubert & Arabie (1985), doi 10.1007/BF01908075; consensus over seeds: Lancichinetti & Fortunato (2012), doi 10.1038/srep00336.
 * Cost: `repeats` clusterings and O(repeats^2 * works). Undefined: agreement with fewer than 2 repeats (null), firmness of a work alone (NaN),
 * modularity without links (0 groups to speak of; given as 0).
 */
export interface Clustering {
  /** Numbered in order of the smallest work; works alone are groups of one. */
  groups: Int32Array;
  count: number;
  modularity: number;
  agreementMean: number | null;
  agreementMinimum: number | null;
  firmness: Float64Array;
}

/** Rounds of Leiden in each repeat; the authors' own programs use as many. */
const roundsPerRepeat = 2;

export type ClusteringChoice = Pick<AnalysisParameters, 'clustering' | 'resolution' | 'repeats'>;

export function clusterRepeatedly(network: WeightedNetwork, { clustering, resolution, repeats }: ClusteringChoice, seed: number, onRepeat?: (done: number) => void): Clustering {
  const partitions: Int32Array[] = [];
  const qualities: number[] = [];
  const runs = Math.max(1, repeats);
  const scratch = new Scratch();
  for (let repeat = 0; repeat < runs; repeat += 1) {
    const own = deriveSeed(seed, repeat);
    const { groups } = clustering === 'leiden' ? clusterByLeiden(network, resolution, own, { scratch, maximumIterations: roundsPerRepeat }) : clusterByLouvain(network, resolution, own, scratch);
    partitions.push(groups);
    qualities.push(computeModularity(network, groups, resolution) ?? 0);
    onRepeat?.(repeat + 1);
  }
  const agreement = agreeEachWithEach(partitions);
  const chosen = choose(qualities, agreement.means);
  const groups = clustering === 'leiden' ? clusterByLeiden(network, resolution, deriveSeed(seed, runs), { scratch, start: partitions[chosen] }).groups : partitions[chosen];
  return { groups, count: countGroups(groups), modularity: computeModularity(network, groups, resolution) ?? 0, agreementMean: agreement.mean, agreementMinimum: agreement.minimum, firmness: measureFirmness(groups, partitions) };
}

function choose(qualities: number[], meanAgreements: number[]): number {
  const best = Math.max(...qualities);
  let chosen = -1;
  for (let run = 0; run < qualities.length; run += 1) {
    if (qualities[run] < best - 1e-12) continue;
    if (chosen < 0 || meanAgreements[run] > meanAgreements[chosen] + 1e-12) chosen = run;
  }
  return chosen;
}

function agreeEachWithEach(partitions: Int32Array[]): { means: number[]; mean: number | null; minimum: number | null } {
  const runs = partitions.length;
  const sums = new Array<number>(runs).fill(0);
  if (runs < 2) return { means: sums, mean: null, minimum: null };
  let total = 0;
  let minimum = 1;
  for (let one = 0; one < runs; one += 1) {
    for (let other = one + 1; other < runs; other += 1) {
      const { adjustedRand } = comparePartitions(partitions[one], partitions[other]);
      sums[one] += adjustedRand;
      sums[other] += adjustedRand;
      total += adjustedRand;
      minimum = Math.min(minimum, adjustedRand);
    }
  }
  return { means: sums.map((sum) => sum / (runs - 1)), mean: total / ((runs * (runs - 1)) / 2), minimum };
}

/** Share of each work's group-mates that are with it, averaged over the partitions; NaN for a work alone in its group. */
export function measureFirmness(groups: Int32Array, partitions: Int32Array[]): Float64Array {
  const firmness = new Float64Array(groups.length);
  const sizes = new Uint32Array(countGroups(groups));
  for (const group of groups) sizes[group] += 1;
  for (const partition of partitions) {
    const together = new Map<number, number>();
    const columns = countGroups(partition);
    visitTable(groups, partition, (count, group, other) => together.set(group * columns + other, count));
    for (let work = 0; work < groups.length; work += 1) {
      const count = together.get(groups[work] * columns + partition[work]) as number;
      firmness[work] += (count - 1) / (sizes[groups[work]] - 1);
    }
  }
  return firmness.map((sum) => sum / partitions.length);
}
