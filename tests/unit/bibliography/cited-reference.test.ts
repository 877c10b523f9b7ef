import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { familyOf, parseAnyReference, parseCitedLine, parseUnstructured } from '@/lib/bibliography/cited-reference';

const parts = (text: string) => {
  const { raw: _raw, line: _line, ...rest } = parseCitedLine(text, 1);
  return rest;
};

describe('a cited-reference line', () => {
  it.each([
    ['ALLEN JP, 1986, P NATL ACAD SCI USA, V83, P8589, DOI 10.1073/pnas.83.22.8589', { author: 'ALLEN JP', family: 'ALLEN', year: 1986, source: 'P NATL ACAD SCI USA', volume: '83', page: '8589', doi: '10.1073/pnas.83.22.8589' }],
    ['de Vries, J., 1990, J ECOL, V3, P12', { author: 'de Vries, J.', family: 'de Vries', year: 1990, source: 'J ECOL', volume: '3', page: '12' }],
    ['[Anonymous], 2001, NATURE, V4, P1', { year: 2001, source: 'NATURE', volume: '4', page: '1' }],
    ['VANMOURIK A, 1988, THESIS U LEIDEN', { author: 'VANMOURIK A', family: 'VANMOURIK', year: 1988, source: 'THESIS U LEIDEN' }],
    ['BROOKS W, 2003, SCIENCE, V300, p283A', { author: 'BROOKS W', family: 'BROOKS', year: 2003, source: 'SCIENCE', volume: '300', page: '283A' }],
    ['Ek A, 2015, PLOS ONE, V10, ARTN e0123, DOI [10.1371/a, DOI 10.1371/b]', { author: 'Ek A', family: 'Ek', year: 2015, source: 'PLOS ONE', volume: '10', page: 'e0123', doi: '10.1371/a' }],
    ['Ek A, 2015, PLOS ONE, DOI DOI 10.1371/a', { author: 'Ek A', family: 'Ek', year: 2015, source: 'PLOS ONE', doi: '10.1371/a' }],
    ['Ek A, 2015, SCIENCE, TECHNOLOGY, HUMAN VALUES, V1', { author: 'Ek A', family: 'Ek', year: 2015, source: 'SCIENCE, TECHNOLOGY, HUMAN VALUES', volume: '1' }],
    ['1999, J X, V1, P2', { year: 1999, source: 'J X', volume: '1', page: '2' }],
    ['SMALL H, J AM SOC INFORM SCI, V24, P265', { author: 'SMALL H', family: 'SMALL', source: 'J AM SOC INFORM SCI', volume: '24', page: '265' }],
    ['DOI 10.1000/x', { doi: '10.1000/x' }],
    ['Old K, 1970, J Y, V1, P1, DOI 10.1002/(SICI)1097-4571(199704)48:4<320::AID-ASI4>3.0.CO;2-V', { author: 'Old K', family: 'Old', year: 1970, source: 'J Y', volume: '1', page: '1', doi: '10.1002/(sici)1097-4571(199704)48:4<320::aid-asi4>3.0.co;2-v' }],
    ['Kuhn, Thomas, 1962, STRUCTURE SCI REVOLU.', { author: 'Kuhn, Thomas', family: 'Kuhn', year: 1962, source: 'STRUCTURE SCI REVOLU' }],
    ['SMITH J, JONES K, 1990, J X, V1, P2', { author: 'SMITH J, JONES K', family: 'SMITH', year: 1990, source: 'J X', volume: '1', page: '2' }],
  ])('%s', (text, expected) => expect(parts(text)).toEqual(expected));

  it('keeps its raw text and its line', () => expect(parseCitedLine('A B, 2001, X', 17)).toMatchObject({ raw: 'A B, 2001, X', line: 17 }));

  it('that tells nothing is unstructured', () => expect(parts('')).toEqual({ unstructured: true }));

  it('never throws, and never makes up a DOI that is not in the text', () => {
    const piece = fc.constantFrom('DOI', '10.1/x', '10.1000/x', '[', ']', ', ', ' ', 'V1', 'P2', '1999', 'A B', ';', 'https://doi.org/');
    fc.assert(fc.property(fc.array(piece, { maxLength: 30 }), (pieces) => {
      const reference = parseCitedLine(pieces.join(''), 1);
      expect(reference.doi === undefined || pieces.join('').toLowerCase().includes(reference.doi)).toBe(true);
    }));
  });
});

describe('a reference of running text', () => {
  it('gives DOI and year', () => {
    expect(parseUnstructured('Small, H. Co-citation in 1500 papers. JASIS 24 (1973) 265-269. https://doi.org/10.1002/asi.4630240406.', 3)).toMatchObject({ line: 3, unstructured: true, doi: '10.1002/asi.4630240406', year: 1973 });
    expect(parseUnstructured('no year, no name', 1)).toEqual({ raw: 'no year, no name', line: 1, unstructured: true });
  });

  it('does not take a year out of a DOI', () => expect(parseUnstructured('X. 10.1016/j.x.2014.01.001', 1).year).toBeUndefined());

  it('is told from the comma layout', () => {
    expect(parseAnyReference('SMITH J, 2001, NATURE, V1, P2', 1).unstructured).toBeUndefined();
    expect(parseAnyReference('Smith, John. On things, with commas, in prose (2001).', 1)).toMatchObject({ unstructured: true, year: 2001 });
  });
});

describe('the family name of a cited author', () => {
  it.each([['MACARTHUR RH', 'MACARTHUR'], ['de Vries, J.', 'de Vries'], ['[Anonymous]', undefined], ['*WHO', '*WHO'], ['', undefined], ['LI X', 'LI']])('%s', (author, family) => expect(familyOf(author)).toBe(family));
});
