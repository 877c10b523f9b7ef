import { type PairCounts } from '@/lib/network/pair-counts';
import { type Similarity } from '@/lib/network/types';

/**
 * Counts of pairs set against the sizes of their two works.
 *   association strength  T c_ij / (s_i s_j)      observed over expected; 1 as expected, no upper bound
 *   cosine                c_ij / sqrt(N_i N_j)    0..1
 *   Jaccard               c_ij / (N_i + N_j - c_ij)   0..1
 * N_i: occurrences (citing works, or references); s_i: sum of i's counts; T: sum of all s_i. Cosine and Jaccard use N, association strength uses s;
 * they are never mixed. Sums run over all pairs, also those that were left out as too thin.
 * Sources: Van Eck & Waltman (2009), doi 10.1002/asi.21075; Jaccard (1912), doi 10.1111/j.1469-8137.1912.tb05611.x; Salton & McGill (1983).
 * Cost O(pairs). A pair that exists has positive sizes, so no division by zero can occur.
 */
export function computeSimilarities(pairs: PairCounts, kind: Similarity): Float64Array {
  const { size, offsets, partners, counts, occurrences, strengths } = pairs;
  const weights = new Float64Array(partners.length);
  const total = strengths.reduce((sum, strength) => sum + strength, 0);
  for (let item = 0; item < size; item += 1) {
    for (let place = offsets[item]; place < offsets[item + 1]; place += 1) {
      const partner = partners[place];
      const count = counts[place];
      if (kind === 'association-strength') weights[place] = (total * count) / (strengths[item] * strengths[partner]);
      else if (kind === 'cosine') weights[place] = count / Math.sqrt(occurrences[item] * occurrences[partner]);
      else weights[place] = count / (occurrences[item] + occurrences[partner] - count);
    }
  }
  return weights;
}
