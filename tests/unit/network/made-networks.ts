import fc from 'fast-check';

import { buildNetwork, buildWeightedNetwork } from '@/lib/network/compressed-rows';
import { type DirectedNetwork, type WeightedNetwork } from '@/lib/network/types';

export const networkOf = (size: number, pairs: readonly (readonly [number, number])[]): DirectedNetwork => buildNetwork(size, pairs.map(([citing]) => citing), pairs.map(([, cited]) => cited)).network;

/** Small sizes with pairs in any order, duplicates and self-links among them. */
export const rawPairs = fc.integer({ min: 1, max: 9 }).chain((size) =>
  fc.record({ size: fc.constant(size), pairs: fc.array(fc.tuple(fc.integer({ min: 0, max: size - 1 }), fc.integer({ min: 0, max: size - 1 })), { maxLength: 40 }) }),
);

export function weightedOf(size: number, links: readonly (readonly [number, number, number])[]): WeightedNetwork {
  const weights = new Map<number, number>();
  for (const [one, other, weight] of links) if (one !== other) weights.set(Math.min(one, other) * size + Math.max(one, other), weight);
  const places = [...weights.keys()].sort((a, b) => a - b);
  const offsets = new Uint32Array(size + 1);
  for (const place of places) offsets[Math.floor(place / size) + 1] += 1;
  for (let node = 0; node < size; node += 1) offsets[node + 1] += offsets[node];
  return buildWeightedNetwork({ size, offsets, partners: Uint32Array.from(places, (place) => place % size), weights: Float64Array.from(places, (place) => weights.get(place) as number) });
}

/** Small weighted networks; few distinct weights, so that ties are common. */
export const weightedNetworks = fc.integer({ min: 1, max: 14 }).chain((size) =>
  fc
    .array(fc.tuple(fc.integer({ min: 0, max: size - 1 }), fc.integer({ min: 0, max: size - 1 }), fc.constantFrom(0.5, 1, 1, 2, 7)), { maxLength: 60 })
    .map((links) => weightedOf(size, links)),
);

/** Whether `to` can be reached from `from` by following links. */
export function reaches({ offsets, targets }: DirectedNetwork, from: number, to: number): boolean {
  const seen = new Set([from]);
  const open = [from];
  for (let work = open.pop(); work !== undefined; work = open.pop()) {
    if (work === to) return true;
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) {
      if (!seen.has(targets[place])) {
        seen.add(targets[place]);
        open.push(targets[place]);
      }
    }
  }
  return false;
}

/** Solves a small dense system by elimination with pivoting: an independent answer for PageRank. */
export function solveDense(matrix: number[][], right: number[]): number[] {
  const rows = matrix.map((row, number) => [...row, right[number]]);
  const size = rows.length;
  for (let column = 0; column < size; column += 1) {
    let pivot = column;
    for (let row = column; row < size; row += 1) if (Math.abs(rows[row][column]) > Math.abs(rows[pivot][column])) pivot = row;
    [rows[column], rows[pivot]] = [rows[pivot], rows[column]];
    for (let row = 0; row < size; row += 1) {
      if (row === column) continue;
      const factor = rows[row][column] / rows[column][column];
      for (let place = column; place <= size; place += 1) rows[row][place] -= factor * rows[column][place];
    }
  }
  return rows.map((row, number) => row[size] / row[number]);
}
