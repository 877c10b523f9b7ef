/** One reason for the score of a proposed match. */
export interface MatchReason {
  field: 'identifier' | 'title' | 'author' | 'year' | 'volume-page' | 'venue';
  /** Plain words, e.g. "Title, 0.98 similar". */
  verdict: string;
  /** Log2 of the likelihood ratio: positive speaks for the same work. */
  weight: number;
}
