import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { findStrongComponents, findWeakComponents } from '@/lib/network/components';
import { networkOf, rawPairs, reaches } from '@/tests/unit/network/made-networks';

describe('components', () => {
  it('are strong where works reach each other, numbered from the cited side', () => {
    fc.assert(
      fc.property(rawPairs, ({ size, pairs }) => {
        const network = networkOf(size, pairs);
        const { component, sizes, count } = findStrongComponents(network);
        for (let one = 0; one < size; one += 1) {
          for (let other = 0; other < size; other += 1) expect(component[one] === component[other]).toBe(reaches(network, one, other) && reaches(network, other, one));
          for (let place = network.offsets[one]; place < network.offsets[one + 1]; place += 1) expect(component[network.targets[place]]).toBeLessThanOrEqual(component[one]);
        }
        expect(sizes.reduce((sum, works) => sum + works, 0)).toBe(size);
        expect(new Set(component).size).toBe(count);
      }),
    );
  });

  it('are weak where works hang together in either direction, numbered by their smallest work', () => {
    fc.assert(
      fc.property(rawPairs, ({ size, pairs }) => {
        const network = networkOf(size, pairs);
        const both = networkOf(size, [...pairs, ...pairs.map(([one, other]) => [other, one] as const)]);
        const { component, count } = findWeakComponents(size, network.offsets, network.targets);
        for (let one = 0; one < size; one += 1) for (let other = 0; other < size; other += 1) expect(component[one] === component[other]).toBe(reaches(both, one, other));
        expect([...new Set(component)]).toEqual(Array.from({ length: count }, (_, number) => number));
      }),
    );
  });

  it('of an empty network are none, of a lone work one', () => {
    expect(findStrongComponents(networkOf(0, [])).count).toBe(0);
    expect(findWeakComponents(0, Uint32Array.of(0), new Uint32Array(0)).count).toBe(0);
    expect(findStrongComponents(networkOf(1, [[0, 0]])).sizes).toEqual(Uint32Array.of(1));
  });

  it('follow a chain of 200,000 citations without running out of stack', () => {
    const size = 200_000;
    const chain = networkOf(size, Array.from({ length: size - 1 }, (_, work) => [work, work + 1] as const));
    expect(findStrongComponents(chain).count).toBe(size);
    expect(findWeakComponents(size, chain.offsets, chain.targets).count).toBe(1);
  });
});
