import { describe, expect, it } from 'vitest';

import { comparePartitions, countGroups } from '@/lib/network/agreement';
import { measureFirmness } from '@/lib/network/clustering';
import { computeConductance } from '@/lib/network/conductance';
import { splitDisconnectedGroups } from '@/lib/network/connected-groups';
import { clusterByLeiden } from '@/lib/network/leiden';
import { clusterByLouvain } from '@/lib/network/louvain';
import { computeModularity } from '@/lib/network/modularity';
import { type WeightedNetwork } from '@/lib/network/types';
import { weighNetwork } from '@/tests/checks/network/named-network';
import checks from '@/tests/fixtures/checks/communities.json';
import graphs from '@/tests/fixtures/checks/graphs.json';

const karate = weighNetwork(graphs.karate.nodes, graphs.karate.edges).network;
const davis = weighNetwork(graphs.davis.nodes, graphs.davis.edges).network;
const florentine = weighNetwork(graphs.florentine.nodes, graphs.florentine.edges).network;
const lesmis = weighNetwork(graphs.lesmis.nodes, graphs.lesmis.edges as (string | number)[][]).network;
const lesmisWeighted = weighNetwork(graphs.lesmis.nodes, graphs.lesmis.edges as (string | number)[][], true).network;
const optimum = Int32Array.from(checks.karate.optimal_modularity.membership);
const club = Int32Array.from(checks.karate.club_split.membership);
const modularity = (network: WeightedNetwork, groups: Int32Array, resolution = 1): number => computeModularity(network, groups, resolution) as number;

/** Cliques in a ring, each joined to the next by one link. */
function ringOfCliques(cliques: number, size: number): { network: WeightedNetwork; single: Int32Array; paired: Int32Array } {
  const nodes = Array.from({ length: cliques * size }, (_, node) => node);
  const links: number[][] = [];
  for (let clique = 0; clique < cliques; clique += 1) {
    for (let one = 0; one < size; one += 1) for (let other = one + 1; other < size; other += 1) links.push([clique * size + one, clique * size + other]);
    links.push([clique * size, ((clique + 1) % cliques) * size + 1]);
  }
  return { network: weighNetwork(nodes, links).network, single: Int32Array.from(nodes, (node) => Math.floor(node / size)), paired: Int32Array.from(nodes, (node) => Math.floor(node / (2 * size))) };
}

describe('modularity against igraph 0.10.2 and networkx 2.8.8 (communities.json)', () => {
  it('gives 0.4197896 for the best partition of the karate club, 0.3582347 for its split, and the values of the trivial ones', () => {
    expect(modularity(karate, optimum)).toBeCloseTo(checks.karate.optimal_modularity.value, 11);
    expect(modularity(karate, club)).toBeCloseTo(checks.karate.club_split.modularity_igraph, 11);
    expect(modularity(karate, new Int32Array(34))).toBeCloseTo(checks.karate.everything_in_one, 11);
    expect(modularity(karate, Int32Array.from({ length: 34 }, (_, node) => node))).toBeCloseTo(checks.karate.all_singletons, 11);
    expect(modularity(karate, new Int32Array(34).fill(-1))).toBeCloseTo(checks.karate.all_singletons, 11);
  });

  it.each(Object.entries(checks.karate.resolution))('obeys the resolution %s', (resolution, expected) => {
    expect(modularity(karate, optimum, Number(resolution))).toBeCloseTo(expected.optimal4_igraph, 11);
    expect(modularity(karate, club, Number(resolution))).toBeCloseTo(expected.club_networkx, 11);
  });

  it.each([
    [30, 5, checks.ring_of_30_cliques_of_5],
    [10, 5, checks.ring_of_10_cliques_of_5],
    [24, 3, checks.ring_of_24_cliques_of_3],
  ])('gives the values of a ring of %s cliques of %s', (cliques, size, expected) => {
    const ring = ringOfCliques(cliques, size);
    expect(modularity(ring.network, ring.single)).toBeCloseTo(expected.Q_each_clique, 11);
    expect(modularity(ring.network, ring.paired)).toBeCloseTo(expected.Q_pairs_of_cliques, 11);
  });
});

