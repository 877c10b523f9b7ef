import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { countCocitations } from '@/lib/network/cocitation';
import { type Rows, type WeightedPairs } from '@/lib/network/compressed-rows';
import { countCouplings } from '@/lib/network/coupling';
import { everyPair, type PairCounts } from '@/lib/network/pair-counts';
import { capReferenceLists, renumberMembers } from '@/lib/network/reference-lists';
import { keepStrongestPairs } from '@/lib/network/strongest-links';
import { networkOf, rawPairs, weightedNetworks } from '@/tests/unit/network/made-networks';

const tripletsOf = ({ size, offsets, partners, counts }: PairCounts): string[] =>
  Array.from({ length: size }, (_, item) => Array.from(partners.subarray(offsets[item], offsets[item + 1]), (partner, place) => `${item} ${partner} ${counts[offsets[item] + place]}`))
    .flat()
    .sort();

const listsOf = (rows: number[][]): Rows => ({ offsets: Uint32Array.from([0, ...rows.map((_, row) => rows.slice(0, row + 1).flat().length)]), members: Uint32Array.from(rows.flat()) });

/** Counts by comparing every two works. */
function countDirectly(size: number, shared: (one: number, other: number) => number): string[] {
  const triplets: string[] = [];
  for (let one = 0; one < size; one += 1) for (let other = one + 1; other < size; other += 1) if (shared(one, other) > 0) triplets.push(`${one} ${other} ${shared(one, other)}`);
  return triplets.sort();
}

describe('pair counts', () => {
  it('equal a direct comparison of every two works', () => {
    fc.assert(
      fc.property(rawPairs, ({ size, pairs }) => {
        const { offsets, targets } = networkOf(size, pairs);
        const rows = Array.from({ length: size }, (_, work) => new Set(targets.subarray(offsets[work], offsets[work + 1])));
        const lists = { offsets, members: targets };
        expect(tripletsOf(countCocitations(lists, size, everyPair))).toEqual(countDirectly(size, (one, other) => rows.filter((row) => row.has(one) && row.has(other)).length));
        expect(tripletsOf(countCouplings(lists, size, everyPair))).toEqual(countDirectly(size, (one, other) => [...rows[one]].filter((target) => rows[other].has(target)).length));
      }),
    );
  });

  it('leave out pairs met once unless both works occur five times', () => {
    // Works 0 and 1 are cited together once and often apart; 2 and 3 once together and rarely; 4 and 5 twice together.
    const lists = listsOf([[0, 1], [0], [0], [0], [0], [1], [1], [1], [1], [2, 3], [4, 5], [4, 5]]);
    const pairs = countCocitations(lists, 6);
    expect(tripletsOf(pairs)).toEqual(['0 1 1', '4 5 2']);
    expect(pairs.pairsMet).toBe(3);
    expect([...pairs.strengths]).toEqual([1, 1, 1, 1, 2, 2]);
    expect([...pairs.occurrences]).toEqual([5, 5, 1, 1, 2, 2]);
  });

  it('are none without lists', () => {
    expect(tripletsOf(countCocitations(listsOf([]), 0))).toEqual([]);
    expect(tripletsOf(countCouplings(listsOf([[], []]), 3))).toEqual([]);
  });
});

describe('reference lists', () => {
  it('that are too long are left out and counted', () => {
    const capped = capReferenceLists(listsOf([[0, 1, 2], [3], [], [0, 1]]), 2);
    expect(capped).toEqual({ lists: listsOf([[], [3], [], [0, 1]]), skipped: 1 });
    expect(() => capReferenceLists(listsOf([[0]]), 0)).toThrow('at least 1');
  });

  it('keep only members with a number', () => {
    expect(renumberMembers(listsOf([[0, 1, 2], [1]]), Int32Array.of(0, -1, 1))).toEqual(listsOf([[0, 1], []]));
  });
});

describe('strongest pairs', () => {
  it('are those among the heaviest of either work, ties included', () => {
    fc.assert(
      fc.property(weightedNetworks, fc.integer({ min: 1, max: 4 }), ({ size, offsets, neighbours, weights }, strongest) => {
        const upper: [number, number, number][] = [];
        for (let work = 0; work < size; work += 1) for (let link = offsets[work]; link < offsets[work + 1]; link += 1) if (neighbours[link] > work) upper.push([work, neighbours[link], weights[link]]);
        const least = (work: number): number => [...weights.subarray(offsets[work], offsets[work + 1])].sort((a, b) => b - a)[strongest - 1] ?? 0;
        const expected = upper.filter(([one, other, weight]) => weight >= least(one) || weight >= least(other));
        const pairs: WeightedPairs = {
          size,
          offsets: Uint32Array.from({ length: size + 1 }, (_, work) => upper.filter(([one]) => one < work).length),
          partners: Uint32Array.from(upper, ([, other]) => other),
          weights: Float64Array.from(upper, ([, , weight]) => weight),
        };
        const kept = keepStrongestPairs(pairs, strongest);
        const found = Array.from(kept.partners, (partner, place) => [kept.offsets.findLastIndex((start) => start <= place), partner, kept.weights[place]]);
        expect(found).toEqual(expected);
      }),
    );
  });
});
