import { describe, expect, it } from 'vitest';

import { readText } from '@/lib/bibliography/readers';
import { fieldsOf, problemsOf, records } from '@/tests/unit/bibliography/read';

describe('RIS', () => {
  const text = `TY  - JOUR
AU  - Müller, Hans, Jr.
AU  - van der Meer, J.
A1  - World Health Organization
TI  - A title that
goes on here
JF  - Journal of Things
JA  - J. Things
PY  - 2001/05/03/Spring
VL  - 12
IS  - 3
SP  - 101
EP  - 9
DO  - 10.1000/X
SN  - 0378-5955
KW  - one; two
KW  - three
UR  - http://x.y
N1  - Cited By: 17
XX  - kept
ER  -
`;

  it('gives all parts', () => {
    expect(fieldsOf('ris', text)).toMatchObject({
      type: 'article', title: 'A title that goes on here', venue: 'Journal of Things', venueShort: 'J. Things', year: 2001, month: 5, day: 3, volume: '12', issue: '3', firstPage: '101', lastPage: '109', keywords: ['one', 'two', 'three'], url: 'http://x.y', reportedCitations: 17,
      authors: [{ family: 'Müller', given: 'Hans', suffix: 'Jr.' }, { particle: 'van der', family: 'Meer', given: 'J.' }, { literal: 'World Health Organization' }],
      identifiers: { doi: '10.1000/x', issn: ['0378-5955'] },
      other: { XX: 'kept' },
    });
    expect(problemsOf('ris', text)).toEqual([]);
  });

  it.each([
    ['prose before the first record', 'Results of a search\n\nTY  - BOOK\nTI  - X\nER  - \n', ['stray-text@1']],
    ['no ER before the next record', 'TY  - BOOK\nTI  - W\nTY  - BOOK\nTI  - X\nER  - \n', ['end-missing@3']],
    ['no ER at the end', 'TY  - BOOK\nTI  - X', ['end-missing@1']],
    ['one blank before the hyphen', 'TY - BOOK\nTI - X\nER -', []],
    ['a mark in the middle of joined files', 'TY  - BOOK\nTI  - W\nER  - \n\ufeffTY  - BOOK\nTI  - X\nER  - \n', []],
    ['no type', 'TI  - X\nER  - \n', ['type-missing@1', 'type-missing@1']],
    ['an end without a beginning', 'ER  - \nTY  - BOOK\nTI  - X\nER  - \n', ['stray-text@1']],
  ])('with %s is read', (_, ris, problems) => {
    expect(records('ris', ris).map((record) => record.fields.title)).toContain('X');
    expect(problemsOf('ris', ris)).toEqual(problems);
  });

  it('does not take a line of prose for a tag', () => expect(fieldsOf('ris', 'TY  - JOUR\nAB  - long\nUV-light and\nA4-paper\nER  - \n').abstract).toBe('long UV-light and A4-paper'));

  it('finds the DOI where old files keep it, and the range of pages in SP', () => {
    expect(fieldsOf('ris', 'TY  - JOUR\nTI  - X\nM3  - doi:10.1000/M\nSP  - 5-8\nEP  - 8\nER  - ')).toMatchObject({ identifiers: { doi: '10.1000/m' }, firstPage: '5', lastPage: '8' });
    expect(fieldsOf('ris', 'TY  - JOUR\nTI  - X\nM3  - Article\nUR  - https://doi.org/10.1000/U\nER  - ').identifiers.doi).toBe('10.1000/u');
  });

  it('reads references from notes and from the tag for them', () => {
    const cited = fieldsOf('ris', 'TY  - JOUR\nTI  - X\nN1  - References: Smith, J., Title, (2001) Nature, 1, p. 2; Jones, K., Other title, (1999)\nCR  - SMITH J, 2001, NATURE, V1, P2\nER  - ').references;
    expect(cited).toMatchObject([{ line: 4, family: 'SMITH', page: '2' }, { line: 3, year: 2001 }, { line: 3, year: 1999 }]);
  });

  it('rejects a record that holds nothing', () => expect(readText('ris', 'TY  - JOUR\nAU  - \nER  - \n').entries).toMatchObject([{ kind: 'rejected', line: 1, problems: [{ code: 'empty-entry' }] }]));
});

