import { describe, expect, it } from 'vitest';

import { csvCell } from '@/lib/analyses/reading/export-table';
import { countSameAuthor } from '@/lib/analyses/reading/same-authors';
import { type PersonName } from '@/lib/bibliography/record';
import { xmlText } from '@/lib/analyses/reading/xml-text';

const known = (...names: PersonName[]) => ({ names, partly: false });
const firstOnly = (name: PersonName) => ({ names: [name], partly: true });

describe('same-author citations', () => {
  it('share a family name and a first initial, whatever case and marks', () => {
    const cited = known({ family: 'García', given: 'Ana María' }, { family: 'Brae', given: 'B.' });
    expect(countSameAuthor(cited, [known({ family: 'GARCIA', given: 'A' }), known({ family: 'García', given: 'Luis' }), known({ family: 'Brae', given: 'Bo' }, { family: 'Quist', given: 'C' })])).toEqual({ same: 2, undetermined: 0 });
  });

  it('cannot be told where no person is named on either side', () => {
    expect(countSameAuthor(known(), [known({ family: 'Brae', given: 'B' })])).toEqual({ same: 0, undetermined: 1 });
    expect(countSameAuthor(known({ family: 'Brae', given: 'B' }), [known(), known({ literal: 'Water Board' }), known({ family: 'Brae' }), known({ family: 'Brae', given: 'B' })])).toEqual({ same: 1, undetermined: 3 });
  });

  it('are found by a first author alone, but not ruled out by one', () => {
    expect(countSameAuthor(firstOnly({ family: 'BRAE', given: 'B' }), [known({ family: 'Brae', given: 'Bo' }), known({ family: 'Quist', given: 'C' })])).toEqual({ same: 1, undetermined: 1 });
  });
});

describe('cells of an export', () => {
  it('are quoted where they must be, and never begin a formula', () => {
    expect(csvCell('plain')).toBe('plain');
    expect(csvCell('a "b", c')).toBe('"a ""b"", c"');
    expect(csvCell('two\nlines')).toBe('"two\nlines"');
    for (const start of ['=', '+', '-', '@', '\t']) expect(csvCell(`${start}SUM(A1)`)).toMatch(/^"?'/);
    expect(csvCell(-1.5)).toBe('-1.5');
    expect(csvCell(null)).toBe('');
  });

  it('hold no character that XML forbids', () => {
    expect(xmlText('a\u0000\u0007b<&>"\'\uD800\uFFFE é 𝛼')).toBe('ab&lt;&amp;&gt;&quot;&#39; é 𝛼');
  });
});
