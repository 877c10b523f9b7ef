import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { comparePartitions } from '@/lib/network/agreement';
import { clusterRepeatedly, type ClusteringChoice } from '@/lib/network/clustering';
import { computeConductance } from '@/lib/network/conductance';
import { numberBySize, splitDisconnectedGroups } from '@/lib/network/connected-groups';
import { clusterByLeiden } from '@/lib/network/leiden';
import { clusterByLouvain } from '@/lib/network/louvain';
import { computeModularity } from '@/lib/network/modularity';
import { type WeightedNetwork } from '@/lib/network/types';
import { weightedNetworks, weightedOf } from '@/tests/unit/network/made-networks';

/** Modularity by its definition over all pairs: sum of (w_ij - g s_i s_j / 2M) / 2M where i and j share a group. */
function modularityOverPairs({ size, offsets, neighbours, weights }: WeightedNetwork, groups: Int32Array, resolution: number): number | null {
  const dense = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  for (let work = 0; work < size; work += 1) for (let link = offsets[work]; link < offsets[work + 1]; link += 1) dense[work][neighbours[link]] = weights[link];
  const strengths = dense.map((row) => row.reduce((sum, weight) => sum + weight, 0));
  const total = strengths.reduce((sum, strength) => sum + strength, 0);
  if (total === 0) return null;
  let quality = 0;
  for (let one = 0; one < size; one += 1) for (let other = 0; other < size; other += 1) if (groups[one] === groups[other]) quality += (dense[one][other] - (resolution * strengths[one] * strengths[other]) / total) / total;
  return quality;
}

const resolutions = fc.constantFrom(0.3, 1, 2.5);

describe.each([
  ['Leiden', clusterByLeiden],
  ['Louvain', clusterByLouvain],
])('%s', (_name, method) => {
  it('leaves every group connected, numbers groups by their first work and repeats for a seed', () => {
    fc.assert(
      fc.property(weightedNetworks, resolutions, fc.integer({ min: 0, max: 2 ** 32 - 1 }), (network, resolution, seed) => {
        const { groups, count } = method(network, resolution, seed);
        expect(splitDisconnectedGroups(network, groups)).toEqual({ groups, count, split: 0 });
        expect([...new Set(groups)]).toEqual(Array.from({ length: count }, (_, number) => number));
        expect(method(network, resolution, seed).groups).toEqual(groups);
      }),
      { numRuns: 300 },
    );
  });

  it('is no worse than everything apart, and no worse than everything together where that hangs together', () => {
    fc.assert(
      fc.property(weightedNetworks, resolutions, (network, resolution) => {
        const quality = computeModularity(network, method(network, resolution, 1).groups, resolution);
        fc.pre(quality !== null);
        const apart = computeModularity(network, new Int32Array(network.size).fill(-1), resolution) as number;
        expect(quality as number).toBeGreaterThanOrEqual(apart - 1e-12);
      }),
    );
  });

  it('finds two cliques joined by one link', () => {
    const links: [number, number, number][] = [[0, 5, 1]];
    for (const first of [0, 5]) for (let one = first; one < first + 5; one += 1) for (let other = one + 1; other < first + 5; other += 1) links.push([one, other, 1]);
    expect([...method(weightedOf(10, links), 1, 1).groups]).toEqual([0, 0, 0, 0, 0, 1, 1, 1, 1, 1]);
  });

  it('keeps works without links apart and takes empty networks', () => {
    expect([...method(weightedOf(4, [[1, 2, 1]]), 1, 1).groups]).toEqual([0, 1, 1, 2]);
    expect(method(weightedOf(0, []), 1, 1).count).toBe(0);
    expect(method(weightedOf(1, []), 1, 1).count).toBe(1);
    expect([...method(weightedOf(3, []), 1, 1).groups]).toEqual([0, 1, 2]);
  });

  it('does not care about the scale of the weights', () => {
    fc.assert(
      fc.property(weightedNetworks, fc.integer({ min: 0, max: 99 }), (network, seed) => {
        const scaled = { ...network, weights: network.weights.map((weight) => weight * 1024) };
        expect(method(scaled, 1, seed).groups).toEqual(method(network, 1, seed).groups);
      }),
    );
  });
});

describe('Leiden', () => {
  it('leaves no work that would gain by moving to a neighbouring group', () => {
    fc.assert(
      fc.property(weightedNetworks, resolutions, (network, resolution) => {
        const { groups, stable } = clusterByLeiden(network, resolution, 5);
        fc.pre(stable);
        const quality = computeModularity(network, groups, resolution);
        fc.pre(quality !== null);
        for (let work = 0; work < network.size; work += 1) {
          for (let link = network.offsets[work]; link < network.offsets[work + 1]; link += 1) {
            const moved = groups.slice();
            moved[work] = groups[network.neighbours[link]];
            expect(computeModularity(network, moved, resolution) as number).toBeLessThanOrEqual((quality as number) + 1e-9);
          }
        }
      }),
    );
  });
});

