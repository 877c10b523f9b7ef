/** CSL-JSON: an array of items, or items in an envelope. Numbers may be texts and texts numbers. */
import { parseDate, parseMonth, parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseArxiv, normaliseOrcid, normalisePmcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { body } from '@/lib/bibliography/names';
import { type PersonName, type WorkType } from '@/lib/bibliography/record';
import { EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { datePartsOf, isObject, JsonItemScanner, listOf, textOf, type JsonItem, type JsonObject } from '@/lib/bibliography/readers/json-items';
import { tidyFields } from '@/lib/bibliography/readers/ris';

const types = new Map<string, WorkType>(Object.entries({
  article: 'preprint', 'article-journal': 'article', 'article-magazine': 'article', 'article-newspaper': 'article', review: 'article', 'review-book': 'article', book: 'book', classic: 'book', collection: 'book', periodical: 'book', chapter: 'chapter', entry: 'chapter',
  'entry-dictionary': 'chapter', 'entry-encyclopedia': 'chapter', 'paper-conference': 'conference-paper', speech: 'conference-paper', thesis: 'thesis', report: 'report', standard: 'report', legislation: 'report', dataset: 'dataset', patent: 'patent', software: 'software',
  webpage: 'web', 'post-weblog': 'web', post: 'web',
}));

function nameOf(value: unknown): PersonName | undefined {
  if (!isObject(value)) return undefined;
  const literal = textOf(value, 'literal');
  const family = textOf(value, 'family');
  if (!family) return literal ? body(literal) : textOf(value, 'given') ? body(textOf(value, 'given') as string) : undefined;
  const name: PersonName = { family };
  const given = textOf(value, 'given');
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
  const { fields } = builder;
  const text = (...names: string[]) => {
    const value = textOf(item, ...names);
    return value === undefined ? undefined : builder.bounded(value, names[0]);
  };
  builder.key = text('id', 'citation-key', 'citation-label');
  fields.type = types.get(text('type') ?? '') ?? 'other';
  fields.title = text('title');
  for (const name of listOf(item, 'author')) builder.addAuthor(nameOf(name));
  const editors = listOf(item, 'editor').map(nameOf).filter((name) => name !== undefined);
  if (editors.length > 0) fields.editors = editors.slice(0, 1_000);
  const issued = Object.hasOwn(item, 'issued') ? item.issued : undefined;
  const [year, month, day] = datePartsOf(issued);
  if (year !== undefined && year >= 1000 && year <= 2200) Object.assign(fields, { year, month: month && month <= 12 ? month : undefined, day: day && day <= 31 ? day : undefined });
  else {
    const written = isObject(issued) ? textOf(issued, 'raw', 'literal', 'date-parts') : typeof issued === 'string' || typeof issued === 'number' ? String(issued) : undefined;
    if (written) {
      Object.assign(fields, parseDate(written));
      if (fields.year === undefined) builder.problem('warning', 'year-not-read', `"${written.slice(0, 60)}" holds no year.`);
    }
    if (isObject(issued) && fields.month === undefined) fields.month = parseMonth(textOf(issued, 'month') ?? '');
  }
  fields.venue = text('container-title', 'event-title', 'collection-title');
  fields.venueShort = text('container-title-short', 'journalAbbreviation');
  fields.volume = text('volume');
  fields.issue = text('issue');
  const pages = text('page');
  if (pages) Object.assign(fields, parsePages(pages));
  fields.articleNumber = fields.firstPage ? undefined : text('article-number', 'number');
  fields.publisher = text('publisher');
  fields.place = text('publisher-place');
  fields.edition = text('edition');
  fields.abstract = text('abstract');
  fields.language = text('language');
  fields.url = text('URL');
  const keywords = text('keyword');
  if (keywords) builder.addKeywords(keywords, /[,;]/);
  builder.setDoi(text('DOI'));
  if (!fields.identifiers.doi && fields.url && /doi\.org\//i.test(fields.url)) fields.identifiers.doi = findDoi(fields.url);
  fields.identifiers.pmid = normalisePmid(text('PMID') ?? '');
  fields.identifiers.pmcid = normalisePmcid(text('PMCID') ?? '');
  const number = text('number') ?? '';
  if (/arxiv/i.test(number)) fields.identifiers.arxiv = normaliseArxiv(number);
  for (const name of ['ISSN', 'ISBN']) for (const value of listOf(item, name).slice(0, 20)) if (typeof value === 'string') builder.addSerialNumber(value);
  const note = text('note');
  if (note) builder.other('note', note);
  if (/^\s*(?:retracted(?: article)?\s*[:.]|\[retracted\])/i.test(fields.title ?? '')) fields.retracted = true;
}

/** Parses one item and hands it to `fillItem`; what is no object, or no JSON, becomes a rejection. */
export function takeItem(session: ReadSession, options: ReaderOptions, item: JsonItem, fillItem: (builder: EntryBuilder, object: JsonObject) => void): void {
  const builder = new EntryBuilder(item.line, options.limits);
  let parsed: unknown;
  try {
    parsed = JSON.parse(item.text);
  } catch (error) {
    builder.problem('error', 'invalid-json', `The item is not valid JSON: ${error instanceof Error ? error.message.slice(0, 120) : 'unknown fault'}`);
    session.emit((position) => builder.rejected(position, item.text));
    return;
  }
  if (!isObject(parsed)) {
    builder.problem('error', 'not-an-object', 'The item is no object.');
    session.emit((position) => builder.rejected(position, item.text));
    return;
  }
  fillItem(builder, parsed);
  tidyFields(builder);
  const { title, authors, identifiers, venue, url } = builder.fields;
  if (!title && authors.length === 0 && !identifiers.doi && !venue && !url && !builder.key) {
    builder.problem('error', 'empty-entry', 'The item holds nothing that describes a work.');
    session.emit((position) => builder.rejected(position, item.text));
  } else session.emit((position) => builder.record(position, item.text));
}

export function createCslJsonReader(options: ReaderOptions): Reader {
  const session = new ReadSession('csl-json', options);
  const scanner = new JsonItemScanner((item) => takeItem(session, options, item, fill), (code, message, line) => session.problem('error', code, message, line));
  return {
    write: (text) => scanner.write(text),
    end() {
      scanner.end();
      return session.summary();
    },
  };
}
