import { describe, expect, it } from 'vitest';

import { createRandom, deriveSeed, shuffle } from '@/lib/network/random';

describe('seeded random numbers', () => {
  it('repeat for a seed and differ between seeds', () => {
    const draw = (seed: number): number[] => {
      const random = createRandom(seed);
      return Array.from({ length: 5 }, () => random.next());
    };
    expect(draw(1)).toEqual(draw(1));
    expect(draw(1)).not.toEqual(draw(2));
    expect(draw(1)).toEqual(draw(1 + 2 ** 32));
  });

  it('spread evenly over a bound', () => {
    const random = createRandom(7);
    const counts = new Array<number>(10).fill(0);
    for (let draw = 0; draw < 100_000; draw += 1) counts[random.below(10)] += 1;
    // Four standard deviations of a binomial count: 4 * sqrt(100000 * 0.1 * 0.9) = 380.
    for (const count of counts) expect(Math.abs(count - 10_000)).toBeLessThan(380);
  });

  it('shuffle into a permutation that every seed settles', () => {
    const shuffled = (seed: number): number[] => {
      const items = Int32Array.from({ length: 50 }, (_, place) => place);
      shuffle(items, createRandom(seed));
      return [...items];
    };
    expect(shuffled(3)).toEqual(shuffled(3));
    expect(shuffled(3)).not.toEqual(shuffled(4));
    expect([...shuffled(3)].sort((a, b) => a - b)).toEqual(Array.from({ length: 50 }, (_, place) => place));
  });

  it('derive seeds that depend on every part of a strand', () => {
    const seeds = [deriveSeed(1), deriveSeed(1, 0), deriveSeed(1, 1), deriveSeed(2, 1), deriveSeed(1, 0, 0), deriveSeed(1, 0, 1), deriveSeed(1, 1, 0)];
    expect(new Set(seeds).size).toBe(seeds.length);
  });
});
