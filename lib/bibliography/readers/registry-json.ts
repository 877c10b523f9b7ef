/** DOI-registry JSON: one work, `message.items`, a list of works, or a work a line; cited works in `reference`. */
import { familyOf, parseUnstructured } from '@/lib/bibliography/cited-reference';
import { parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseDoi, normaliseIsbn, normaliseOrcid } from '@/lib/bibliography/identifiers';
import { body } from '@/lib/bibliography/names';
import { findYear } from '@/lib/bibliography/normalise';
import { type CitedReference, type WorkType } from '@/lib/bibliography/record';
import { EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { JsonItemScanner, type JsonItem } from '@/lib/bibliography/readers/json-items';
import { dateOf, elementLines, isObject, listOf, numberOf, own, takeItem, textOf, type JsonObject } from '@/lib/bibliography/readers/json-values';

const types = new Map<string, WorkType>(Object.entries({
  'journal-article': 'article', 'proceedings-article': 'conference-paper', 'book-chapter': 'chapter', 'book-section': 'chapter', 'book-part': 'chapter', 'reference-entry': 'chapter', book: 'book', monograph: 'book', 'edited-book': 'book', 'reference-book': 'book', proceedings: 'book',
  'book-series': 'book', 'book-set': 'book', dissertation: 'thesis', report: 'report', 'report-component': 'report', 'report-series': 'report', standard: 'report', dataset: 'dataset', database: 'dataset', 'posted-content': 'preprint',
}));

function reference(value: JsonObject, line: number): CitedReference {
  const unstructured = textOf(value, 'unstructured');
  const found: CitedReference = unstructured ? parseUnstructured(unstructured, line) : { raw: JSON.stringify(value).slice(0, 4_000), line };
  const set = (name: 'doi' | 'author' | 'family' | 'title' | 'source' | 'volume' | 'issue' | 'page' | 'isbn', text: string | undefined) => {
    if (text) found[name] = text.slice(0, 2_000);
  };
  set('doi', normaliseDoi(textOf(value, 'DOI', 'doi') ?? ''));
  const author = textOf(value, 'author');
  set('author', author?.slice(0, 300));
  set('family', author ? familyOf(author) : undefined);
  const year = findYear(textOf(value, 'year') ?? '');
  if (year) found.year = year;
  const journal = textOf(value, 'journal-title');
  const volumeTitle = textOf(value, 'volume-title');
  // A book has its title in volume-title, and nothing else names it.
  set('title', textOf(value, 'article-title') ?? (journal ? undefined : volumeTitle));
  set('source', journal ?? volumeTitle ?? textOf(value, 'series-title'));
  set('volume', textOf(value, 'volume'));
  set('issue', textOf(value, 'issue'));
  set('page', textOf(value, 'first-page'));
  set('isbn', normaliseIsbn(textOf(value, 'ISBN') ?? ''));
  if (found.author || found.source || found.title) delete found.unstructured;
  return found;
}

function addAuthors(builder: EntryBuilder, item: JsonObject): void {
  for (const value of listOf(item, 'author')) {
    if (!isObject(value)) continue;
    const family = textOf(value, 'family');
    const given = textOf(value, 'given');
    const suffix = textOf(value, 'suffix');
    const orcid = normaliseOrcid(textOf(value, 'ORCID') ?? '');
    const name = textOf(value, 'name', 'literal') ?? given;
    if (family) builder.addAuthor({ family, ...(given ? { given } : {}), ...(suffix ? { suffix } : {}), ...(orcid ? { orcid } : {}) });
    else if (name) builder.addAuthor(body(name));
    for (const affiliation of listOf(value, 'affiliation').slice(0, 20)) {
      const place = isObject(affiliation) ? textOf(affiliation, 'name') : undefined;
      if (place) builder.addAffiliation(place);
    }
  }
  for (const value of listOf(item, 'editor')) {
    if (!isObject(value)) continue;
    const family = textOf(value, 'family');
    const given = textOf(value, 'given');
    const name = textOf(value, 'name', 'literal') ?? given;
    builder.addEditor(family ? { family, ...(given ? { given } : {}) } : name ? body(name) : undefined);
  }
}

function fill(builder: EntryBuilder, outer: JsonObject, source: JsonItem): void {
  // One work as the registry answers it stands in an envelope.
  const message = own(outer, 'message');
  const item = isObject(message) && !Object.hasOwn(outer, 'DOI') ? message : outer;
  const text = (...names: string[]) => {
    const value = textOf(item, ...names);
    return value === undefined ? undefined : builder.bounded(value, names[0]);
  };
  builder.setDoi(text('DOI', 'doi'));
  builder.key = builder.fields.identifiers.doi;
  addAuthors(builder, item);
  const title = text('title');
  const subtitle = text('subtitle');
  const pages = text('page');
  const dated = ['published', 'issued', 'published-print', 'published-online', 'created'].map((name) => dateOf(own(item, name))).find((date) => date.year !== undefined);
  builder.set({
    type: types.get(text('type') ?? '') ?? 'other',
    title: title && subtitle && !title.toLowerCase().includes(subtitle.toLowerCase()) ? `${title}: ${subtitle}` : title,
    ...dated,
    venue: text('container-title'),
    venueShort: text('short-container-title'),
    volume: text('volume'),
    issue: text('issue'),
    ...(pages ? parsePages(pages) : {}),
    articleNumber: text('article-number'),
    publisher: text('publisher'),
    place: text('publisher-location'),
    edition: text('edition-number'),
    abstract: text('abstract'),
    language: text('language'),
    url: text('URL'),
    reportedCitations: numberOf(item, 'is-referenced-by-count'),
    declaredReferences: numberOf(item, 'reference-count', 'references-count'),
  });
  for (const subject of listOf(item, 'subject')) if (typeof subject === 'string') builder.addKeywords(subject, /;/);
  for (const name of ['ISSN', 'ISBN']) for (const value of listOf(item, name).slice(0, 20)) if (typeof value === 'string') builder.addSerialNumber(value);
  addReferences(builder, item, source);
  for (const update of listOf(item, 'updated-by')) if (isObject(update) && /retract/i.test(textOf(update, 'type') ?? '')) builder.fields.retracted = true;
  const { url } = builder.fields;
  if (url) builder.identify({ doi: findDoi(url) });
}

function addReferences(builder: EntryBuilder, item: JsonObject, source: JsonItem): void {
  const cited = listOf(item, 'reference');
  if (cited.length === 0) return;
  const objects = cited.filter(isObject);
  if (objects.length < cited.length) builder.problem('warning', 'reference-not-read', `${cited.length - objects.length} elements of "reference" are no objects; they were left out.`);
  const lines = elementLines(source, 'reference');
  builder.addReferences(objects.map((value, index) => reference(value, lines[index] ?? builder.line)));
}

export function createRegistryJsonReader(options: ReaderOptions): Reader {
  const session = new ReadSession('registry-json', options);
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
