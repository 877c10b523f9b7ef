import { transposeRows, type Rows } from '@/lib/network/compressed-rows';
import { countPairs, defaultPairRule, type PairCounts, type PairRule } from '@/lib/network/pair-counts';

/**
 * Bibliographic coupling: how many references two works share.
 *   b_ij = number of references that both i and j give, references outside the network included.
 * Source: Kessler (1963), American Documentation 14:10, doi 10.1002/asi.5090140103.
 * Identity: the sum over all pairs is the sum over references of k (k - 1) / 2, k being the works that give the reference.
 * Cost O(sum over references of k^2). Works without references, or with references that nobody shares, have no pair.
 *
 * @param lists one ascending row of references per work; works and references are numbered apart from each other
 * @param references number of distinct references
 */
export function countCouplings(lists: Rows, references: number, rule: PairRule = defaultPairRule): PairCounts {
  return countPairs(transposeRows(lists, references), lists, rule);
}
