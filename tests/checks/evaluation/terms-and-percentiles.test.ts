import { describe, expect, it } from 'vitest';

import { signedLogLikelihood } from '@/lib/evaluation/log-likelihood';
import { percentilesWithin } from '@/lib/evaluation/percentiles';
import indicators from '@/tests/fixtures/checks/indicators.json';
import labels from '@/tests/fixtures/checks/labels.json';

const likelihoodOf = ([inWith, inWithout, outWith, outWithout]: number[]): number => signedLogLikelihood({ inWith, inWithout, outWith, outWithout });

describe('signed log-likelihood (labels.json)', () => {
  it.each(labels.dunning_bigrams.map((row) => [row.bigram, row] as const))('gives the value of scipy for "%s", and the one printed by Dunning (1993) where there is one', (_bigram, row) => {
    if (row.printed !== null) expect(Math.abs(likelihoodOf(row.k) - row.printed)).toBeLessThan(0.006);
    expect(likelihoodOf(row.k)).toBeCloseTo(row.signed, 8);
  });

  it.each(Object.entries(labels.term_vs_cluster))('gives the signed value of the case: %s (scipy)', (_name, row) => {
    expect(likelihoodOf(row.k)).toBeCloseTo(row.signed, 9);
  });
});

describe('percentiles (indicators.json, scipy.stats.percentileofscore kind="mean")', () => {
  it('put ties at mid-rank', () => {
    const { reference_set: values, hazen_rank_of_each: expected } = indicators.percentiles;
    const percentiles = percentilesWithin(values, values.map(() => 2020));
    values.forEach((value, item) => expect([value, percentiles[item]]).toEqual(expected[item]));
  });
});