describe('Leiden and Louvain against exact optima and the ranges of igraph (communities.json)', () => {
  const cases: [string, WeightedNetwork, number, number, { min: number }][] = [
    ['karate club', karate, 100, checks.karate.optimal_modularity.value, checks.karate.heuristics.leiden_igraph],
    ['Davis southern women', davis, 60, checks.davis.optimal_modularity, checks.davis.heuristics_unweighted.leiden_igraph],
    ['Florentine marriages', florentine, 60, checks.florentine.optimal_modularity, checks.florentine.heuristics_unweighted.leiden_igraph],
    ['Les Miserables', lesmis, 60, checks.lesmis.optimal_modularity_exact.unweighted, checks.lesmis.heuristics_unweighted.leiden_igraph],
    ['Les Miserables, weighted', lesmisWeighted, 60, checks.lesmis.optimal_modularity_exact.weighted_by_chapters, checks.lesmis.heuristics_weighted.leiden_igraph],
  ];
  it.each(cases)('Leiden reaches the optimum of %s, never passes it, and leaves every group connected', (_name, network, seeds, best, range) => {
    let highest = -1;
    for (let seed = 1; seed <= seeds; seed += 1) {
      const { groups, count, stable } = clusterByLeiden(network, 1, seed);
      const quality = modularity(network, groups);
      expect(stable).toBe(true);
      expect(quality).toBeLessThan(best + 1e-9);
      expect(quality).toBeGreaterThan(range.min - 0.02);
      expect(splitDisconnectedGroups(network, groups).count).toBe(count);
      highest = Math.max(highest, quality);
    }
    expect(highest).toBeCloseTo(best, 9);
  });

  it.each(cases)('Louvain stays within reach of the optimum of %s and leaves every group connected', (_name, network, seeds, best, range) => {
    let highest = -1;
    for (let seed = 1; seed <= seeds; seed += 1) {
      const { groups, count } = clusterByLouvain(network, 1, seed);
      const quality = modularity(network, groups);
      expect(quality).toBeLessThan(best + 1e-9);
      expect(quality).toBeGreaterThan(range.min - 0.05);
      expect(splitDisconnectedGroups(network, groups).count).toBe(count);
      highest = Math.max(highest, quality);
    }
    expect(highest).toBeGreaterThan(best - 0.005);
  });

  it('joins neighbouring cliques of a ring of 30 at resolution 1 and keeps them apart at 3', () => {
    const { network, single } = ringOfCliques(30, 5);
    const coarse = Math.max(...[1, 2, 3, 4, 5, 6, 7, 8].map((seed) => modularity(network, clusterByLeiden(network, 1, seed).groups)));
    expect(coarse).toBeGreaterThan(checks.ring_of_30_cliques_of_5.Q_each_clique);
    expect(coarse).toBeLessThanOrEqual(checks.ring_of_30_cliques_of_5.Q_pairs_of_cliques + 1e-9);
    expect(comparePartitions(clusterByLeiden(network, 3, 1).groups, single).adjustedRand).toBe(1);
  });
});

describe('agreement of partitions against igraph compare_communities (communities.json)', () => {
  it.each([
    ['small', checks.compare_small],
    ['relabelled copy', checks.compare_identical_relabelled],
    ['karate optimum and club', checks.compare_karate_best_vs_club],
  ])('gives ARI, NMI and VI of the case: %s', (_name, check) => {
    const agreement = comparePartitions(Int32Array.from(check.x), Int32Array.from(check.y));
    expect(agreement.adjustedRand).toBeCloseTo(check.igraph.adjusted_rand, 11);
    expect(agreement.normalisedMutualInformation).toBeCloseTo(check.igraph.nmi, 11);
    expect(agreement.variationOfInformation).toBeCloseTo(check.igraph.vi, 11);
  });

  it('averages co-assignment into the firmness of works', () => {
    const partitions = checks.coassignment.partitions.map((groups) => Int32Array.from(groups));
    const firmness = measureFirmness(partitions[0], partitions);
    firmness.forEach((value, work) => {
      const mates = partitions[0].reduce<number[]>((list, group, other) => (other !== work && group === partitions[0][work] ? [...list, checks.coassignment.share_same_group[work][other]] : list), []);
      expect(value).toBeCloseTo(mates.reduce((sum, share) => sum + share, 0) / mates.length, 11);
    });
  });
});

describe('conductance against networkx (communities.json)', () => {
  it('gives 11/75 for both sides of the club', () => {
    computeConductance(karate, club, 2).forEach((value) => expect(value).toBeCloseTo(checks.conductance_karate_club.networkx, 11));
  });

  it('gives the values of the four best groups', () => {
    const conductance = computeConductance(karate, optimum, countGroups(optimum));
    for (const { group, conductance: expected } of checks.conductance_karate_best4) expect(conductance[optimum[group[0]]]).toBeCloseTo(expected, 11);
  });
});
