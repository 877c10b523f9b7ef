import { describe, expect, it } from 'vitest';

import { detectFormat } from '@/lib/bibliography/detect';
import { createReader, readText } from '@/lib/bibliography/readers';
import { readTableHead } from '@/lib/bibliography/readers/delimited-columns';
import { splitCells } from '@/lib/bibliography/readers/delimited-rows';
import { splitNames } from '@/lib/bibliography/readers/delimited';
import { type Entry } from '@/lib/bibliography/record';
import { fieldsOf, problemsOf, records } from '@/tests/unit/bibliography/read';

const table = (...lines: string[]) => `${lines.join('\n')}\n`;
const head = 'Title,Authors,Year,Journal,Volume,Pages,DOI,References';

describe('cells of a row', () => {
  // RFC 4180, section 2, rules 4 to 7 (examples of that text, from memory).
  it('follow RFC 4180', () => {
    expect(splitCells('aaa,bbb,ccc', ',')).toEqual(['aaa', 'bbb', 'ccc']);
    expect(splitCells('"aaa","bbb","ccc"', ',')).toEqual(['aaa', 'bbb', 'ccc']);
    expect(splitCells('"aaa","b\nbb","ccc"', ',')).toEqual(['aaa', 'b\nbb', 'ccc']);
    expect(splitCells('"aaa","b""bb","ccc"', ',')).toEqual(['aaa', 'b"bb', 'ccc']);
  });

  it('take a mark in the middle of a cell for a sign, and tell an open quotation', () => {
    expect(splitCells('a 5" pipe,b', ',')).toEqual(['a 5" pipe', 'b']);
    expect(splitCells('"a" b,c', ',')).toEqual(['a b', 'c']);
    expect(splitCells('a,"b', ',')).toBeNull();
    expect(splitCells('', ',')).toEqual(['']);
    expect(splitCells('a,', ',')).toEqual(['a', '']);
  });
});

describe('the head of a table', () => {
  it('tells the delimiter and the columns, in several languages', () => {
    expect(readTableHead('Titel;Autoren;Jahr;Zeitschrift')).toMatchObject({ delimiter: ';', columns: ['title', 'authors', 'year', 'venue'] });
    expect(readTableHead('Título\tAutor\tAño\tNotes')).toMatchObject({ delimiter: '\t', columns: ['title', 'authors', 'year', null] });
    expect(readTableHead('\uFEFF"Article Title","DOI Link"')).toMatchObject({ delimiter: ',', columns: ['title', 'doi'] });
    expect(readTableHead('Name,Colour,Weight')).toBeNull();
    expect(readTableHead('Title')).toBeNull();
  });

  it('tells the format of a file, also where its cells quote another', () => {
    expect(detectFormat(table(head, 'A,B,2001,C,1,2,10.5555/x,'))?.format).toBe('delimited');
    expect(detectFormat(table('sep=;', 'Title;Authors;Year', 'A;B;2001'))?.format).toBe('delimited');
    expect(detectFormat(table('Title,Authors,Year', '"@article{x, TY  - JOUR",B,2001'))?.format).toBe('delimited');
    expect(detectFormat(table('Title,Who,Year,Shelf', 'A,B,2001,C'))?.format).toBe('delimited');
    expect(detectFormat(table('Title, year and all', 'of a letter'))).toBeNull();
    expect(detectFormat('Title of the letter, authors unknown, year 2001\n')).toBeNull();
  });
});

