import { describe, expect, it } from 'vitest';

import { transposeNetwork } from '@/lib/network/compressed-rows';
import { computeHits } from '@/lib/network/hits';
import { computePageRank } from '@/lib/network/pagerank';
import { ComponentPageRank } from '@/lib/network/pagerank-by-components';
import { rankDescending } from '@/lib/network/ranks';
import { nameNetwork, type NamedNetwork } from '@/tests/checks/network/named-network';
import graphs from '@/tests/fixtures/checks/graphs.json';
import indicators from '@/tests/fixtures/checks/indicators.json';
import ranking from '@/tests/fixtures/checks/ranking.json';

type Values = Record<string, number>;

const reversed = (edges: readonly (readonly string[])[]): string[][] => edges.map(([from, to]) => [to, from]);
const bothWays = (edges: readonly (readonly string[])[]): string[][] => edges.flatMap(([one, other]) => [[one, other], [other, one]]);

const eleven = nameNetwork(ranking.pagerank_eleven_pages.edges_citing_to_cited, [...'ABCDEFGHIJK']);
const three = nameNetwork(ranking.pagerank_three_works.edges_citing_to_cited);
const unix = nameNetwork(reversed(graphs.unix.edges), graphs.unix.nodes);
const shells = nameNetwork(reversed(graphs.shells.edges), graphs.shells.nodes);
const karate = nameNetwork(bothWays(graphs.karate.edges), graphs.karate.nodes);

function expectValues({ numberOf }: NamedNetwork, values: Float64Array, expected: Values, tolerance: number): void {
  for (const [name, value] of Object.entries(expected)) expect(Math.abs(values[numberOf(name)] - value), name).toBeLessThan(tolerance);
}

describe('PageRank against networkx 2.8.8, igraph 0.10.2 and a scipy linear solve (ranking.json)', () => {
  const cases: [string, NamedNetwork, { damping: number; networkx: Values; igraph_prpack: Values; scipy_closed_form: Values }][] = [
    ['eleven pages', eleven, ranking.pagerank_eleven_pages],
    ['three works', three, ranking.pagerank_three_works],
    ['unix family', unix, ranking.pagerank_unix_reversed],
    ['unix family', unix, ranking.pagerank_unix_reversed_d050],
    ['shells', shells, ranking.pagerank_shells_reversed],
    ['shells', shells, ranking.pagerank_shells_reversed_d050],
    ['karate club, links both ways', karate, ranking.pagerank_karate],
  ];
  it.each(cases)('gives their values for %s', (_name, named, check) => {
    const result = computePageRank(named.network, { damping: check.damping });
    expect(result.converged).toBe(true);
    expect(result.residual).toBeLessThan(1e-12);
    for (const expected of [check.networkx, check.igraph_prpack, check.scipy_closed_form]) expectValues(named, result.values, expected, 1e-8);
  });

  it.each(cases)('solves %s by components to the same values', (_name, named, check) => {
    const values = new Float64Array(named.network.size);
    new ComponentPageRank(named.network, transposeNetwork(named.network)).solve(check.damping, values);
    expectValues(named, values, check.scipy_closed_form, 1.1e-12);
    const iterated = computePageRank(named.network, { damping: check.damping, tolerance: 1e-15 }).values;
    values.forEach((value, work) => expect(Math.abs(value - iterated[work])).toBeLessThan(1e-12));
  });

  it('gives the printed percentages of the eleven-page example', () => {
    const { values } = computePageRank(eleven.network, { damping: 0.85 });
    for (const [name, percent] of Object.entries(ranking.pagerank_eleven_pages.printed_percent)) expect(Math.round(values[eleven.numberOf(name)] * 1000) / 10).toBe(percent);
  });

  it('gives the exact fractions 800, 1140 and 2109 of 4049 for three works', () => {
    const { values } = computePageRank(three.network, { damping: 0.85 });
    [800, 1140, 2109].forEach((share, place) => expect(values[three.numberOf(place + 1)]).toBeCloseTo(share / 4049, 11));
  });

  it('lets dangling mass follow a teleport vector that is not uniform, and weighs links', () => {
    const check = ranking.pagerank_weighted_personalised;
    const named = nameNetwork(check.edges);
    const weights = new Float64Array(check.edges.length);
    for (const [citing, cited, weight] of check.edges) {
      const row = named.numberOf(citing);
      const place = named.network.targets.subarray(named.network.offsets[row], named.network.offsets[row + 1]).indexOf(named.numberOf(cited));
      weights[named.network.offsets[row] + place] = Number(weight);
    }
    const teleport = Float64Array.from(named.names, (name) => (check.teleport as Values)[name]);
    const { values } = computePageRank(named.network, { damping: 0.85, weights, teleport });
    expectValues(named, values, check.networkx, 1e-8);
    expectValues(named, values, check.scipy_closed_form_dangling_follows_teleport, 1e-8);
    expect(Math.abs(values[named.numberOf('a')] - check.scipy_closed_form_dangling_uniform.a)).toBeGreaterThan(0.01);
  });

  it.each([0.5, 0.85])('keeps the order of the unix family when the tolerance is tightened tenfold at damping %s', (damping) => {
    const usual = rankDescending(computePageRank(unix.network, { damping }).values);
    const tighter = rankDescending(computePageRank(unix.network, { damping, tolerance: 1e-13 }).values);
    expect(usual).toEqual(tighter);
  });
});

describe('HITS against networkx 2.8.8, igraph 0.10.2 and numpy (ranking.json)', () => {
  it.each([
    ['eleven pages', eleven, ranking.hits_eleven_pages],
    ['shells', shells, ranking.hits_shells_reversed],
    ['small graph', nameNetwork(ranking.hits_small.edges_citing_to_cited), ranking.hits_small],
  ] as const)('gives their authorities, hubs and singular value for %s', (_name, named, check) => {
    const result = computeHits(named.network);
    expect(result.converged).toBe(true);
    expect(result.unique).toBe(true);
    expectValues(named, result.authorities, check.networkx_authority_sum1, 1e-8);
    expectValues(named, result.hubs, check.networkx_hub_sum1, 1e-8);
    expect(result.singularValue).toBeCloseTo(check.largest_singular_values[0], 8);
    const most = Math.max(...result.authorities);
    expectValues(named, result.authorities.map((value) => value / most), check.igraph_authority_max1, 1e-8);
  });

  it('says that two equal blocks leave the answer to the start', () => {
    const named = nameNetwork(ranking.hits_tie_of_eigenvalues.edges as string[][]);
    const result = computeHits(named.network);
    expect(result.unique).toBe(false);
    expectValues(named, result.authorities, { x: 0.5, y: 0.5 }, 1e-8);
  });
});

describe('ranks', () => {
  it('are competition ranks (indicators.json: ranking_ties, scipy)', () => {
    expect([...rankDescending(indicators.ranking_ties.values)]).toEqual(indicators.ranking_ties.competition_min);
  });
});
