import { describe, expect, it } from 'vitest';

import { readText } from '@/lib/bibliography/readers';
import { fieldsOf, problemsOf, records } from '@/tests/unit/bibliography/read';

describe('CSL-JSON', () => {
  it('gives all parts, with numbers as texts and texts as numbers', () => {
    const item = {
      id: 7, type: 'article-journal', title: '<i>In vivo</i> A &amp; B', author: [{ family: 'Meer', given: 'Jan', 'non-dropping-particle': 'van der' }, { literal: 'A Group' }, { family: 'Ford', suffix: 'Jr.' }, { literal: 'et al.' }], editor: [{ family: 'Ek' }],
      issued: { 'date-parts': [['2001', 5, '3']] }, 'container-title': 'J. Things', volume: 12, issue: '3', page: '101-9', DOI: 'https://doi.org/10.1000/C', PMID: 123, ISSN: '0378-5955', keyword: 'one, two', note: 'kept', custom: { deep: true },
    };
    expect(fieldsOf('csl-json', JSON.stringify([item]))).toMatchObject({
      key: '7', type: 'article', title: 'In vivo A & B', othersFollow: true, year: 2001, month: 5, day: 3, venue: 'J. Things', volume: '12', issue: '3', firstPage: '101', lastPage: '109', keywords: ['one', 'two'],
      authors: [{ particle: 'van der', family: 'Meer', given: 'Jan' }, { literal: 'A Group' }, { family: 'Ford', suffix: 'Jr.' }], editors: [{ family: 'Ek' }], identifiers: { doi: '10.1000/c', pmid: '123', issn: ['0378-5955'] }, other: { note: 'kept' },
    });
  });

  it.each([
    [{ raw: 'May 2001' }, { year: 2001, month: 5 }], [{ literal: 'circa 1850' }, { year: 1850 }], [{ 'date-parts': [[2001], [2003]] }, { year: 2001 }], ['2001-05', { year: 2001, month: 5 }], [{ 'date-parts': [[2001, 13, 40]] }, { year: 2001 }],
  ])('reads the date %j', (issued, date) => expect(fieldsOf('csl-json', JSON.stringify([{ id: 'a', issued }]))).toMatchObject(date));

  it('tells of a date without a year', () => expect(problemsOf('csl-json', '[{"id":"a","issued":{"raw":"in press"}}]')).toEqual(['year-not-read@1']));

  it.each([
    ['an array', '[{"id":"a"},{"id":"b"}]'], ['one object', '{"id":"a"}'], ['an object a line', '{"id":"a"}\n{"id":"b"}\n'], ['an envelope', '{"x":{"items":[1]},"items":[{"id":"a"},{"id":"b"}],"z":[{"id":"no"}]}'], ['nothing', '[]'],
    ['braces and brackets in texts', '[{"id":"a","title":"]}{[\\"\\\\"}]'],
  ])('finds the items of %s', (_, json) => expect(records('csl-json', json).map((record) => record.fields.key).join('')).toBe({ '[]': '', '{"id":"a"}': 'a' }[json] ?? (json.includes(']}{[') ? 'a' : 'ab')));

  it('gives each item its line and its own raw text', () => {
    const { entries } = readText('csl-json', '[\n  {\n    "id": "a"\n  },\n  {"id": "b"},\n\n  {"id": "c"}\n]\n');
    expect(entries.map((entry) => [entry.line, entry.raw])).toEqual([[2, '{\n    "id": "a"\n  }'], [5, '{"id": "b"}'], [7, '{"id": "c"}']]);
  });

  it('rejects what is no object or describes nothing, item by item', () => {
    const { entries } = readText('csl-json', '[1, "text", null, {"type": "book"}, [], {"id": "a"}]');
    expect(entries.map((entry) => (entry.kind === 'record' ? 'record' : entry.problems[0].code))).toEqual(['not-an-object', 'not-an-object', 'not-an-object', 'empty-entry', 'not-an-object', 'record']);
  });

  it.each([
    ['a string without end', '[\n  {"id": "a", "title": "x},\n  {"id": "b"},\n  {"id": "c"}\n]', ['invalid-json', 'b', 'c']],
    ['a missing bracket', '[\n  {"id": "a", "author": [{"family": "x"},\n  {"id": "b"},\n  {"id": "c"}\n]', ['invalid-json', 'b', 'c']],
    ['a broken line of one object a line', '{"id": "a"}\n{"id": "x"\n{"id": "b"}\n', ['a', 'invalid-json', 'b']],
    ['an end in the middle', '[{"id": "a"}, {"id": "b", "ti', ['a', 'invalid-json']],
    ['a wrong comma', '[{"id": "a",}, {"id": "b"}]', ['invalid-json', 'b']],
  ])('loses one item by %s, not its neighbours', (_, json, expected) => expect(readText('csl-json', json).entries.map((entry) => (entry.kind === 'record' ? entry.fields.key : entry.problems[0].code))).toEqual(expected));

  it('does not follow __proto__ and does not read what is nested beyond measure', () => {
    expect(fieldsOf('csl-json', '[{"id":"a","__proto__":{"title":"no"},"constructor":"x"}]').title).toBeUndefined();
    const deep = `[{"id":"a","x":${'['.repeat(5_000)}${']'.repeat(5_000)}},{"id":"b"}]`;
    expect(readText('csl-json', deep).entries.map((entry) => entry.kind)).toEqual(['rejected', 'record']);
  });

  it('tells text outside the values and a file cut short', () => {
    expect(problemsOf('csl-json', '[{"id":"a"}]\nand so on')).toEqual(['stray-text@2']);
    expect(problemsOf('csl-json', '[{"id":"a"},')).toEqual(['file-cut-short@1']);
  });
});

