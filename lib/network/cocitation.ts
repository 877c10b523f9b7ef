import { transposeRows, type Rows } from '@/lib/network/compressed-rows';
import { countPairs, defaultPairRule, type PairCounts, type PairRule } from '@/lib/network/pair-counts';

/**
 * Co-citation: how many works cite both of two works.
 *   c_ij = number of citing works whose reference list holds i and j.
 * Source: Small (1973), JASIS 24:265, doi 10.1002/asi.4630240406; Marshakova (1973).
 * Identity: the sum over all pairs is the sum over reference lists of k (k - 1) / 2.
 * Cost O(sum of k^2). Works cited by nobody, or always alone, have no pair.
 *
 * @param lists one ascending row of cited works per citing work
 * @param size number of works on the cited side
 */
export function countCocitations(lists: Rows, size: number, rule: PairRule = defaultPairRule): PairCounts {
  return countPairs(lists, transposeRows(lists, size), rule);
}
