/** Fields of one BibTeX or BibLaTeX entry to a record. Meaning of the fields: common practice. */
import { parseAnyReference } from '@/lib/bibliography/cited-reference';
import { parseDate, parseMonth, parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseArxiv, normaliseOrcid, normalisePmcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { texToUnicode, texVerbatim } from '@/lib/bibliography/latex';
import { body, parseName } from '@/lib/bibliography/names';
import { findYear } from '@/lib/bibliography/normalise';
import { type PersonName, type WorkType } from '@/lib/bibliography/record';
import { splitOutsideBraces, type BibtexField } from '@/lib/bibliography/readers/bibtex-fields';
import { type EntryBuilder } from '@/lib/bibliography/readers/builder';

const types = new Map<string, WorkType>(Object.entries({
  article: 'article', suppperiodical: 'article', review: 'article', inbook: 'chapter', incollection: 'chapter', inreference: 'chapter', suppbook: 'chapter', bookinbook: 'chapter', book: 'book', mvbook: 'book', collection: 'book', mvcollection: 'book', proceedings: 'book',
  mvproceedings: 'book', reference: 'book', booklet: 'book', periodical: 'book', manual: 'report', phdthesis: 'thesis', mastersthesis: 'thesis', bachelorsthesis: 'thesis', thesis: 'thesis', techreport: 'report', report: 'report', standard: 'report', inproceedings: 'conference-paper',
  conference: 'conference-paper', dataset: 'dataset', data: 'dataset', unpublished: 'preprint', preprint: 'preprint', patent: 'patent', software: 'software', online: 'web', electronic: 'web', www: 'web', webpage: 'web',
}));

const citedFields = ['cited-references', 'cited_references', 'citedreferences', 'references'];
/** Fields that have a place in a record; all others go to `other` under their own name. */
const placed = new Set(['author', 'editor', 'title', 'subtitle', 'year', 'date', 'month', 'journal', 'journaltitle', 'journalsubtitle', 'shortjournal', 'journal-iso', 'booktitle', 'booksubtitle', 'maintitle', 'volume', 'number', 'issue', 'pages', 'eid', 'article-number', 'doi', 'eprint',
  'archiveprefix', 'eprinttype', 'pmid', 'pmcid', 'isbn', 'issn', 'eissn', 'url', 'publisher', 'institution', 'school', 'organization', 'address', 'location', 'edition', 'keywords', 'keyword', 'keywords-plus', 'author_keywords', 'abstract', 'language', 'langid', 'crossref', 'xdata', 'orcid',
  'unique-id', 'affiliation', 'affiliations', 'times-cited', 'number-of-cited-references', ...citedFields]);
const describing = new Set([...placed, 'note', 'howpublished', 'type', 'series', 'chapter', 'key']);

/** True when at least one field says something of a work: control entries of styles have none. */
export function describesWork(fields: ReadonlyMap<string, BibtexField>): boolean {
  for (const name of fields.keys()) if (describing.has(name)) return true;
  return false;
}

/** A name that is one group of braces is a body, not a person; a group that begins with a command is an accent. */
function isBraced(name: string): boolean {
  if (!name.startsWith('{') || !name.endsWith('}') || /^\{\\[^\s{}]{1,3}[^\s]{0,3}\}/.test(name)) return false;
  let depth = 0;
  for (let at = 0; at < name.length; at += 1) {
    const code = name.charCodeAt(at);
    if (code === 123) depth += 1;
    else if (code === 125 && (depth -= 1) === 0) return at === name.length - 1;
  }
  return false;
}

function bibtexName(text: string): PersonName | undefined {
  if (text === '') return undefined;
  if (isBraced(text)) {
    const literal = texToUnicode(text);
    return literal === '' ? undefined : body(literal);
  }
  if (!text.includes('{')) return parseName(texToUnicode(text));
  // A comma within braces does not separate.
  return parseName(splitOutsideBraces(text, ',').map((part) => texToUnicode(part).replaceAll(',', ' ')).join(', '));
}

const join = (main: string | undefined, sub: string | undefined) => (main && sub && !main.toLowerCase().includes(sub.toLowerCase()) ? `${main}: ${sub}` : main);

/** Fills the builder from the fields of one entry. */
export class BibtexRecordFiller {
  constructor(private readonly builder: EntryBuilder, private readonly fields: ReadonlyMap<string, BibtexField>) {}

  private text(...names: string[]): string | undefined {
    for (const name of names) {
      const field = this.fields.get(name);
      if (!field || field.value === '') continue;
      const value = texToUnicode(this.builder.bounded(field.value, name, field.line));
      if (value !== '') return value;
    }
    return undefined;
  }

  private verbatim(name: string): string | undefined {
    const field = this.fields.get(name);
    return field ? texVerbatim(this.builder.bounded(field.value, name, field.line)) || undefined : undefined;
  }

  private names(name: 'author' | 'editor'): void {
    const { builder } = this;
    const field = this.fields.get(name);
    if (!field) return;
    // One more than the limit, so that the builder notices; the rest is not worth its time.
    for (const part of splitOutsideBraces(builder.bounded(field.value, name, field.line), 'and', builder.limits.authors + 2)) {
      const one = bibtexName(part);
      if (name === 'author') builder.addAuthor(one, field.line);
      else builder.addEditor(one, field.line);
    }
  }

  private date(): void {
    const { builder } = this;
    const written = this.text('date', 'year');
    const monthText = this.text('month');
    const parsed = written ? parseDate(written) : {};
    const year = parsed.year ?? findYear(this.text('year') ?? '') ?? findYear(monthText ?? '');
    if (year === undefined && written) builder.problem('warning', 'year-not-read', `"${written.slice(0, 60)}" holds no year.`, (this.fields.get('date') ?? this.fields.get('year'))?.line);
    builder.set({ year, month: parsed.month ?? (monthText ? parseMonth(monthText) : undefined), day: parsed.day });
  }

  private identifiers(): void {
    const { builder } = this;
    builder.setDoi(this.verbatim('doi'), this.fields.get('doi')?.line);
    const url = this.verbatim('url');
    builder.set({ url });
    if (url && /doi\.org\//i.test(url)) builder.identify({ doi: findDoi(url) });
    const eprint = this.verbatim('eprint');
    const archive = (this.text('archiveprefix', 'eprinttype') ?? '').toLowerCase();
    if (eprint && (archive === 'arxiv' || archive === '')) builder.identify({ arxiv: normaliseArxiv(eprint) });
    if (eprint && archive === 'pubmed') builder.identify({ pmid: normalisePmid(eprint) });
    builder.identify({ pmid: normalisePmid(this.verbatim('pmid') ?? ''), pmcid: normalisePmcid(this.verbatim('pmcid') ?? ''), accession: this.verbatim('unique-id')?.slice(0, 200) });
    for (const name of ['isbn', 'issn', 'eissn']) {
      const value = this.verbatim(name);
      if (value) builder.addSerialNumber(value, this.fields.get(name)?.line);
    }
    const orcid = normaliseOrcid(this.verbatim('orcid') ?? '');
    if (orcid && builder.fields.authors.length === 1) builder.fields.authors[0].orcid = orcid;
  }

  private number(name: string): number | undefined {
    const text = this.text(name);
    return text && /^\d{1,9}$/.test(text) ? Number(text) : undefined;
  }

  /** One reference a line. A single long line with "; " between is split there. */
  private references(): void {
    for (const name of citedFields) {
      const field = this.fields.get(name);
      if (!field) continue;
      const lines = field.value.split('\n');
      const pieces = lines.length === 1 && field.value.includes('; ') ? field.value.split('; ').map((text) => ({ text, line: field.valueLine })) : lines.map((text, index) => ({ text, line: field.valueLine + index }));
      this.builder.addReferences(pieces.map(({ text, line }) => ({ text: texToUnicode(text), line })).filter(({ text }) => text !== '').map(({ text, line }) => parseAnyReference(text, line)));
      return;
    }
  }

  fill(type: string): void {
    const { builder, fields } = this;
    this.names('author');
    this.names('editor');
    this.date();
    this.identifiers();
    const pages = this.text('pages');
    const eprint = builder.fields.identifiers.arxiv !== undefined;
    builder.set({
      type: types.get(type) ?? (type === 'misc' && eprint ? 'preprint' : 'other'),
      title: join(this.text('title'), this.text('subtitle')),
      venue: join(this.text('journal', 'journaltitle'), this.text('journalsubtitle')) ?? join(this.text('booktitle', 'maintitle'), this.text('booksubtitle')),
      venueShort: this.text('shortjournal', 'journal-iso'),
      volume: this.text('volume'),
      issue: this.text('issue', 'number'),
      ...(pages ? parsePages(pages) : {}),
      articleNumber: this.text('eid', 'article-number'),
      publisher: this.text('publisher', 'institution', 'school', 'organization'),
      place: this.text('address', 'location'),
      edition: this.text('edition'),
      abstract: this.text('abstract'),
      language: this.text('langid', 'language'),
      declaredReferences: this.number('number-of-cited-references'),
      reportedCitations: this.number('times-cited'),
    });
    for (const name of ['keywords', 'keyword', 'author_keywords', 'keywords-plus']) {
      const words = this.text(name);
      if (words) builder.addKeywords(words, words.includes(';') ? /;/ : /,/, fields.get(name)?.line);
    }
    for (const name of ['affiliation', 'affiliations']) {
      const place = this.text(name);
      if (place) builder.addAffiliation(place);
    }
    this.references();
    for (const [name, field] of fields) if (!placed.has(name)) builder.other(name.slice(0, 100), texToUnicode(builder.bounded(field.value, name, field.line)), field.line);
  }
}
