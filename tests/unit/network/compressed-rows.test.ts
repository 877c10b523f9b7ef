import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { buildNetwork, buildUndirectedNetwork, transposeNetwork } from '@/lib/network/compressed-rows';
import { countCitations, countReferences } from '@/lib/network/degrees';
import { networkOf, rawPairs, weightedNetworks } from '@/tests/unit/network/made-networks';

const rowsOf = (offsets: Uint32Array, members: Uint32Array): number[][] => Array.from({ length: offsets.length - 1 }, (_, row) => [...members.subarray(offsets[row], offsets[row + 1])]);

describe('building a network from pairs', () => {
  it('keeps each link once, in ascending rows, and accounts for every pair', () => {
    fc.assert(
      fc.property(rawPairs, ({ size, pairs }) => {
        const built = buildNetwork(size, pairs.map(([citing]) => citing), pairs.map(([, cited]) => cited));
        const expected = Array.from({ length: size }, (_, work) => [...new Set(pairs.filter(([citing, cited]) => citing === work && cited !== work).map(([, cited]) => cited))].sort((a, b) => a - b));
        expect(rowsOf(built.network.offsets, built.network.targets)).toEqual(expected);
        expect(built.selfLinks).toBe(pairs.filter(([citing, cited]) => citing === cited).length);
        expect(built.network.targets.length + built.duplicates + built.selfLinks).toBe(pairs.length);
      }),
    );
  });

  it('gives an empty network for no works', () => {
    expect(buildNetwork(0, [], [])).toEqual({ network: { size: 0, offsets: Uint32Array.of(0), targets: new Uint32Array(0) }, duplicates: 0, selfLinks: 0 });
  });

  it('names the citation that points outside the list of works', () => {
    expect(() => buildNetwork(2, [0, 1], [1, 2])).toThrow('Citation 1: its cited work is number 2, but there are only 2 works.');
    expect(() => buildNetwork(2, [5], [1])).toThrow('citing work is number 5');
    expect(() => buildNetwork(2, [0, 1], [1])).toThrow('2 citing but 1 cited');
  });

  it('turns round into who cites whom, and back into itself', () => {
    fc.assert(
      fc.property(rawPairs, ({ size, pairs }) => {
        const network = networkOf(size, pairs);
        const turned = transposeNetwork(network);
        const rows = rowsOf(turned.offsets, turned.targets);
        rows.forEach((row, work) => expect(row).toEqual([...new Set(pairs.filter(([citing, cited]) => cited === work && citing !== work).map(([citing]) => citing))].sort((a, b) => a - b)));
        expect(transposeNetwork(turned)).toEqual(network);
        expect(countCitations(network)).toEqual(countReferences(turned));
      }),
    );
  });

  it('reads citations without direction, 2 for works that cite each other', () => {
    const network = networkOf(4, [[0, 1], [1, 0], [1, 2], [0, 2]]);
    const undirected = buildUndirectedNetwork(network, transposeNetwork(network));
    expect(rowsOf(undirected.offsets, undirected.neighbours)).toEqual([[1, 2], [0, 2], [0, 1], []]);
    expect([...undirected.weights]).toEqual([2, 1, 2, 1, 1, 1]);
  });

  it('stores weighted pairs from both ends, neighbours ascending', () => {
    fc.assert(
      fc.property(weightedNetworks, ({ size, offsets, neighbours, weights }) => {
        for (let work = 0; work < size; work += 1) {
          for (let link = offsets[work]; link < offsets[work + 1]; link += 1) {
            if (link > offsets[work]) expect(neighbours[link]).toBeGreaterThan(neighbours[link - 1]);
            const other = neighbours[link];
            const back = neighbours.subarray(offsets[other], offsets[other + 1]).indexOf(work);
            expect(back).toBeGreaterThanOrEqual(0);
            expect(weights[offsets[other] + back]).toBe(weights[link]);
          }
        }
      }),
    );
  });
});
