import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { percentilesWithin } from '@/lib/evaluation/percentiles';

describe('percentiles within groups', () => {
  it('count works below and half of the ties, group by group', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.integer({ min: 0, max: 4 }), fc.constantFrom(2001, 2002, null))), (items) => {
        const percentiles = percentilesWithin(items.map(([value]) => value), items.map(([, year]) => year));
        items.forEach(([value, year], item) => {
          if (year === null) return expect(percentiles[item]).toBeNaN();
          const mates = items.filter(([, other]) => other === year).map(([other]) => other);
          const below = mates.filter((other) => other < value).length;
          const ties = mates.filter((other) => other === value).length;
          return expect(percentiles[item]).toBeCloseTo((100 * (below + ties / 2)) / mates.length, 10);
        });
      }),
    );
  });

  it('never reach 0 or 100: a work alone in its year stands at 50', () => {
    expect([...percentilesWithin([0], [1999])]).toEqual([50]);
    expect([...percentilesWithin([], [])]).toEqual([]);
    expect(() => percentilesWithin([1], [])).toThrow('1 values for 0 groups');
  });
});
