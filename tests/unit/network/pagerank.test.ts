import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { transposeNetwork } from '@/lib/network/compressed-rows';
import { computeHits } from '@/lib/network/hits';
import { computePageRank } from '@/lib/network/pagerank';
import { ComponentPageRank } from '@/lib/network/pagerank-by-components';
import { type DirectedNetwork } from '@/lib/network/types';
import { networkOf, rawPairs, solveDense } from '@/tests/unit/network/made-networks';

/** p = d P'p + (d * dangling + 1 - d) / n, solved as a dense system. */
function solvePageRank({ size, offsets, targets }: DirectedNetwork, damping: number): number[] {
  const matrix = Array.from({ length: size }, (_, row) => Array.from({ length: size }, (_unused, column) => (row === column ? 1 : 0)));
  for (let work = 0; work < size; work += 1) {
    const references = offsets[work + 1] - offsets[work];
    if (references === 0) for (let row = 0; row < size; row += 1) matrix[row][work] -= damping / size;
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) matrix[targets[place]][work] -= damping / references;
  }
  return solveDense(matrix, new Array<number>(size).fill((1 - damping) / size));
}

function solveByComponents(network: DirectedNetwork, damping: number, drawn?: Uint32Array): Float64Array {
  const values = new Float64Array(network.size);
  new ComponentPageRank(network, transposeNetwork(network)).solve(damping, values, drawn);
  return values;
}

const largestGap = (one: ArrayLike<number>, other: ArrayLike<number>): number => Math.max(0, ...Array.from(one, (value, place) => Math.abs(value - other[place])));

describe('PageRank', () => {
  it('agrees with a dense linear solve on small random networks, both by iteration and by components', () => {
    fc.assert(
      fc.property(rawPairs, fc.constantFrom(0.5, 0.85), ({ size, pairs }, damping) => {
        const network = networkOf(size, pairs);
        const expected = solvePageRank(network, damping);
        expect(largestGap(computePageRank(network, { damping }).values, expected)).toBeLessThan(1e-10);
        expect(largestGap(solveByComponents(network, damping), expected)).toBeLessThan(1e-12);
      }),
    );
  });

  it('solves loops of every size from 2 to 70, with citations into and out of them', () => {
    for (let size = 2; size <= 70; size += 1) {
      const loop = Array.from({ length: size }, (_, work) => [work, (work + 1) % size] as const);
      const network = networkOf(size + 3, [...loop, [size, 0], [size, Math.floor(size / 2)], [1, size + 1], [size + 1, size + 2]]);
      for (const damping of [0.5, 0.85]) expect(largestGap(solveByComponents(network, damping), solvePageRank(network, damping)), `loop of ${size}`).toBeLessThan(1e-12);
    }
  });

  it('is the same for duplicate pairs and self-citations as without them', () => {
    const clean = networkOf(4, [[0, 1], [1, 2], [3, 1]]);
    const dirty = networkOf(4, [[0, 1], [0, 1], [1, 1], [1, 2], [3, 1], [3, 3]]);
    expect(computePageRank(dirty, { damping: 0.5 })).toEqual(computePageRank(clean, { damping: 0.5 }));
  });

  it('gives nothing for no works, all to a lone work, and equal shares without citations', () => {
    expect(computePageRank(networkOf(0, []), { damping: 0.5 })).toMatchObject({ values: new Float64Array(0), converged: true });
    expect([...computePageRank(networkOf(1, []), { damping: 0.5 }).values]).toEqual([1]);
    expect([...computePageRank(networkOf(4, []), { damping: 0.5 }).values]).toEqual([0.25, 0.25, 0.25, 0.25]);
    expect(solveByComponents(networkOf(0, []), 0.5).length).toBe(0);
    expect([...solveByComponents(networkOf(4, []), 0.5)]).toEqual([0.25, 0.25, 0.25, 0.25]);
  });

  it('says when it did not settle', () => {
    const result = computePageRank(networkOf(3, [[0, 1], [1, 2]]), { damping: 0.85, maximumIterations: 2 });
    expect(result).toMatchObject({ converged: false, iterations: 2 });
    expect(result.residual).toBeGreaterThan(1e-12);
  });

  it('refuses what has no answer', () => {
    const network = networkOf(2, [[0, 1]]);
    for (const damping of [0, 1, NaN]) expect(() => computePageRank(network, { damping })).toThrow('Damping');
    expect(() => computePageRank(network, { damping: 0.5, teleport: Float64Array.of(0, 0) })).toThrow('teleport');
    expect(() => computePageRank(network, { damping: 0.5, weights: Float64Array.of(-1) })).toThrow('positive');
  });

  it('counts a drawn list as often as it was drawn: y = 1 + d m y / k along the citations', () => {
    const network = networkOf(4, [[0, 1], [0, 2], [1, 2], [3, 2]]);
    const [y1, y2] = [1 + 0.5 * 2 * (1 / 2), 1 + 0.5 * 2 * (1 / 2) + 0.5 * 0 + 0.5 * 3];
    const total = 1 + y1 + y2 + 1;
    expect(largestGap(solveByComponents(network, 0.5, Uint32Array.of(2, 0, 0, 3)), [1 / total, y1 / total, y2 / total, 1 / total])).toBeLessThan(1e-15);
  });

  it('stays finite where drawn lists cite each other', () => {
    const values = solveByComponents(networkOf(3, [[0, 1], [1, 0], [1, 2]]), 0.85, Uint32Array.of(9, 9, 9));
    expect(values.every((value) => Number.isFinite(value) && value > 0)).toBe(true);
  });
});

describe('HITS', () => {
  it('gives zeros, and no claim to be unique, without citations', () => {
    for (const size of [0, 1, 3]) expect(computeHits(networkOf(size, []))).toMatchObject({ authorities: new Float64Array(size), hubs: new Float64Array(size), unique: false, singularValue: 0 });
  });

  it('gives fixed points: authorities follow hubs and hubs follow authorities', () => {
    fc.assert(
      fc.property(rawPairs, ({ size, pairs }) => {
        const network = networkOf(size, pairs);
        const { authorities, hubs, singularValue, converged } = computeHits(network);
        fc.pre(converged && network.targets.length > 0);
        const again = new Float64Array(size);
        for (let work = 0; work < size; work += 1) for (let place = network.offsets[work]; place < network.offsets[work + 1]; place += 1) again[network.targets[place]] += hubs[work];
        const sum = again.reduce((total, value) => total + value, 0);
        expect(singularValue).toBeGreaterThan(0);
        expect(largestGap(again.map((value) => value / sum), authorities)).toBeLessThan(1e-5);
      }),
    );
  });
});
