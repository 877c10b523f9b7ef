/** Numbers of entries and cited references of real files against the list that accompanied the collection (tests/fixtures/corpus/manifest.tsv), which was not made with these readers. */
import { describe, expect, it } from 'vitest';

import { detectFormat } from '@/lib/bibliography/detect';
import { readText } from '@/lib/bibliography/readers';
import { corpus } from '@/tests/unit/bibliography/corpus';

describe('real files', () => {
  it.each(corpus.map((file) => [file.path, file] as const))('%s gives as many entries and references as the list says', (_, file) => {
    const { entries, summary } = readText(file.format, file.text);
    expect(summary.entries).toBe(file.entries);
    expect(entries.reduce((sum, entry) => sum + (entry.kind === 'record' ? entry.fields.references.length : 0), 0)).toBe(file.references);
  });

  it.each(corpus.filter((file) => file.entries > 0).map((file) => [file.path, file] as const))('%s is recognised by its content', (_, file) => {
    expect(detectFormat(file.text.slice(0, 65_536))?.format).toBe(file.format);
  });

  it('are read almost whole: 97 of 100 entries become records with a title, name or venue', () => {
    const entries = corpus.flatMap((file) => readText(file.format, file.text).entries);
    const told = entries.filter((entry) => entry.kind === 'record' && (entry.fields.title ?? entry.fields.venue ?? entry.fields.authors[0]));
    expect(told.length / entries.length).toBeGreaterThan(0.97);
  });

  it('give cited-reference lines their parts: 145 lines of one real export', () => {
    const file = corpus.find((one) => one.path === 'gh-rispy/example_wos.ris');
    const references = readText('tagged', file?.text ?? '').entries.flatMap((entry) => (entry.kind === 'record' ? entry.fields.references : []));
    const having = (test: (reference: (typeof references)[number]) => unknown) => references.filter((reference) => Boolean(test(reference))).length;
    // Counted with grep on the file: CR lines with ", V<digit>", with ", P<digit>" and with "DOI 10.".
    const lines = (file?.text ?? '').split('\n').filter((line) => /^(?:CR|\s{3}).*, \d{4}, /.test(line));
    expect(references).toHaveLength(145);
    expect(having((reference) => reference.year)).toBe(145);
    expect(having((reference) => reference.family)).toBe(145);
    expect(having((reference) => reference.volume)).toBe(lines.filter((line) => /, V\d/.test(line)).length);
    expect(having((reference) => reference.doi)).toBe(lines.filter((line) => /DOI \[?10\./.test(line)).length);
    for (const reference of references) expect(file?.text.split('\n')[reference.line - 1]).toContain(reference.raw);
  });
});
