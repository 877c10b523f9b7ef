import { describe, expect, it } from 'vitest';

import { csvCell } from '@/lib/analyses/reading/export-table';
import { countSameAuthor } from '@/lib/analyses/reading/same-authors';
import { xmlText } from '@/lib/analyses/reading/xml-text';

describe('same-author citations', () => {
  it('share a family name and a first initial, whatever case and marks', () => {
    const cited = [{ family: 'García', given: 'Ana María' }, { family: 'Brae', given: 'B.' }];
    expect(countSameAuthor(cited, [[{ family: 'GARCIA', given: 'A' }], [{ family: 'García', given: 'Luis' }], [{ family: 'Brae', given: 'Bo' }, { family: 'Quist', given: 'C' }]])).toEqual({ same: 2, undetermined: 0 });
  });

  it('cannot be told where no person is named on either side', () => {
    expect(countSameAuthor([], [[{ family: 'Brae', given: 'B' }]])).toEqual({ same: 0, undetermined: 1 });
    expect(countSameAuthor([{ family: 'Brae', given: 'B' }], [[], [{ literal: 'Water Board' }], [{ family: 'Brae' }], [{ family: 'Brae', given: 'B' }]])).toEqual({ same: 1, undetermined: 3 });
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
