/** CSL-JSON: an array of items, or items in an envelope. Numbers may be texts and texts numbers. */
import { parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseArxiv, normaliseOrcid, normalisePmcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { body, parseName } from '@/lib/bibliography/names';
import { type PersonName, type WorkType } from '@/lib/bibliography/record';
import { EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { JsonItemScanner } from '@/lib/bibliography/readers/json-items';
import { dateOf, isObject, listOf, own, takeItem, textOf, type JsonObject } from '@/lib/bibliography/readers/json-values';

const types = new Map<string, WorkType>(Object.entries({
  article: 'preprint', 'article-journal': 'article', 'article-magazine': 'article', 'article-newspaper': 'article', review: 'article', 'review-book': 'article', book: 'book', classic: 'book', collection: 'book', periodical: 'book', chapter: 'chapter', entry: 'chapter',
  'entry-dictionary': 'chapter', 'entry-encyclopedia': 'chapter', 'paper-conference': 'conference-paper', speech: 'conference-paper', thesis: 'thesis', report: 'report', standard: 'report', legislation: 'report', dataset: 'dataset', patent: 'patent', software: 'software',
  webpage: 'web', 'post-weblog': 'web', post: 'web',
}));
const placed = new Set(['id', 'citation-key', 'citation-label', 'type', 'title', 'author', 'editor', 'issued', 'container-title', 'container-title-short', 'journalAbbreviation', 'volume', 'issue', 'page', 'publisher', 'publisher-place', 'edition', 'abstract', 'language', 'URL', 'keyword', 'DOI', 'PMID', 'PMCID', 'ISSN', 'ISBN']);

function nameOf(value: unknown): PersonName | undefined {
  if (typeof value === 'string') return parseName(value);
  if (!isObject(value)) return undefined;
  const literal = textOf(value, 'literal', 'name');
  const family = textOf(value, 'family');
  const given = textOf(value, 'given');
  if (!family) return literal ? body(literal) : given ? body(given) : undefined;
  const name: PersonName = { family };
  const particle = [textOf(value, 'dropping-particle'), textOf(value, 'non-dropping-particle')].filter(Boolean).join(' ');
  const suffix = textOf(value, 'suffix');
  const orcid = normaliseOrcid(textOf(value, 'ORCID', 'orcid') ?? '');
  if (given) name.given = given;
  if (particle) name.particle = particle;
  if (suffix) name.suffix = suffix;
  if (orcid) name.orcid = orcid;
  return name;
}

function fill(builder: EntryBuilder, item: JsonObject): void {
  const text = (...names: string[]) => {
    const value = textOf(item, ...names);
    return value === undefined ? undefined : builder.bounded(value, names[0]);
  };
  builder.key = text('id', 'citation-key', 'citation-label');
  for (const name of listOf(item, 'author')) builder.addAuthor(nameOf(name));
  for (const name of listOf(item, 'editor')) builder.addEditor(nameOf(name));
  const issued = own(item, 'issued');
  const date = dateOf(issued);
  if (date.year === undefined && isObject(issued)) {
    const written = textOf(issued, 'raw', 'literal', 'year');
    if (written) builder.problem('warning', 'year-not-read', `"${written.slice(0, 60)}" holds no year.`);
  }
  const pages = text('page');
  const number = text('number') ?? '';
  builder.set({
    type: types.get(text('type') ?? '') ?? 'other',
    title: text('title'),
    ...date,
    venue: text('container-title', 'event-title', 'collection-title'),
    venueShort: text('container-title-short', 'journalAbbreviation'),
    volume: text('volume'),
    issue: text('issue'),
    ...(pages ? parsePages(pages) : {}),
    articleNumber: text('article-number') ?? (pages ? undefined : text('number')),
    publisher: text('publisher'),
    place: text('publisher-place'),
    edition: text('edition'),
    abstract: text('abstract'),
    language: text('language'),
    url: text('URL'),
  });
  const keywords = text('keyword');
  if (keywords) builder.addKeywords(keywords, keywords.includes(';') ? /;/ : /,/);
  builder.setDoi(text('DOI'));
  const { url } = builder.fields;
  builder.identify({
    doi: url && /doi\.org\//i.test(url) ? findDoi(url) : undefined,
    pmid: normalisePmid(text('PMID') ?? ''),
    pmcid: normalisePmcid(text('PMCID') ?? ''),
    arxiv: /arxiv/i.test(number) ? normaliseArxiv(number) : undefined,
  });
  for (const name of ['ISSN', 'ISBN']) for (const value of listOf(item, name).slice(0, 20)) if (typeof value === 'string') builder.addSerialNumber(value);
  for (const name of Object.keys(item)) {
    const value = placed.has(name) ? undefined : own(item, name);
    if (typeof value === 'string' || typeof value === 'number') builder.other(name.slice(0, 100), String(value).slice(0, builder.limits.fieldLength));
  }
}

export function createCslJsonReader(options: ReaderOptions): Reader {
  const session = new ReadSession('csl-json', options);
  const newBuilder = (line: number) => new EntryBuilder(line, options.limits);
  const scanner = new JsonItemScanner((item) => takeItem(session, item, newBuilder, fill), (code, message, line) => session.problem('error', code, message, line));
  return {
    write: (text) => scanner.write(text),
    end() {
      scanner.end();
      return session.summary();
    },
  };
}