describe('a row', () => {
  it('gives every known column its place', () => {
    const fields = fieldsOf('delimited', table(head, '"Reed beds, in winter","Brae, Ada; de Vries, Jan",2001,Journal of Reed,7,12-9,https://doi.org/10.5555/R.1,"BRAE A, 1990, J REED, V3, P4; OKONKWO C, 1985, BOG STUD, V1, P20, DOI 10.5555/b.2"'));
    expect(fields).toMatchObject({
      type: 'article', title: 'Reed beds, in winter', year: 2001, venue: 'Journal of Reed', volume: '7', firstPage: '12', lastPage: '19', identifiers: { doi: '10.5555/r.1' },
      authors: [{ family: 'Brae', given: 'Ada' }, { family: 'Vries', particle: 'de', given: 'Jan' }],
    });
    expect(fields.references.map((reference) => [reference.family, reference.year, reference.volume, reference.page, reference.doi, reference.line])).toEqual([['BRAE', 1990, '3', '4', undefined, 2], ['OKONKWO', 1985, '1', '20', '10.5555/b.2', 2]]);
  });

  it('keeps what has no known column, and a second column of a kind, by name', () => {
    const fields = fieldsOf('delimited', table('Title,Year,Shelf,Date,__proto__', 'Reed beds,2001,B 12,2002-03,x'));
    expect(fields.year).toBe(2001);
    expect({ ...fields.other }).toEqual({ Shelf: 'B 12', Date: '2002-03', ['__proto__']: 'x' });
  });

  it('is told with the line on which it begins, line ends within cells counted', () => {
    const text = table('', 'Title,Year', '"Reed', 'beds",2001', '', 'Bogs,2002');
    expect(records('delimited', text).map((record) => [record.line, record.fields.title, record.raw])).toEqual([[3, 'Reed beds', '"Reed\nbeds",2001'], [6, 'Bogs', 'Bogs,2002']]);
  });

  it('with a quotation that is never closed costs its own line and no other', () => {
    const text = table('Title,Year', 'Reed beds,2001', '"Never closed,2002', 'Bogs,2003', 'Fens,2004');
    expect(records('delimited', text).map((record) => [record.line, record.fields.title, record.fields.year])).toEqual([[2, 'Reed beds', 2001], [3, '"Never closed', 2002], [4, 'Bogs', 2003], [5, 'Fens', 2004]]);
    expect(problemsOf('delimited', text)).toEqual(['unclosed-quote@3']);
  });

  it('that says nothing is rejected by its line; an empty one is none', () => {
    const { entries } = readText('delimited', table('Title,Year,Shelf', ',2001,B', ',,', 'Bogs,2003,C'));
    expect(entries.map((entry) => [entry.kind, entry.line, entry.position])).toEqual([['rejected', 2, 0], ['record', 4, 1]]);
  });

  it('with more cells than heads keeps them and says so; a year that is none is told', () => {
    const text = table('Title,Year', 'Bogs,soon,and,more');
    expect(problemsOf('delimited', text)).toEqual(['too-many-cells@2', 'year-not-read@2']);
    expect(fieldsOf('delimited', text).other?.['cells without a head']).toBe('and,more');
  });
});

describe('a table', () => {
  it('without a telling head is refused with what it should name', () => {
    const { entries } = readText('delimited', table('Name,Colour', 'a,b', 'c,d'));
    expect(entries).toHaveLength(1);
    expect(entries[0]).toMatchObject({ kind: 'rejected', line: 1, raw: 'Name,Colour\na,b\nc,d\n', problems: [{ code: 'no-columns' }] });
  });

  it('that is refused keeps its whole text, and one line of 100,000 characters is no head, in whatever pieces they come', () => {
    const refused = (text: string, size: number) => {
      const entries: Entry[] = [];
      const reader = createReader('delimited', { onEntry: (entry) => entries.push(entry), onProblem: () => undefined });
      for (let at = 0; at < text.length; at += size) reader.write(text.slice(at, at + size));
      reader.end();
      return entries.map((entry) => [entry.kind, entry.line, entry.raw.length]);
    };
    for (const text of [table('', 'Name,Colour', 'a,b', 'c,d'), `Title,DOI,${'x'.repeat(99_990)}`, `Title,DOI,${'x'.repeat(100_000)}\na,b`, `${' '.repeat(150_000)}\nTitle,DOI\na,10.5555/x\n`, `\n${' '.repeat(150_000)}Title,DOI\na,10.5555/x\n`]) {
      for (const size of [1_000, 100_000]) expect(refused(text, size), `${text.slice(0, 20).trim()} in pieces of ${size}`).toEqual(refused(text, 1_000_000));
    }
    expect(refused(table('', 'Name,Colour', 'a,b'), 3)).toEqual([['rejected', 2, 16]]);
  });

  it('reads the same however it is cut into pieces', () => {
    const text = table('sep=,', '', head, '"Reed ""beds""","Brae A., Okonkwo C.",2001,J,1,2,,"A B, 1990, J, V1, P2"', '"open,2002', 'Bogs,,2003');
    const read = (size: number) => {
      const entries: Entry[] = [];
      const reader = createReader('delimited', { onEntry: (entry) => entries.push(entry), onProblem: () => undefined });
      for (let at = 0; at < text.length; at += size) reader.write(text.slice(at, at + size));
      return { entries, summary: reader.end() };
    };
    expect(read(1)).toEqual(read(100_000));
    expect(read(7)).toEqual(read(100_000));
    expect(read(1).entries.map((entry) => entry.line)).toEqual([4, 5, 6]);
  });
});

describe('names of one cell', () => {
  it.each([
    ['Brae, Ada; Okonkwo, Chidi', ['Brae, Ada', 'Okonkwo, Chidi']],
    ['Brae A., Okonkwo C. D., de Vries J', ['Brae A.', 'Okonkwo C. D.', 'de Vries J']],
    ['Ada Brae and Chidi Okonkwo', ['Ada Brae', 'Chidi Okonkwo']],
    ['Brae A., Okonkwo C. & Lindqvist E.', ['Brae A.', 'Okonkwo C.', 'Lindqvist E.']],
    ['Brae, Ada', ['Brae, Ada']],
    ['', []],
  ])('%s', (cell, names) => expect(splitNames(cell).filter((name) => name !== '')).toEqual(names));
});