describe('modularity', () => {
  it('equals its definition over all pairs', () => {
    fc.assert(
      fc.property(weightedNetworks, resolutions, fc.infiniteStream(fc.integer({ min: 0, max: 3 })), (network, resolution, stream) => {
        const groups = Int32Array.from({ length: network.size }, () => stream.next().value as number);
        const [found, expected] = [computeModularity(network, groups, resolution), modularityOverPairs(network, groups, resolution)];
        if (expected === null) expect(found).toBeNull();
        else expect(found).toBeCloseTo(expected, 12);
      }),
    );
  });
});

describe('agreement of partitions', () => {
  const partitions = fc.integer({ min: 0, max: 9 }).chain((size) => fc.tuple(fc.array(fc.integer({ min: 0, max: 3 }), { minLength: size, maxLength: size }), fc.array(fc.integer({ min: 0, max: 3 }), { minLength: size, maxLength: size })));

  it('gives the adjusted Rand index of counting all pairs', () => {
    fc.assert(
      fc.property(partitions, ([one, other]) => {
        let [both, first, second, all] = [0, 0, 0, 0];
        for (let a = 0; a < one.length; a += 1) {
          for (let b = a + 1; b < one.length; b += 1) {
            all += 1;
            if (one[a] === one[b]) first += 1;
            if (other[a] === other[b]) second += 1;
            if (one[a] === one[b] && other[a] === other[b]) both += 1;
          }
        }
        const expected = all === 0 ? 0 : (first * second) / all;
        const spread = (first + second) / 2 - expected;
        expect(comparePartitions(Int32Array.from(one), Int32Array.from(other)).adjustedRand).toBeCloseTo(spread === 0 ? 1 : (both - expected) / spread, 12);
      }),
    );
  });

  it('is symmetric, and whole for a partition and itself', () => {
    fc.assert(
      fc.property(partitions, ([one, other]) => {
        const [left, right] = [Int32Array.from(one), Int32Array.from(other)];
        const [there, back] = [comparePartitions(left, right), comparePartitions(right, left)];
        expect(there.adjustedRand).toBeCloseTo(back.adjustedRand, 12);
        expect(there.normalisedMutualInformation).toBeCloseTo(back.normalisedMutualInformation, 12);
        expect(there.variationOfInformation).toBeCloseTo(back.variationOfInformation, 12);
        const same = comparePartitions(left, left);
        expect(same.adjustedRand).toBe(1);
        expect(same.normalisedMutualInformation).toBeCloseTo(1, 12);
        expect(same.variationOfInformation).toBeCloseTo(0, 12);
      }),
    );
  });
});

describe('conductance', () => {
  it('is 0 for a sealed group and undefined where there is no other side', () => {
    const network = weightedOf(5, [[0, 1, 2], [2, 3, 1]]);
    expect(computeConductance(network, Int32Array.of(0, 0, 1, 1, 2), 3)).toEqual([0, 0, null]);
    expect(computeConductance(network, new Int32Array(5), 1)).toEqual([null]);
  });
});

describe('repeated clustering', () => {
  const choice: ClusteringChoice = { clustering: 'leiden', resolution: 1, repeats: 8 };

  it('publishes the best of its repeats and how firm each work is', () => {
    // A ring of twelve works can be cut into arcs in several ways that are equally good.
    const network = weightedOf(12, Array.from({ length: 12 }, (_, work) => [work, (work + 1) % 12, 1] as const));
    const clustering = clusterRepeatedly(network, { ...choice, repeats: 30 }, 1);
    expect(clustering.modularity).toBeCloseTo(computeModularity(network, clustering.groups, 1) as number, 12);
    expect(clustering.agreementMinimum as number).toBeLessThan(1);
    expect(clustering.agreementMinimum as number).toBeLessThanOrEqual(clustering.agreementMean as number);
    expect(Math.min(...clustering.firmness)).toBeLessThan(1);
    for (const value of clustering.firmness) expect(value >= 0 && value <= 1).toBe(true);
  });

  it('gives whole firmness and agreement where every repeat finds the same', () => {
    const clustering = clusterRepeatedly(weightedOf(6, [[0, 1, 1], [0, 2, 1], [1, 2, 1], [3, 4, 1], [3, 5, 1], [4, 5, 1]]), choice, 1);
    expect([...clustering.firmness]).toEqual([1, 1, 1, 1, 1, 1]);
    expect([clustering.agreementMean, clustering.agreementMinimum]).toEqual([1, 1]);
  });

  it('has no agreement with one repeat and no firmness for a work alone', () => {
    const clustering = clusterRepeatedly(weightedOf(3, [[0, 1, 1]]), { ...choice, repeats: 1 }, 1);
    expect([clustering.agreementMean, clustering.agreementMinimum]).toEqual([null, null]);
    expect([...clustering.firmness]).toEqual([1, 1, NaN]);
  });
});

describe('numbering of clusters', () => {
  it('goes by size, ties by the smallest work, and leaves small groups out', () => {
    const { groups, sizes } = numberBySize(Int32Array.of(0, 1, 1, 1, 2, 2, 2, 0, 3, 3, 3, 3), 4, 3);
    expect([...groups]).toEqual([-1, 1, 1, 1, 2, 2, 2, -1, 0, 0, 0, 0]);
    expect(sizes).toEqual([4, 3, 3]);
  });
});
