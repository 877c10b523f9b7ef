import { describe, expect, it } from 'vitest';

import { countCocitations } from '@/lib/network/cocitation';
import { type Rows } from '@/lib/network/compressed-rows';
import { countCouplings } from '@/lib/network/coupling';
import { everyPair, type PairCounts } from '@/lib/network/pair-counts';
import { computeSimilarities } from '@/lib/network/similarity';
import { nameNetwork } from '@/tests/checks/network/named-network';
import checks from '@/tests/fixtures/checks/cocitation_similarity.json';

type NamedPair = (string | number)[];

function namePairs(pairs: PairCounts, names: string[], values: ArrayLike<number>): Map<string, number> {
  const named = new Map<string, number>();
  for (let item = 0; item < pairs.size; item += 1) {
    for (let place = pairs.offsets[item]; place < pairs.offsets[item + 1]; place += 1) named.set([names[item], names[pairs.partners[place]]].sort().join(' & '), values[place]);
  }
  return named;
}

const expectedPairs = (pairs: NamedPair[]): Map<string, number> => new Map(pairs.map(([one, other, count]) => [[String(one), String(other)].sort().join(' & '), Number(count)]));
const sumOf = (values: Iterable<number>): number => [...values].reduce((sum, value) => sum + value, 0);

describe.each(['small', 'unix_reversed', 'shells_reversed'] as const)('pairs of %s against igraph cocitation() and bibcoupling() (cocitation_similarity.json)', (key) => {
  const check = checks[key];
  const { network, names } = nameNetwork(check.edges_citing_to_cited as string[][]);
  const lists: Rows = { offsets: network.offsets, members: network.targets };
  const cocitations = countCocitations(lists, network.size, everyPair);
  const couplings = countCouplings(lists, network.size, everyPair);

  it('counts exactly their co-citations', () => {
    expect(namePairs(cocitations, names, cocitations.counts)).toEqual(expectedPairs(check.cocitation_pairs));
  });

  it('counts exactly their couplings', () => {
    expect(namePairs(couplings, names, couplings.counts)).toEqual(expectedPairs(check.coupling_pairs));
  });

  it('keeps the identities of the sums', () => {
    expect(sumOf(cocitations.counts)).toBe(check.sum_of_cocitations_identity.sum_over_citing_choose2);
    expect(sumOf(couplings.counts)).toBe(check.sum_of_couplings_identity.sum_over_cited_choose2);
    expect(sumOf(cocitations.strengths)).toBe(2 * sumOf(cocitations.counts));
    expect(sumOf(couplings.strengths)).toBe(2 * sumOf(couplings.counts));
  });

  it.each([
    ['co-citation', cocitations, check.cocitation_normalised_by_in_degree],
    ['coupling', couplings, check.coupling_normalised_by_out_degree],
  ] as const)('gives cosine and Jaccard of %s', (_name, pairs, expected) => {
    const cosine = namePairs(pairs, names, computeSimilarities(pairs, 'cosine'));
    const jaccard = namePairs(pairs, names, computeSimilarities(pairs, 'jaccard'));
    expect(expected.length).toBe(cosine.size);
    for (const [one, other, , values] of expected as [string, string, number, { cosine: number; jaccard: number }][]) {
      const pair = [one, other].sort().join(' & ');
      expect(cosine.get(pair)).toBeCloseTo(values.cosine, 11);
      expect(jaccard.get(pair)).toBeCloseTo(values.jaccard, 11);
    }
  });
});

describe('similarities of given tables (cocitation_similarity.json)', () => {
  const table = checks.association_strength_matrix;

  function pairsOfTable(occurrences: number[]): PairCounts {
    const offsets = [0];
    const partners: number[] = [];
    const counts: number[] = [];
    table.c.forEach((row, item) => {
      row.forEach((count, partner) => {
        if (partner <= item || count === 0) return;
        partners.push(partner);
        counts.push(count);
      });
      offsets.push(partners.length);
    });
    return { size: table.c.length, offsets: Uint32Array.from(offsets), partners: Uint32Array.from(partners), counts: Uint32Array.from(counts), occurrences: Uint32Array.from(occurrences), strengths: Float64Array.from(table.s), pairsMet: partners.length };
  }

  it.each([
    ['association-strength', table.ratio_observed_to_expected],
    ['cosine', table.cosine_with_row_sums_as_sizes],
    ['jaccard', table.jaccard_with_row_sums_as_sizes],
  ] as const)('gives %s as scipy does', (kind, expected) => {
    const pairs = pairsOfTable(table.s);
    const named = namePairs(pairs, ['w', 'x', 'y', 'z'], computeSimilarities(pairs, kind));
    for (const [one, other, value] of expected as [string, string, number][]) {
      if (value === 0) expect(named.has(`${one} & ${other}`)).toBe(false);
      else expect(named.get(`${one} & ${other}`)).toBeCloseTo(value, 11);
    }
  });

  it('gives Jaccard 0.4 and cosine 0.577350 for an overlap of 2 between sets of 4 and 3 (scipy.spatial.distance)', () => {
    const { x, y, jaccard, cosine } = checks.binary_vectors_scipy;
    const rows = [x, y].map((bits) => bits.flatMap((bit, place) => (bit === 1 ? [place] : [])));
    const lists: Rows = { offsets: Uint32Array.of(0, rows[0].length, rows[0].length + rows[1].length), members: Uint32Array.from(rows.flat()) };
    const pairs = countCouplings(lists, x.length, everyPair);
    expect(pairs.counts).toEqual(Uint32Array.of(2));
    expect(computeSimilarities(pairs, 'jaccard')[0]).toBeCloseTo(jaccard, 12);
    expect(computeSimilarities(pairs, 'cosine')[0]).toBeCloseTo(cosine, 11);
  });
});
