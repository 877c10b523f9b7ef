import { createHash } from 'node:crypto';

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { analyseNetwork, engineVersion, serialiseInput, serialiseResult } from '@/lib/network/analysis';
import { letterOf } from '@/lib/network/basis-result';
import { generateNetwork } from '@/lib/network/generate';
import { createRandom } from '@/lib/network/random';
import { defaultParameters, type AnalysisInput, type AnalysisParameters, type AnalysisWorkInput } from '@/lib/network/types';

const silent = (): void => undefined;
/** Comparing digests: the bytes themselves are megabytes. */
const digest = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');
const digestResult = (input: AnalysisInput, parameters: AnalysisParameters): string => digest(serialiseResult(analyseNetwork(input, parameters, silent)));
const digestInput = (input: AnalysisInput, parameters: AnalysisParameters): string => digest(serialiseInput(input, parameters));
const quick: AnalysisParameters = { ...defaultParameters, repeats: 3, replicates: 10 };

function work(key: string, given: Partial<AnalysisWorkInput> = {}): AnalysisWorkInput {
  return { key, year: 2020, catalogued: true, title: `Title of ${key}`, keywords: [], ...given };
}

function inputOf(works: AnalysisWorkInput[], pairs: readonly (readonly [string, string])[]): AnalysisInput {
  const numbers = new Map(works.map(({ key }, number) => [key, number]));
  const numberOf = (key: string): number => numbers.get(key) as number;
  return { works, citing: Uint32Array.from(pairs, ([citing]) => numberOf(citing)), cited: Uint32Array.from(pairs, ([, cited]) => numberOf(cited)) };
}

/** The same input with works and citations in another order. */
function reorder(input: AnalysisInput, seed: number): AnalysisInput {
  const random = createRandom(seed);
  const shuffled = <T>(items: T[]): T[] => {
    for (let last = items.length - 1; last > 0; last -= 1) {
      const other = random.below(last + 1);
      [items[last], items[other]] = [items[other], items[last]];
    }
    return items;
  };
  const order = shuffled([...input.works.keys()]);
  const place = new Uint32Array(order.length);
  order.forEach((index, number) => {
    place[index] = number;
  });
  const pairs = shuffled([...input.citing.keys()]);
  return { works: order.map((index) => input.works[index]), citing: Uint32Array.from(pairs, (pair) => place[input.citing[pair]]), cited: Uint32Array.from(pairs, (pair) => place[input.cited[pair]]) };
}

const keysOf = (input: AnalysisInput, parameters: AnalysisParameters): string[] => [...analyseNetwork(input, parameters, silent).workIndex].map((index) => input.works[index].key);

describe('determinism of an analysis', () => {
  const input = generateNetwork({ works: 250, meanReferences: 8, outsideCitations: 1_500, seed: 3 });

  it.each(['leiden', 'louvain'] as const)('gives the same bytes again, and for works and citations in another order (%s)', (clustering) => {
    const parameters = { ...quick, clustering };
    const bytes = digestResult(input, parameters);
    expect(digestResult(input, parameters)).toEqual(bytes);
    for (const seed of [1, 2]) {
      const other = reorder(input, seed);
      expect(digestResult(other, parameters)).toEqual(bytes);
      expect(digestInput(other, parameters)).toBe(digestInput(input, parameters));
    }
  });

  it('gives other bytes for another seed, and tells every change of the input and the parameters', () => {
    const parameters = { ...quick };
    expect(digestResult(input, { ...parameters, seed: 2 })).not.toEqual(digestResult(input, parameters));
    const small = inputOf([work('a'), work('b', { year: null })], [['a', 'b']]);
    const bytes = digestInput(small, parameters);
    const changed: [AnalysisInput, AnalysisParameters][] = [
      [{ ...small, citing: small.cited, cited: small.citing }, parameters],
      ...([{ key: 'c' }, { year: 2021 }, { year: null }, { catalogued: false }, { title: 'Other' }, { keywords: ['x'] }] as Partial<AnalysisWorkInput>[]).map((change): [AnalysisInput, AnalysisParameters] => [{ ...small, works: [{ ...small.works[0], ...change }, small.works[1]] }, parameters]),
      ...([
        { scope: 'catalogued' }, { periodFrom: 2000 }, { periodTo: 2000 }, { minimumCitations: 4 }, { damping: 0.6 }, { similarity: 'cosine' }, { clustering: 'louvain' },
        { resolution: 2 }, { repeats: 4 }, { replicates: 11 }, { maximumReferences: 400 }, { seed: 2 },
      ] as Partial<AnalysisParameters>[]).map((change): [AnalysisInput, AnalysisParameters] => [small, { ...parameters, ...change }]),
    ];
    expect(Object.keys(defaultParameters).length).toBe(12);
    for (const [other, otherParameters] of changed) expect(digestInput(other, otherParameters)).not.toBe(bytes);
  });
});

