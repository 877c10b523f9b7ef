/**
 * Signed log-likelihood ratio of a two-by-two table: how strongly a term and a group go together.
 *   G2 = 2 * sum of O ln(O / E),  E = row sum * column sum / total,  0 ln 0 = 0
 * Positive when the term is in the group at least as often as expected, negative when less often.
 * Source: Dunning (1993), Computational Linguistics 19:61, aclanthology.org/J93-1003.
 * O(1). A table with an empty row or column gives 0: nothing can be told from it.
 */
export interface TermTable {
  /** Works of the group with the term, and without it. */
  inWith: number;
  inWithout: number;
  /** Works outside the group with the term, and without it. */
  outWith: number;
  outWithout: number;
}

export function signedLogLikelihood({ inWith, inWithout, outWith, outWithout }: TermTable): number {
  const inside = inWith + inWithout;
  const outside = outWith + outWithout;
  const withTerm = inWith + outWith;
  const without = inWithout + outWithout;
  const total = inside + outside;
  if (inside === 0 || outside === 0 || withTerm === 0 || without === 0) return 0;
  const part = (observed: number, row: number, column: number): number => (observed === 0 ? 0 : observed * Math.log((observed * total) / (row * column)));
  const ratio = 2 * (part(inWith, inside, withTerm) + part(inWithout, inside, without) + part(outWith, outside, withTerm) + part(outWithout, outside, without));
  // Rounding can leave a table of perfect independence a hair below 0.
  return inWith * total >= inside * withTerm ? Math.max(0, ratio) : Math.min(0, -ratio);
}
