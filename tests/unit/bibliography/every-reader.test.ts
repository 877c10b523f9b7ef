/** What holds for every reader and every file, whole or broken. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { createReader, readText } from '@/lib/bibliography/readers';
import { formats, type Entry, type Format, type ReadLimits } from '@/lib/bibliography/record';
import { corpus } from '@/tests/unit/bibliography/corpus';

const runs = 150;
const small = corpus.filter((file) => file.text.length < 15_000);

function readInChunks(format: Format, text: string, cuts: number[]): { entries: Entry[]; counted: number } {
  const entries: Entry[] = [];
  const reader = createReader(format, { onEntry: (entry) => entries.push(entry), onProblem: () => undefined });
  let from = 0;
  for (const cut of [...cuts].sort((a, b) => a - b)) {
    reader.write(text.slice(from, cut));
    from = Math.max(from, cut);
  }
  reader.write(text.slice(from));
  const summary = reader.end();
  return { entries: entries.sort((a, b) => a.position - b.position), counted: summary.entries };
}

/** Every entry accounted for, every problem with a line of the file. */
function expectAccounted(format: Format, text: string): void {
  const { entries, summary } = readText(format, text);
  const lines = text.split(/\r\n|\r|\n/).length;
  const records = entries.filter((entry) => entry.kind === 'record').length;
  const rejected = entries.filter((entry) => entry.kind === 'rejected');
  expect(records + rejected.length).toBe(summary.entries);
  expect(entries.map((entry) => entry.position)).toEqual(entries.map((_, index) => index));
  for (const entry of rejected) expect(entry.problems.length).toBeGreaterThan(0);
  for (const place of [...entries, ...summary.problems, ...entries.flatMap((entry) => entry.problems), ...entries.flatMap((entry) => (entry.kind === 'record' ? entry.fields.references : []))]) {
    expect(place.line).toBeGreaterThanOrEqual(1);
    expect(place.line).toBeLessThanOrEqual(lines);
  }
}

describe('every reader, on real files', () => {
  it('accounts for all entries of each file and gives each a line', () => {
    for (const file of corpus) expectAccounted(file.format, file.text);
  });

  it('reads the same however the text is cut into chunks', () => {
    for (const file of small) {
      const whole = readText(file.format, file.text).entries;
      for (const size of [1, 7, 100]) {
        const cuts = Array.from({ length: Math.floor(file.text.length / size) }, (_, index) => index * size);
        expect(readInChunks(file.format, file.text, cuts).entries, `${file.path} in chunks of ${size}`).toEqual(whole);
      }
    }
  });

  it('finds the raw text of an entry at its line', () => {
    for (const file of corpus) {
      const lines = file.text.split('\n');
      for (const entry of readText(file.format, file.text).entries) {
        const [first] = entry.raw.split('\n');
        expect(lines[entry.line - 1], `${file.path}, line ${entry.line}`).toContain(first.slice(0, 200));
      }
    }
  });
});

describe('every reader, on broken files', () => {
  const mutation = fc.record({
    file: fc.constantFrom(...small),
    edits: fc.array(fc.record({ at: fc.nat(20_000), remove: fc.nat(40), insert: fc.constantFrom('', '{', '}', '"', '\\', '@', '\n', '%', '#', ',', '[', ']', ':', '\n@article{x,', 'TY  - ', 'ER  - ', '\nPT J\n', '\u0000', '\ud800', '𝔘', ' and ', '=') }), { minLength: 1, maxLength: 8 }),
  });
  const mutate = (text: string, edits: { at: number; remove: number; insert: string }[]) => edits.reduce((now, { at, remove, insert }) => now.slice(0, at % (now.length + 1)) + insert + now.slice((at % (now.length + 1)) + remove), text);

  it('never throws and accounts for all entries of mutated files', () => {
    fc.assert(fc.property(mutation, ({ file, edits }) => expectAccounted(file.format, mutate(file.text, edits))), { numRuns: runs });
  });

  it('never throws on a file read as any other format', () => {
    fc.assert(fc.property(fc.constantFrom(...small), fc.constantFrom(...formats), (file, format) => expectAccounted(format, file.text)), { numRuns: runs });
  });

  it('never throws on text made of the signs of all formats', () => {
    const sign = fc.constantFrom('@', '{', '}', '(', ')', '"', '\\', '%', '#', '=', ',', '\n', '[', ']', ':', 'article', 'string', 'comment', 'TY  - JOUR', 'ER  - ', 'PT J', 'CR ', 'PMID- 1', '%A x', 'a', ' ', '"id":', '"DOI":', '1', 'null', '\\"');
    fc.assert(
      fc.property(fc.array(sign, { maxLength: 200 }), fc.constantFrom(...formats), fc.array(fc.nat(400), { maxLength: 6 }), (signs, format, cuts) => {
        const text = signs.join('');
        expectAccounted(format, text);
        const { entries, counted } = readInChunks(format, text, cuts);
        expect(entries).toHaveLength(counted);
      }),
      { numRuns: runs * 3 },
    );
  });

  it('reads an entry behind a broken one', () => {
    const bib = '@article{a, title = {open,\n year = 1999\n@book{b, title = {Second}, year = 2000}\n';
    expect(readText('bibtex', bib).entries.map((entry) => entry.kind === 'record' && entry.fields.key)).toEqual(['a', 'b']);
    const ris = 'TY  - JOUR\nTI  - First\nTY  - JOUR\nTI  - Second\nER  - \n';
    expect(readText('ris', ris).entries).toHaveLength(2);
    const json = '[\n  {"id": "a", "title": "x},\n  {"id": "b", "title": "y"}\n]';
    const { entries } = readText('csl-json', json);
    expect(entries.map((entry) => [entry.kind, entry.line])).toEqual([['rejected', 2], ['record', 3]]);
  });
});