describe('which works an analysis is about', () => {
  const works = [
    work('a', { year: 2010 }), work('b', { year: 2015 }), work('c', { year: 2020 }), work('d', { year: null }),
    work('p', { catalogued: false, year: 1990 }), work('q', { catalogued: false, year: null }), work('r', { catalogued: false }),
  ];
  const input = inputOf(works, [['a', 'p'], ['b', 'p'], ['c', 'p'], ['b', 'q'], ['c', 'q'], ['d', 'q'], ['c', 'r'], ['c', 'a'], ['p', 'a']]);

  it('are catalogued works alone on request', () => {
    expect(keysOf(input, { ...quick, scope: 'catalogued' })).toEqual(['a', 'b', 'c', 'd']);
  });

  it('are cited-only works too where enough works of the scope cite them', () => {
    expect(keysOf(input, { ...quick, minimumCitations: 3 })).toEqual(['a', 'b', 'c', 'd', 'p', 'q']);
    expect(keysOf(input, { ...quick, minimumCitations: 1 })).toEqual(['a', 'b', 'c', 'd', 'p', 'q', 'r']);
    expect(keysOf(input, { ...quick, minimumCitations: 0, periodTo: 2012 })).toEqual(['a', 'p']);
  });

  it('lie in the period, and works without a year only where it is open at both ends', () => {
    expect(keysOf(input, { ...quick, scope: 'catalogued', periodFrom: 2015 })).toEqual(['b', 'c']);
    expect(keysOf(input, { ...quick, periodFrom: 2015, minimumCitations: 2 })).toEqual(['b', 'c', 'p', 'q']);
    expect(keysOf(input, { ...quick, scope: 'catalogued', periodFrom: 2010, periodTo: 2015 })).toEqual(['a', 'b']);
  });

  it('cite only where they are catalogued, whatever the input says', () => {
    const result = analyseNetwork(input, { ...quick, minimumCitations: 1 }, silent);
    expect([...result.outDegree]).toEqual([1, 2, 4, 1, 0, 0, 0]);
    expect([...result.inDegree]).toEqual([1, 0, 0, 0, 3, 3, 1]);
    expect(result.run).toMatchObject({ works: 7, cataloguedWorks: 4, citedOnlyWorks: 3, citations: 8, danglingWorks: 3, engine: engineVersion, lastYear: 2020 });
  });
});

