import { describe, expect, it } from 'vitest';

import { readText } from '@/lib/bibliography/readers';
import { fieldsOf, problemsOf, records } from '@/tests/unit/bibliography/read';

const fields = (text: string) => fieldsOf('bibtex', text);
const problems = (text: string) => problemsOf('bibtex', text);
const keys = (text: string) => readText('bibtex', text).entries.map((entry) => (entry.kind === 'record' ? entry.fields.key : `rejected ${entry.key ?? ''}`));

describe('a BibTeX entry', () => {
  it('becomes a record with all its parts', () => {
    const text = `% a comment with @article{not, an entry}
@article{smith01,
  author = {van der Meer, Jan and {World Health Organization} and M{\\"u}ller, Hans and others},
  title = "The {DNA} of " # {things},
  journal = {J. Ecol.}, year = 2001, month = mar, volume = 12, number = {3}, pages = {101--9},
  doi = {https://doi.org/10.1000/A\\_B}, issn = {0378-5955}, keywords = {one; two}, url = {http://x.y/~z},
  note = {kept}
}`;
    expect(fields(text)).toMatchObject({
      key: 'smith01', type: 'article', title: 'The DNA of things', othersFollow: true, venue: 'J. Ecol.', year: 2001, month: 3, volume: '12', issue: '3', firstPage: '101', lastPage: '109', keywords: ['one', 'two'], url: 'http://x.y/~z',
      authors: [{ particle: 'van der', family: 'Meer', given: 'Jan' }, { literal: 'World Health Organization' }, { family: 'Müller', given: 'Hans' }],
      identifiers: { doi: '10.1000/a_b', issn: ['0378-5955'] },
      other: { note: 'kept' },
    });
    expect(records('bibtex', text)[0].line).toBe(2);
    expect(problems(text)).toEqual([]);
  });

  it.each([
    ['round brackets', '@article(a, title = {X (y)}, year = 2001)', 'X (y)'],
    ['capitals and blanks between the tokens', ' @ ARTICLE { a , TITLE = "X" , Year = "2001" , }', 'X'],
    ['no last comma and no line end', '@article{a,title={X}}', 'X'],
    ['a comment behind a field', '@article{a, year = 2001, % the year\n title = {X}}', 'X'],
    ['a percent sign within a value', '@article{a, title = {5% of X}}', '5% of X'],
    ['an accent in quotes without braces', '@article{a, title = "M\\"uller", year = 2001}', 'Müller'],
    ['quoted words in quotes', '@article{a, title = "the "so called" X", year = 2001}', 'the "so called" X'],
    ['an at sign within a value', '@article{a, title = {me@home.org wrote\n  to @you}}', 'me@home.org wrote to @you'],
    ['a missing comma between fields', '@article{a, title = {X}\n year = 2001}', 'X'],
    ['no key', '@article{title = {X}, year = 2001}', 'X'],
  ])('is read with %s', (_, text, title) => expect(fields(text).title).toBe(title));

  it('takes the first of a repeated field and says so', () => {
    expect(fields('@misc{a, title={X},\n title={Y}}').title).toBe('X');
    expect(problems('@misc{a, title={X},\n title={Y}}')).toEqual(['repeated-field@2']);
  });

  it('keeps an undefined abbreviation as text, with its line', () => {
    expect(fields('@article{a,\n journal = jecol # " B",\n title={X}}').venue).toBe('jecol B');
    expect(problems('@article{a,\n journal = jecol,\n title={X}}')).toEqual(['undefined-abbreviation@2']);
  });

  it('takes abbreviations from @string, also of each other', () => {
    expect(fields('@string{j = "Journal of "}\n@STRING(k = J # {Things})\n@article{a, journal = K, title={X}}').venue).toBe('Journal of Things');
  });

  it('tells a name from a body, and a body from an accent', () => {
    expect(fields('@misc{a, author = {{Barnes and Noble} and {\\\'E}mile Zola and {van den Berg}, Jan and {{NASA}}}}').authors).toEqual([{ literal: 'Barnes and Noble' }, { family: 'Zola', given: 'Émile' }, { particle: 'van den', family: 'Berg', given: 'Jan' }, { literal: 'NASA' }]);
  });

  it.each([['article', 'article'], ['inproceedings', 'conference-paper'], ['phdthesis', 'thesis'], ['incollection', 'chapter'], ['techreport', 'report'], ['dataset', 'dataset'], ['something', 'other']])('@%s is of type %s', (entry, type) => expect(fields(`@${entry}{a, title={X}}`).type).toBe(type));

  it('takes preprint numbers, and a DOI out of the address', () => {
    expect(fields('@misc{a, title={X}, eprint={2101.00001v2}, archivePrefix={arXiv}}')).toMatchObject({ type: 'preprint', identifiers: { arxiv: '2101.00001' } });
    expect(fields('@misc{a, title={X}, url={https://doi.org/10.1000/Q}}').identifiers.doi).toBe('10.1000/q');
  });

  it('keeps a field called __proto__ a field', () => {
    const other = fields('@misc{a, title={X}, __proto__={y}, constructor={z}}').other ?? {};
    expect(Object.entries(other)).toEqual([['__proto__', 'y'], ['constructor', 'z']]);
    expect(({} as Record<string, unknown>).y).toBeUndefined();
  });

  it('gives an invalid DOI or ISSN as a problem and keeps the text', () => {
    const text = '@misc{a, title={X},\n doi={none yet},\n issn={0378-5956}}';
    expect(problems(text)).toEqual(['invalid-doi@2', 'invalid-serial-number@3']);
    expect(fields(text)).toMatchObject({ identifiers: {}, other: { doi: 'none yet', 'serial-number': '0378-5956' } });
  });
});