/** Texts built to be slow. Twenty times the text may take twenty times as long, and by no means four hundred times. */
const hostile: [Format, string, (size: number) => string][] = [
  ['bibtex', 'a row of @', (size) => '@'.repeat(size)],
  ['bibtex', 'openings without end', (size) => '\n@a{k,t={'.repeat(size / 8)],
  ['bibtex', 'fields on one line', (size) => `@a{k,${'a=1,'.repeat(size / 4)}}`],
  ['bibtex', 'values without end', (size) => `@a{k,${'\nb="{'.repeat(size / 5)}`],
  ['bibtex', 'nested accents', (size) => `@a{k,title={${"\\'{".repeat(size / 4)}a${'}'.repeat(size / 4)}}}`],
  ['bibtex', 'accents on accents', (size) => `@a{k,title={${"\\'".repeat(size / 2)}a}}`],
  ['bibtex', 'comments without end', (size) => '@comment{\n'.repeat(size / 10)],
  ['bibtex', 'quotation marks', (size) => `@a{k,t=${'"x'.repeat(size / 2)}}`],
  ['bibtex', 'a crowd of authors', (size) => `@a{k,author={${'A B and '.repeat(size / 8)}C}}`],
  ['bibtex', 'closing brackets behind a DOI', (size) => `@a{k,doi={10.1234/${')'.repeat(size)}}}`],
  ['bibtex', 'parents that name each other', (size) => Array.from({ length: size / 100 }, (_, at) => `@book{k${at},xdata={${Array.from({ length: 15 }, (_, one) => `k${one}`).join(',')}}}`).join('\n')],
  ['ris', 'continuation lines', (size) => `TY  - JOUR\nTI  - a\n${'b\n'.repeat(size / 2)}ER  - `],
  ['ris', 'keywords', (size) => `TY  - JOUR\n${'KW  - a\n'.repeat(size / 8)}ER  - `],
  ['ris', 'blanks', (size) => `TY  - JOUR\nCR  - a${' '.repeat(size)}b\nER  - `],
  ['tagged', 'DOI said again and again', (size) => `PT J\nCR A, 2001, X, ${'DOI '.repeat(size / 4)}\nER\n`],
  ['tagged', 'commas', (size) => `PT J\nCR ${'a, '.repeat(size / 3)}\nER\n`],
  ['csl-json', 'open brackets', (size) => '['.repeat(size)],
  ['csl-json', 'open objects', (size) => `[${'{"a":'.repeat(size / 5)}`],
  ['csl-json', 'quotation marks', (size) => `[${'"'.repeat(size)}`],
  ['csl-json', 'broken lines', (size) => '  {"id": "x\n'.repeat(size / 12)],
  ['registry-json', 'deep references', (size) => `[{"DOI":"10.1/x","reference":[{"a":${'['.repeat(size / 2)}${']'.repeat(size / 2)}}]}]`],
  ['nbib', 'continuation lines', (size) => `PMID- 1\nTI  - a\n${'      b\n'.repeat(size / 8)}`],
  ['refer', 'blank lines', (size) => `%T a\n${'\n'.repeat(size)}%T b\n`],
];

describe('every reader, on hostile files', () => {
  it.each(hostile)('%s: %s take linear time', (format, _, make) => {
    const time = (size: number) => {
      const text = make(size);
      const begun = performance.now();
      readText(format, text);
      return performance.now() - begun;
    };
    time(2_000);
    // The allowance covers a busy machine; a quadratic reader needs minutes for the longer text.
    expect(time(400_000)).toBeLessThan(20 * 20 * Math.max(time(20_000), 5) / 4);
  });

  it('tells when a limit cut something off', () => {
    const codes = (format: Format, text: string, limits: Partial<ReadLimits>) => readText(format, text, limits).entries.flatMap((entry) => entry.problems.map((problem) => problem.code));
    expect(codes('bibtex', '@a{k, author={A and B and C and D}}', { authors: 2 })).toContain('too-many-authors');
    expect(codes('bibtex', `@a{k, title={${'x'.repeat(50)}}}`, { fieldLength: 20 })).toContain('field-too-long');
    expect(codes('tagged', 'PT J\nTI a\nCR A, 2001, X\n   B, 2001, Y\n   C, 2001, Z\nER\n', { references: 2 })).toContain('too-many-references');
    expect(readText('ris', `TY  - JOUR\nTI  - ${'x'.repeat(100)}\nER  - `, { rawLength: 30 }).entries[0].raw).toHaveLength(30);
  });

  it('stops a bomb of abbreviations at one field', () => {
    const bomb = `@string{a0="xxxxxxxxxx"}\n${Array.from({ length: 60 }, (_, at) => `@string{a${at + 1}=a${at}#a${at}}`).join('\n')}\n@article{k, title=a60, year=2001}\n@article{l, title={Calm}, year=2002}`;
    const { entries, summary } = readText('bibtex', bomb);
    expect(entries).toHaveLength(2);
    expect(summary.problems.map((problem) => problem.code)).toContain('abbreviations-too-long');
    expect(entries[1].kind === 'record' && entries[1].fields.title).toBe('Calm');
  });
});