describe('figures of an analysis', () => {
  it('give PageRank with mean 1, ranks, loops, links against time and years', () => {
    const input = inputOf([work('a', { year: 2010 }), work('b', { year: 2012 }), work('c', { year: 2012 }), work('d', { year: null })], [['a', 'b'], ['b', 'a'], ['c', 'a'], ['c', 'b'], ['c', 'b'], ['d', 'a'], ['d', 'd']]);
    const result = analyseNetwork(input, { ...quick, replicates: 0 }, silent);
    expect(result.pageRank.reduce((sum, value) => sum + value, 0)).toBeCloseTo(4, 10);
    expect([...result.rank]).toEqual([1, 2, 3, 3]);
    expect([...result.citationRank]).toEqual([1, 2, 3, 3]);
    expect([result.rankLow, result.rankHigh, result.citationRankLow, result.citationRankHigh]).toEqual([result.rank, result.rank, result.citationRank, result.citationRank]);
    expect([...result.inLoop]).toEqual([1, 1, 0, 0]);
    expect(result.run).toMatchObject({ loops: 1, loopWorks: 2, backwardLinks: 1, citations: 5, danglingWorks: 0, pageRankConverged: true });
    expect([...result.citationsPerYear]).toEqual([3 / 2, 2, 0, NaN]);
    expect([...result.agePercentile]).toEqual([50, 75, 25, NaN]);
  });

  it('couple works by references outside the analysis, and skip lists that are too long', () => {
    const outside = ['r', 's', 't'].map((key) => work(key, { catalogued: false }));
    const input = inputOf([work('a'), work('b'), work('c'), ...outside], [['a', 'r'], ['a', 's'], ['b', 'r'], ['b', 's'], ['c', 'r'], ['c', 's'], ['c', 't']]);
    const parameters = { ...quick, scope: 'catalogued' as const };
    const coupling = (given: AnalysisParameters) => analyseNetwork(input, given, silent).bases[1];
    expect(coupling(parameters)).toMatchObject({ basis: 'coupling', linkedWorks: 3, pairs: 3 });
    expect([...coupling(parameters).cluster]).toEqual([0, 0, 0]);
    const capped = analyseNetwork(input, { ...parameters, maximumReferences: 2 }, silent);
    expect(capped.run.skippedForReferences).toBe(1);
    expect(capped.bases[1].linkedWorks).toBe(2);
  });

  it('put works in groups of one or two in no cluster, but draw them where they have links', () => {
    const citing = ['u', 'v'].map((key) => work(key));
    const input = inputOf([...['a', 'b', 'c', 'x', 'y', 'z'].map((key) => work(key)), ...citing, work('w'), work('k')], [
      ['u', 'a'], ['u', 'b'], ['u', 'c'], ['v', 'a'], ['v', 'b'], ['v', 'c'], ['w', 'x'], ['w', 'y'], ['k', 'x'], ['k', 'y'],
    ]);
    const result = analyseNetwork(input, quick, silent);
    const keys = [...result.workIndex].map((index) => input.works[index].key);
    const [cocitation] = result.bases;
    const of = (key: string) => keys.indexOf(key);
    expect(['a', 'b', 'c', 'x', 'y', 'z'].map((key) => cocitation.cluster[of(key)])).toEqual([0, 0, 0, -1, -1, -1]);
    expect(['a', 'x', 'z'].map((key) => Number.isFinite(cocitation.x[of(key)]))).toEqual([true, true, false]);
    expect(cocitation.firmness[of('x')]).toBeNaN();
    expect(cocitation.firmness[of('a')]).toBe(1);
    expect(cocitation.clusters.map(({ letter, size }) => [letter, size])).toEqual([['A', 3]]);
  });

  it('count citations from cluster to cluster', () => {
    const input = generateNetwork({ works: 300, meanReferences: 8, outsideCitations: 500, seed: 9 });
    const result = analyseNetwork(input, quick, silent);
    const clustersOf = new Map([...result.workIndex].map((index, place) => [index, place]));
    for (const basis of result.bases) {
      const expected = new Float64Array(basis.clusters.length ** 2);
      const seen = new Set<string>();
      input.citing.forEach((citing, pair) => {
        const [from, to] = [clustersOf.get(citing), clustersOf.get(input.cited[pair])];
        if (from === undefined || to === undefined || from === to || seen.has(`${from} ${to}`)) return;
        seen.add(`${from} ${to}`);
        if (basis.cluster[from] >= 0 && basis.cluster[to] >= 0) expected[basis.cluster[from] * basis.clusters.length + basis.cluster[to]] += 1;
      });
      expect(basis.clusterCitations).toEqual(expected);
      expect(basis.clusters.length).toBeGreaterThan(1);
    }
  });

  it('keep every part of the result in bounds', () => {
    const input = generateNetwork({ works: 300, meanReferences: 8, outsideCitations: 2_000, seed: 4 });
    const result = analyseNetwork(input, quick, silent);
    const { works } = result.run;
    for (let place = 0; place < works; place += 1) {
      expect(result.rankLow[place] <= result.rank[place] && result.rank[place] <= result.rankHigh[place]).toBe(true);
      expect(result.rankHigh[place]).toBeLessThanOrEqual(works);
    }
    for (const basis of result.bases) {
      expect(basis.linkSource.length).toBeLessThanOrEqual(5 * basis.linkedWorks);
      for (let link = 0; link < basis.linkSource.length; link += 1) {
        expect(basis.linkSource[link] < basis.linkTarget[link] && basis.linkTarget[link] < works).toBe(true);
        expect(Number.isFinite(basis.x[basis.linkSource[link]]) && basis.linkWeight[link] > 0).toBe(true);
      }
      basis.clusters.forEach((cluster, number) => {
        expect(basis.cluster.filter((own) => own === number).length).toBe(cluster.size);
        if (number > 0) expect(cluster.size).toBeLessThanOrEqual(basis.clusters[number - 1].size);
        expect(cluster.name).not.toBe('');
        expect(cluster.firmness > 0 && cluster.firmness <= 1).toBe(true);
      });
      expect(new Set(basis.clusters.map(({ name }) => name)).size).toBe(basis.clusters.length);
    }
  });
});

