import { describe, expect, it } from 'vitest';

import { extractTerms, type TermSource } from '@/lib/evaluation/term-extraction';
import { TopicTerms } from '@/lib/evaluation/topic-terms';

const titled = (title: string, ...keywords: string[]): TermSource => ({ title, keywords });
const thrice = (source: TermSource): TermSource[] => [source, source, source];

describe('terms of works', () => {
  const formsOf = (...sources: TermSource[]): string[] => extractTerms(sources.flatMap(thrice)).forms;

  it('are runs of one to three words without a stop word among them', () => {
    expect(formsOf(titled('Loss of peat carbon'))).toEqual(['loss', 'peat', 'peat carbon', 'carbon']);
    expect(formsOf(titled('blanket bog peat carbon'))).toContain('blanket bog peat');
    expect(formsOf(titled('blanket bog peat carbon'))).not.toContain('blanket bog peat carbon');
  });

  it('do not run across punctuation, and leave numbers and single letters out', () => {
    expect(formsOf(titled('Peat: carbon, 2019 (x)'))).toEqual(['peat', 'carbon']);
  });

  it.each([
    ['English', 'The role of reeds within those marshes', ['reeds', 'marshes']],
    ['German', 'Für die Moore und über das Wasser', ['moore', 'wasser']],
    ['Spanish', 'Los ríos de la costa según los datos', ['rios', 'costa', 'datos']],
    ['French', 'Étude des marais entre les dunes', ['marais', 'dunes']],
    ['Portuguese', 'Análise da água não tratada', ['agua', 'tratada']],
  ])('drop the stop words of %s, with or without marks', (_language, title, words) => {
    expect(formsOf(titled(title))).toEqual(words);
  });

  it('count a work once, however often it says a word', () => {
    const index = extractTerms([titled('Peat and peat', 'peat'), titled('peat'), titled('Peat')]);
    expect(index.forms).toEqual(['peat']);
    expect([...index.offsets]).toEqual([0, 1, 2, 3]);
  });

  it('are dropped in fewer than three works', () => {
    expect(extractTerms([titled('reed'), titled('reed')]).forms).toEqual([]);
  });

  it('keep capitals that belong to a word and drop those of a beginning or a headline', () => {
    const spelt = (sources: TermSource[]): string[] => extractTerms(sources).spellings;
    expect(spelt(thrice(titled('Peat and DNA')))).toEqual(['peat', 'DNA']);
    expect(spelt(thrice(titled('Carbon Losses From Drained Peat Soils'))).every((term) => term === term.toLowerCase())).toBe(true);
    expect(spelt(thrice(titled('Sediments of the western Wadden Sea during storms')))).toContain('Wadden Sea');
    expect(spelt(thrice(titled('CARBON LOSSES FROM PEAT'))).every((term) => term === term.toLowerCase())).toBe(true);
  });

  it('are found in scripts without spaces or capitals', () => {
    expect(formsOf(titled('泥炭'))).toEqual(['泥炭']);
  });

  it('take a title of a megabyte in little time', () => {
    const started = performance.now();
    extractTerms([titled('a-'.repeat(500_000)), titled('<'.repeat(500_000)), titled(`${'x'.repeat(500_000)} ${'. '.repeat(250_000)}`), titled('', ...new Array<string>(50_000).fill('peat'))]);
    expect(performance.now() - started).toBeLessThan(1_000);
  });

  it('know works without words', () => {
    expect([...extractTerms([titled(''), titled('--- 12'), titled('peat')]).hasText]).toEqual([0, 1, 1]);
  });
});

describe('terms of clusters', () => {
  const peat = Array.from({ length: 12 }, (_, place) => titled(place % 2 ? 'Drainage of peat carbon stores' : 'Peat carbon and field drainage', 'monitoring'));
  const fish = Array.from({ length: 12 }, () => titled('Salmon passage at weirs', 'monitoring'));
  const sources = [...peat, ...fish];
  const clusters = Int32Array.from(sources, (_, work) => (work < 12 ? 0 : 1));

  it('set a cluster apart, strongest first, the longer term instead of the shorter one that it covers', () => {
    const [first, second] = new TopicTerms(sources).describe(clusters, ['A', 'B']);
    const terms = first.terms.map(({ term }) => term);
    expect(terms).toContain('peat carbon');
    expect(terms).not.toContain('peat');
    expect(terms).not.toContain('monitoring');
    expect(first.terms[0]).toMatchObject({ works: 12 });
    // 12 of 12 against 0 of 12: G2 = 2 * 24 * ln 2.
    expect(first.terms[0].logLikelihood).toBeCloseTo(48 * Math.log(2), 10);
    expect(first.name).toBe('peat carbon, drainage');
    expect(second.name.startsWith('salmon passage')).toBe(true);
    for (let place = 1; place < first.terms.length; place += 1) expect(first.terms[place].logLikelihood).toBeLessThanOrEqual(first.terms[place - 1].logLikelihood);
  });

  it('leave a cluster that nothing sets apart with its letter as name', () => {
    const same = Array.from({ length: 8 }, () => titled('Peat carbon'));
    const topics = new TopicTerms(same).describe(Int32Array.of(0, 0, 0, 0, 1, 1, 1, 1), ['A', 'B']);
    expect(topics).toEqual([{ terms: [], name: 'Cluster A' }, { terms: [], name: 'Cluster B' }]);
    expect(new TopicTerms([titled(''), titled(''), titled('')]).describe(Int32Array.of(0, 0, 0), ['A'])).toEqual([{ terms: [], name: 'Cluster A' }]);
  });

  it('name no two clusters alike', () => {
    const works = [...peat, ...peat, ...Array.from({ length: 40 }, () => titled('Salmon passage at weirs'))];
    const topics = new TopicTerms(works).describe(Int32Array.from(works, (_, work) => Math.min(2, Math.floor(work / 12))), ['A', 'B', 'C']);
    expect(new Set(topics.map(({ name }) => name)).size).toBe(3);
    expect(topics.every(({ name }) => name !== '')).toBe(true);
  });

  it('need a term in three works of the cluster and a twentieth of them', () => {
    const large = Array.from({ length: 100 }, (_, place) => titled(place < 4 ? 'Kelp' : place < 30 ? 'Eelgrass meadow' : 'Sandbank'));
    const others = Array.from({ length: 100 }, () => titled('Salmon'));
    const [topic] = new TopicTerms([...large, ...others]).describe(Int32Array.from({ length: 200 }, (_, work) => (work < 100 ? 0 : 1)), ['A', 'B']);
    expect(topic.terms.map(({ term }) => term)).toEqual(['sandbank', 'eelgrass meadow']);
  });
});