describe('a cited-references field', () => {
  const text = `@article{a, title={X},
  cited-references = {SMITH J, 2001, NATURE, V1, P2.
     JONES K, 1999, J ECOL, V3, P4, DOI 10.1000/Q.
     Doe, Jane. Untidy prose (1987).},
  number-of-cited-references = {4}}`;

  it('is read one reference a line, each with its line', () => {
    expect(fields(text).references).toMatchObject([
      { line: 2, family: 'SMITH', year: 2001, volume: '1', page: '2' },
      { line: 3, family: 'JONES', doi: '10.1000/q' },
      { line: 4, unstructured: true, year: 1987 },
    ]);
  });

  it('is compared with the declared number', () => expect(problems(text)).toEqual(['reference-count@1']));
});

describe('entries between and within each other', () => {
  it('survive a neighbour without end', () => {
    const text = '@article{a, title = {open,\n year = 1999\n@book{b, title = {B}}\n@book{c, title = "open\n}\n@book{d, title = {D}}';
    expect(keys(text)).toEqual(['a', 'b', 'c', 'd']);
    expect(problems(text)).toContain('unbalanced-braces@1');
  });

  it('are skipped when commented out, by sign or by @comment', () => {
    expect(keys('%@article{a, title={A}}\n@comment{@article{b, title={B}}}\n@article{c, title={C}} % @article{d, title={D}}')).toEqual(['c']);
  });

  it('are found behind a comment that never ends', () => {
    expect(keys('@comment{ {open\n@article{a, title={A}}\n@article{b, title={B}}\n')).toEqual(['a', 'b']);
    expect(problems('@article{z, title={Z}}\n@comment{ {open\n@article{a, title={A}}\n')).toEqual(['comment-not-closed@2']);
  });

  it('are not made of an address of mail', () => expect(keys('write to jane@uni.edu (Jane)\n@article{a, title={A}}')).toEqual(['a']));

  it('with one key are both kept, and the second is told of', () => {
    expect(keys('@misc{a, title={A}}\n@misc{A, title={B}}')).toEqual(['a', 'A']);
    expect(problems('@misc{a, title={A}}\n@misc{A, title={B}}')).toEqual(['duplicate-key@2']);
  });

  it('that describe no work are rejected with a reason', () => {
    expect(keys('@IEEEtranBSTCTL{a, CTLuse_forced_etal = "yes"}\n@misc{b}')).toEqual(['rejected a', 'rejected b']);
    expect(problems('@misc{b}')).toEqual(['empty-entry@1']);
  });
});

describe('inheritance', () => {
  it('takes what a child lacks from a parent that stands behind it, the title as the book title', () => {
    const text = '@inproceedings{c, crossref={P}, title={Child}, author={A B}}\n@misc{m, title={M}}\n@proceedings{p, title={Parent}, year=1999, publisher={Press}, doi={10.1000/p}}';
    const [child, , parent] = readText('bibtex', text).entries;
    expect(child).toMatchObject({ position: 0, line: 1, fields: { title: 'Child', venue: 'Parent', year: 1999, publisher: 'Press', identifiers: {} } });
    expect(parent).toMatchObject({ position: 2, line: 3 });
  });

  it('keeps positions right although children come last', () => expect(keys('@misc{a, crossref={c}, title={A}}\n@misc{b, title={B}}\n@misc{c, title={C}}')).toEqual(['a', 'b', 'c']));

  it('takes xdata as it stands, and counts the xdata entry as no work', () => {
    const text = '@article{a, title={A}, xdata={x, y}}\n@xdata{x, journal={J}}\n@xdata{y, year=2001}';
    expect(keys(text)).toEqual(['a', 'rejected x', 'rejected y']);
    expect(records('bibtex', text)[0].fields).toMatchObject({ venue: 'J', year: 2001 });
  });

  it('cuts loops and tells of missing parents', () => {
    expect(problems('@misc{a, title={A}, crossref={b}}\n@misc{b, title={B}, crossref={a}}')).toEqual(['inheritance-loop@1', 'inheritance-loop@2']);
    expect(problems('@misc{a, title={A}, crossref={nowhere}}')).toEqual(['parent-missing@1']);
  });
});