describe('registry JSON', () => {
  const work = {
    DOI: '10.1000/R', type: 'journal-article', title: ['A title'], subtitle: ['and more'], 'container-title': ['Journal of Things'], 'short-container-title': ['J. Things'], author: [{ family: 'Meer', given: 'Jan', ORCID: 'http://orcid.org/0000-0002-1825-0097', affiliation: [{ name: 'Univ A' }] }, { name: 'A Group' }],
    issued: { 'date-parts': [[null]] }, 'published-print': { 'date-parts': [[2001, 5]] }, volume: '12', page: '101-109', ISSN: ['0378-5955'], subject: ['Ecology'], 'reference-count': 4, 'is-referenced-by-count': 17, 'updated-by': [{ type: 'retraction' }],
    reference: [
      { key: 'r1', DOI: '10.1000/Q', 'doi-asserted-by': 'crossref', author: 'Smith', year: '2001a', 'journal-title': 'Nature', 'article-title': 'Things', volume: '1', 'first-page': '2' },
      { key: 'r2', unstructured: 'Jones K. (1999). Prose. doi:10.1000/Z.' },
      { key: 'r3', 'volume-title': 'A book', author: 'Ek' },
    ],
  };

  it('gives all parts and the cited works', () => {
    const fields = fieldsOf('registry-json', JSON.stringify(work));
    expect(fields).toMatchObject({
      key: '10.1000/r', type: 'article', title: 'A title: and more', venue: 'Journal of Things', venueShort: 'J. Things', year: 2001, month: 5, volume: '12', firstPage: '101', lastPage: '109', keywords: ['Ecology'], declaredReferences: 4, reportedCitations: 17, retracted: true, affiliations: ['Univ A'],
      authors: [{ family: 'Meer', given: 'Jan', orcid: '0000-0002-1825-0097' }, { literal: 'A Group' }], identifiers: { doi: '10.1000/r', issn: ['0378-5955'] },
      references: [
        { doi: '10.1000/q', author: 'Smith', family: 'Smith', year: 2001, title: 'Things', source: 'Nature', volume: '1', page: '2' },
        { raw: 'Jones K. (1999). Prose. doi:10.1000/Z.', unstructured: true, doi: '10.1000/z', year: 1999 },
        { author: 'Ek', title: 'A book', source: 'A book' },
      ],
    });
    expect(JSON.parse(fields.references[0].raw)).toEqual(work.reference[0]);
    expect(problemsOf('registry-json', JSON.stringify(work))).toEqual(['reference-count@1']);
  });

  it.each([
    ['alone', JSON.stringify(work)], ['in its envelope', JSON.stringify({ status: 'ok', 'message-type': 'work', message: work })], ['in a list of results', JSON.stringify({ status: 'ok', message: { facets: {}, 'total-results': 1, items: [work], query: { terms: null } } })], ['in an array', JSON.stringify([work])],
    ['pretty-printed', JSON.stringify({ message: { items: [work] } }, null, 2)],
  ])('is found %s', (_, json) => expect(records('registry-json', json).map((record) => [record.fields.identifiers.doi, record.fields.references.length])).toEqual([['10.1000/r', 3]]));

  it('gives references their own lines where the file has lines', () => {
    const json = JSON.stringify({ message: { items: [{ ...work, title: ['"reference": [{'] }, work] } }, null, 1);
    const lines = json.split('\n');
    for (const record of records('registry-json', json)) {
      expect(lines[record.line - 1].trim()).toBe('{');
      record.fields.references.forEach((reference, index) => expect(lines[reference.line]).toContain(`"key": "r${index + 1}"`));
    }
  });

  it('leaves out references that are no objects and says so', () => {
    expect(problemsOf('registry-json', '[{"DOI":"10.1000/x","reference":["a",{"key":"b"},null]}]')).toEqual(['reference-not-read@1']);
  });
});
