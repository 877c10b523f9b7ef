import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { bootstrapRanks } from '@/lib/network/bootstrap-ranks';
import { transposeNetwork } from '@/lib/network/compressed-rows';
import { countCitations } from '@/lib/network/degrees';
import { ComponentPageRank } from '@/lib/network/pagerank-by-components';
import { rankDescending } from '@/lib/network/ranks';
import { type DirectedNetwork } from '@/lib/network/types';
import { networkOf, rawPairs } from '@/tests/unit/network/made-networks';

describe('competition ranks', () => {
  it('are one more than the number of better values', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -5, max: 5 })), (values) => {
        expect([...rankDescending(values)]).toEqual(values.map((value) => 1 + values.filter((other) => other > value).length));
      }),
    );
  });

  it('are shared by values within 1e-9 of the best of them, relative to their size', () => {
    expect([...rankDescending([1, 1 + 5e-10, 1 + 2e-9, 1e-12, 2e-12])]).toEqual([2, 2, 1, 5, 4]);
  });

  it('do not let a chain of near-equal values run on for ever', () => {
    const values = Array.from({ length: 5 }, (_, step) => 1 - step * 6e-10);
    expect([...rankDescending(values)]).toEqual([1, 1, 3, 3, 5]);
  });

  it('hold for numbers of every size and sign', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ noNaN: true, noDefaultInfinity: true })), (values) => {
        const sorted = [...new Set(values.map((value) => value + 0))].sort((one, other) => other - one);
        const apart = sorted.every((value, place) => place === 0 || sorted[place - 1] - value > 1e-8 * Math.max(Math.abs(value), Math.abs(sorted[place - 1])));
        fc.pre(apart);
        expect([...rankDescending(values)]).toEqual(values.map((value) => 1 + values.filter((other) => other > value).length));
      }),
    );
    expect([...rankDescending([0, -0, -1, 1e308, -1e308])]).toEqual([2, 2, 4, 1, 5]);
  });

  it('refuse what is not a number', () => {
    for (const value of [NaN, Infinity, -Infinity]) expect(() => rankDescending([1, value])).toThrow('has no rank');
    expect([...rankDescending([])]).toEqual([]);
  });
});

function bootstrap(network: DirectedNetwork, replicates: number, seed = 1): ReturnType<typeof bootstrapRanks> & { rank: Uint32Array; citationRank: Uint32Array } {
  const pageRank = new ComponentPageRank(network, transposeNetwork(network));
  const values = new Float64Array(network.size);
  pageRank.solve(0.5, values);
  const rank = rankDescending(values);
  const citationRank = rankDescending(countCitations(network));
  return { ...bootstrapRanks({ network, pageRank, damping: 0.5, replicates, seed, rank, citationRank }), rank, citationRank };
}

describe('intervals of ranks', () => {
  it('are the rank itself without replicates, and without citations', () => {
    const network = networkOf(3, [[0, 1], [2, 1]]);
    const { pageRank, citations, rank, citationRank } = bootstrap(network, 0);
    expect([pageRank.low, pageRank.high, citations.low, citations.high]).toEqual([rank, rank, citationRank, citationRank]);
    const alone = bootstrap(networkOf(2, []), 50);
    expect([...alone.pageRank.low, ...alone.pageRank.high]).toEqual([1, 1, 1, 1]);
    expect(bootstrap(networkOf(0, []), 50).pageRank.low.length).toBe(0);
  });

  it('hold the rank and repeat for a seed', () => {
    fc.assert(
      fc.property(rawPairs, fc.integer({ min: 1, max: 30 }), ({ size, pairs }, replicates) => {
        const network = networkOf(size, pairs);
        const { pageRank, citations, rank, citationRank } = bootstrap(network, replicates);
        for (let work = 0; work < size; work += 1) {
          expect(pageRank.low[work]).toBeLessThanOrEqual(rank[work]);
          expect(pageRank.high[work]).toBeGreaterThanOrEqual(rank[work]);
          expect(citations.low[work]).toBeLessThanOrEqual(citationRank[work]);
          expect(citations.high[work]).toBeGreaterThanOrEqual(citationRank[work]);
        }
        expect(bootstrap(network, replicates)).toEqual({ pageRank, citations, rank, citationRank });
      }),
      { numRuns: 30 },
    );
  });

  it('are the quantiles of enumerating all resamples of four reference lists', () => {
    // Works 0-3 cite works 4-6; every one of the 4^4 draws is equally likely.
    const pairs = [[0, 4], [0, 5], [1, 4], [1, 6], [2, 4], [3, 5], [3, 6]] as const;
    const network = networkOf(7, pairs);
    const ranksOf: number[][] = Array.from({ length: 7 }, () => []);
    for (let draw = 0; draw < 256; draw += 1) {
      const drawn = [0, 0, 0, 0];
      for (let place = 0; place < 4; place += 1) drawn[(draw >> (2 * place)) & 3] += 1;
      const citations = new Array<number>(7).fill(0);
      for (const [citing, cited] of pairs) citations[cited] += drawn[citing];
      citations.forEach((value, work) => ranksOf[work].push(1 + citations.filter((other) => other > value).length));
    }
    const { citations, citationRank } = bootstrap(network, 20_000);
    ranksOf.forEach((ranks, work) => {
      const sorted = ranks.sort((one, other) => one - other);
      expect(citations.low[work]).toBe(Math.min(sorted[Math.ceil(0.025 * 256) - 1], citationRank[work]));
      expect(citations.high[work]).toBe(Math.max(sorted[Math.ceil(0.975 * 256) - 1], citationRank[work]));
    });
  });
});