describe('odd and hostile input', () => {
  it('of any shape gives a whole result: empty, one work, no citations, self-citations, duplicates, separate parts', () => {
    const shapes: AnalysisInput[] = [
      inputOf([], []),
      inputOf([work('a')], []),
      inputOf([work('a')], [['a', 'a']]),
      inputOf([work('p', { catalogued: false })], []),
      inputOf([work('a'), work('b')], [['a', 'b'], ['a', 'b'], ['b', 'b']]),
      inputOf([work('a'), work('b'), work('c'), work('d')], [['a', 'b'], ['c', 'd']]),
    ];
    for (const input of shapes) {
      const result = analyseNetwork(input, quick, silent);
      expect(result.bases.map(({ basis }) => basis)).toEqual(['cocitation', 'coupling', 'citation']);
      for (const basis of result.bases) expect(basis.cluster.length).toBe(result.workIndex.length);
      expect(serialiseResult(result).length).toBeGreaterThan(0);
    }
  });

  it('never fails on small random networks', () => {
    const works = ['a', 'b', 'c', 'd', 'e', 'f', 'g', 'h'];
    const networks = fc.record({
      catalogued: fc.array(fc.boolean(), { minLength: 8, maxLength: 8 }),
      years: fc.array(fc.option(fc.integer({ min: 1990, max: 2024 })), { minLength: 8, maxLength: 8 }),
      pairs: fc.array(fc.tuple(fc.constantFrom(...works), fc.constantFrom(...works)), { maxLength: 50 }),
    });
    fc.assert(
      fc.property(networks, fc.constantFrom('association-strength', 'cosine', 'jaccard'), ({ catalogued, years, pairs }, similarity) => {
        const input = inputOf(works.map((key, place) => work(key, { catalogued: catalogued[place], year: years[place] })), pairs);
        const parameters: AnalysisParameters = { ...quick, similarity, minimumCitations: 1 };
        expect(digestResult(reorder(input, 1), parameters)).toEqual(digestResult(input, parameters));
      }),
      { numRuns: 60 },
    );
  });

  it('is refused with its reason', () => {
    const input = inputOf([work('a'), work('b')], [['a', 'b']]);
    expect(() => analyseNetwork({ ...input, works: [work('a'), work('a')] }, quick, silent)).toThrow('Two works have the key "a"');
    expect(() => analyseNetwork({ ...input, cited: Uint32Array.of(7) }, quick, silent)).toThrow('Citation 0 names work 7, but there are only 2 works');
    expect(() => serialiseInput({ ...input, cited: Uint32Array.of(7) }, quick)).toThrow('Citation 0');
    for (const [change, words] of [
      [{ damping: 1 }, 'Damping'], [{ resolution: 0 }, 'Resolution'], [{ repeats: 0 }, 'Repeats'], [{ replicates: -1 }, 'Replicates'], [{ maximumReferences: 0 }, 'references'], [{ periodFrom: 2020, periodTo: 2010 }, 'period'],
    ] as const) expect(() => analyseNetwork(input, { ...quick, ...change }, silent)).toThrow(words);
  });
});

describe('progress', () => {
  it('tells the stages in turn, each with a share between 0 and 1', () => {
    const seen: [string, number][] = [];
    analyseNetwork(generateNetwork({ works: 60, meanReferences: 5, outsideCitations: 50, seed: 1 }), quick, (stage, share) => seen.push([stage, share]));
    expect(seen.every(([, share]) => share >= 0 && share <= 1)).toBe(true);
    const stages = seen.map(([stage]) => stage).filter((stage, place, all) => stage !== all[place - 1]);
    expect(stages.slice(0, 5)).toEqual(['network', 'ranks', 'rank intervals', 'words', 'co-citation: pairs']);
    expect(new Set(stages).size).toBe(stages.length);
  });

  it('cancels the analysis by throwing', () => {
    const cancelled = new Error('cancelled');
    expect(() =>
      analyseNetwork(generateNetwork({ works: 60, meanReferences: 5, outsideCitations: 50, seed: 1 }), quick, (stage) => {
        if (stage === 'coupling: clusters') throw cancelled;
      }),
    ).toThrow(cancelled);
  });
});

describe('letters of clusters', () => {
  it('go on after Z with AA', () => {
    expect([0, 25, 26, 27, 51, 52, 701, 702].map(letterOf)).toEqual(['A', 'Z', 'AA', 'AB', 'AZ', 'BA', 'ZZ', 'AAA']);
  });
});