describe('tagged text', () => {
  const text = `FN Export
VR 1.0
PT J
AU MULLER, H
   van der Meer, J
AF Muller, Hans
   van der Meer, Jan
TI A title that
   goes on
SO JOURNAL OF THINGS
DT Article; Retracted Publication
OI Muller, Hans/0000-0002-1825-0097; Nobody, N/0000-0002-1694-233X
C1 [Muller, Hans] Univ A, Town.
   [van der Meer, Jan] Univ B.
CR SMITH J, 2001, NATURE, V1, P2
   [Anonymous], 1999, REPORT
NR 3
TC 17
PY 2002
PD JUN 15
BP 5
EP 9
DI 10.1000/x
UT ID:1
ZZ kept
ER

EF`;

  it('gives all parts, and each reference its line', () => {
    expect(fieldsOf('tagged', text)).toMatchObject({
      key: 'ID:1', type: 'article', retracted: true, title: 'A title that goes on', venue: 'JOURNAL OF THINGS', year: 2002, month: 6, firstPage: '5', lastPage: '9', declaredReferences: 3, reportedCitations: 17, affiliations: ['[Muller, Hans] Univ A, Town.', '[van der Meer, Jan] Univ B.'],
      authors: [{ family: 'Muller', given: 'Hans', orcid: '0000-0002-1825-0097' }, { particle: 'van der', family: 'Meer', given: 'Jan' }],
      identifiers: { doi: '10.1000/x', accession: 'ID:1' },
      references: [{ line: 15, family: 'SMITH', year: 2001 }, { line: 16, year: 1999, source: 'REPORT' }],
      other: { ZZ: 'kept' },
    });
    expect(problemsOf('tagged', text)).toEqual(['reference-count@3']);
  });

  it('comes tab-delimited too', () => {
    const table = 'PT\tAU\tTI\tSO\tCR\tPY\tDI\nJ\tMULLER, H; LEE, K\tX\tJ Y\tSMITH J, 2001, NATURE, V1, P2; JONES K, 1999, Z\t2002\t10.1000/t\n\nB\tEk, A\tZ\t\t\t2003\t\n';
    expect(records('tagged', table).map(({ line, fields }) => ({ line, ...fields }))).toMatchObject([
      { line: 2, title: 'X', authors: [{ family: 'MULLER' }, { family: 'LEE' }], references: [{ line: 2, family: 'SMITH' }, { family: 'JONES' }], identifiers: { doi: '10.1000/t' } },
      { line: 4, type: 'book', title: 'Z', year: 2003 },
    ]);
  });

  it('keeps records apart when ER is missing, and tells stray text', () => {
    const broken = 'stray\nPT J\nTI A\nPT J\nTI B\nEF\nPT J\nTI C\nER\n';
    expect(records('tagged', broken).map((record) => record.fields.title)).toEqual(['A', 'B', 'C']);
    expect(problemsOf('tagged', broken)).toEqual(['stray-text@1', 'end-missing@4', 'end-missing@6']);
  });
});

describe('nbib', () => {
  const text = `PMID- 123
OWN - X
TI  - A title that
      goes on.
LID - 10.1000/n [doi]
FAU - Muller, Hans
AU  - Muller H
AUID- ORCID: 0000-0002-1825-0097
FAU - Lee, Kim
AU  - Lee K
CN  - A Group
JT  - Journal of things
TA  - J Things
IS  - 0378-5955 (Print)
DP  - 2001 May 3
PG  - 123-9
PT  - Journal Article
OT  - one

PMID- 124
TI  - Second
DP  - 1999
`;

  it('gives all parts, records apart at blank lines', () => {
    const [first, second] = records('nbib', text);
    expect(first.fields).toMatchObject({
      key: '123', type: 'article', title: 'A title that goes on.', venue: 'Journal of things', venueShort: 'J Things', year: 2001, month: 5, day: 3, firstPage: '123', lastPage: '129', keywords: ['one'],
      authors: [{ family: 'Muller', given: 'Hans', orcid: '0000-0002-1825-0097' }, { family: 'Lee', given: 'Kim' }, { literal: 'A Group' }],
      identifiers: { pmid: '123', doi: '10.1000/n', issn: ['0378-5955'] },
    });
    expect(first.fields.authors[1].orcid).toBeUndefined();
    expect([second.line, second.fields.title, second.fields.year]).toEqual([20, 'Second', 1999]);
  });

  it('begins a record at a second number without a blank line before it', () => expect(records('nbib', 'PMID- 1\nTI  - A\nPMID- 2\nTI  - B\n')).toHaveLength(2));
});

describe('refer', () => {
  it('gives all parts', () => {
    expect(fieldsOf('refer', '%0 Journal Article\n%A Putnam, C. D.\n%A Jane Doe\n%T A title\nthat goes on\n%J Mol Cell Biol\n%D 1992\n%V 12\n%P 4970-80\n%R 10.1000/r\n%@ 0378-5955\n%F key92\n%Z kept\n')).toMatchObject({
      key: 'key92', type: 'article', title: 'A title that goes on', venue: 'Mol Cell Biol', year: 1992, volume: '12', firstPage: '4970', lastPage: '4980', authors: [{ family: 'Putnam', given: 'C. D.' }, { family: 'Doe', given: 'Jane' }], identifiers: { doi: '10.1000/r', issn: ['0378-5955'] }, other: { Z: 'kept' },
    });
  });

  it('keeps records apart at blank lines, but a blank line within an abstract does not end a typed record', () => {
    expect(records('refer', '%A A, B\n%T One\n\n%A C, D\n%T Two\n')).toHaveLength(2);
    expect(records('refer', '%0 Book\n%T One\n%X first part\n\nsecond part\n%D 2001\n\n%0 Book\n%T Two\n').map((record) => [record.fields.title, record.fields.year])).toEqual([['One', 2001], ['Two', undefined]]);
  });
});
