/** DOI-registry JSON: one work, `message.items`, a list of works, or a work a line; cited works in `reference`. */
import { parseUnstructured } from '@/lib/bibliography/cited-reference';
import { parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseDoi, normaliseIsbn, normaliseOrcid } from '@/lib/bibliography/identifiers';
import { familyOf } from '@/lib/bibliography/cited-reference';
import { body } from '@/lib/bibliography/names';
import { findYear } from '@/lib/bibliography/normalise';
import { type CitedReference, type WorkType } from '@/lib/bibliography/record';
import { type EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { takeItem } from '@/lib/bibliography/readers/csl-json';
import { datePartsOf, isObject, JsonItemScanner, listOf, textOf, type JsonObject } from '@/lib/bibliography/readers/json-items';

const types = new Map<string, WorkType>(Object.entries({
  'journal-article': 'article', 'proceedings-article': 'conference-paper', 'book-chapter': 'chapter', 'book-section': 'chapter', 'book-part': 'chapter', 'reference-entry': 'chapter', book: 'book', monograph: 'book', 'edited-book': 'book', 'reference-book': 'book', proceedings: 'book',
  'book-series': 'book', dissertation: 'thesis', report: 'report', 'report-component': 'report', standard: 'report', dataset: 'dataset', database: 'dataset', 'posted-content': 'preprint', 'peer-review': 'other', component: 'other',
}));

function reference(value: JsonObject, line: number): CitedReference {
  const unstructured = textOf(value, 'unstructured');
  const found: CitedReference = unstructured ? parseUnstructured(unstructured, line) : { raw: '', line };
  found.raw = unstructured ?? JSON.stringify(value).slice(0, 4_000);
  const doi = normaliseDoi(textOf(value, 'DOI') ?? '');
  if (doi) found.doi = doi;
  const author = textOf(value, 'author');
  if (author) {
    found.author = author.slice(0, 300);
    found.family = familyOf(author);
  }
  const year = findYear(textOf(value, 'year') ?? '');
  if (year) found.year = year;
  const title = textOf(value, 'article-title');
  const source = textOf(value, 'journal-title', 'volume-title', 'series-title');
  if (title) found.title = title;
  if (source) found.source = source;
  // A book has its title in volume-title, and nothing else names it.
  if (!title && !textOf(value, 'journal-title') && textOf(value, 'volume-title')) found.title = textOf(value, 'volume-title');
  found.volume = textOf(value, 'volume');
  found.issue = textOf(value, 'issue');
  found.page = textOf(value, 'first-page');
  found.isbn = normaliseIsbn(textOf(value, 'ISBN') ?? '');
  if (found.author || found.source || found.title) delete found.unstructured;
  for (const key of Object.keys(found) as (keyof CitedReference)[]) if (found[key] === undefined) delete found[key];
  return found;
}

function fill(builder: EntryBuilder, outer: JsonObject): void {
  // One work as the registry answers it stands in an envelope.
  const item = isObject(outer.message) && !Object.hasOwn(outer, 'DOI') ? outer.message : outer;
  const { fields } = builder;
  const text = (...names: string[]) => {
    const value = textOf(item, ...names);
    return value === undefined ? undefined : builder.bounded(value, names[0]);
  };
  builder.setDoi(text('DOI', 'doi'));
  builder.key = fields.identifiers.doi;
  fields.type = types.get(text('type') ?? '') ?? 'other';
  const title = text('title');
  const subtitle = text('subtitle');
  fields.title = title && subtitle && !title.toLowerCase().includes(subtitle.toLowerCase()) ? `${title}: ${subtitle}` : title;
  for (const value of listOf(item, 'author')) {
    if (!isObject(value)) continue;
    const family = textOf(value, 'family');
    const orcid = normaliseOrcid(textOf(value, 'ORCID') ?? '');
    const given = textOf(value, 'given');
    const suffix = textOf(value, 'suffix');
    const name = textOf(value, 'name');
    if (family) builder.addAuthor({ family, ...(given ? { given } : {}), ...(suffix ? { suffix } : {}), ...(orcid ? { orcid } : {}) });
    else if (name ?? given) builder.addAuthor(body((name ?? given) as string));
    for (const affiliation of listOf(value, 'affiliation').slice(0, 20)) {
      const place = isObject(affiliation) ? textOf(affiliation, 'name') : undefined;
      if (place) (fields.affiliations ??= []).push(place.slice(0, 2_000));
    }
  }
  if (fields.affiliations) fields.affiliations = [...new Set(fields.affiliations)].slice(0, 1_000);
  for (const name of ['published', 'issued', 'published-print', 'published-online', 'created']) {
    const [year, month, day] = datePartsOf(Object.hasOwn(item, name) ? item[name] : undefined);
    if (year === undefined || year < 1000 || year > 2200) continue;
    Object.assign(fields, { year, month: month && month <= 12 ? month : undefined, day: day && day <= 31 ? day : undefined });
    break;
  }
  fields.venue = text('container-title');
  fields.venueShort = text('short-container-title');
  fields.volume = text('volume');
  fields.issue = text('issue');
  const pages = text('page');
  if (pages) Object.assign(fields, parsePages(pages));
  fields.articleNumber = text('article-number');
  fields.publisher = text('publisher');
  fields.place = text('publisher-location');
  fields.abstract = text('abstract');
  fields.language = text('language');
  fields.url = text('URL');
  const subjects = listOf(item, 'subject').filter((value) => typeof value === 'string');
  if (subjects.length > 0) fields.keywords = subjects.slice(0, 200);
  for (const name of ['ISSN', 'ISBN']) for (const value of listOf(item, name).slice(0, 20)) if (typeof value === 'string') builder.addSerialNumber(value);
  const times = Number(text('is-referenced-by-count') ?? NaN);
  if (Number.isInteger(times)) fields.reportedCitations = times;
  const declared = Number(text('reference-count', 'references-count') ?? NaN);
  if (Number.isInteger(declared)) fields.declaredReferences = declared;
  const cited = listOf(item, 'reference').filter(isObject);
  builder.addReferences(cited.map((value) => reference(value, builder.line)));
  for (const update of listOf(item, 'updated-by')) if (isObject(update) && /retract/i.test(textOf(update, 'type') ?? '')) fields.retracted = true;
  if (/^\s*(?:retracted(?: article)?\s*[:.]|\[retracted\])/i.test(fields.title ?? '')) fields.retracted = true;
  if (!fields.identifiers.doi && fields.url) fields.identifiers.doi = findDoi(fields.url);
}

export function createRegistryJsonReader(options: ReaderOptions): Reader {
  const session = new ReadSession('registry-json', options);
  const scanner = new JsonItemScanner((item) => takeItem(session, options, item, fill), (code, message, line) => session.problem('error', code, message, line));
  return {
    write: (text) => scanner.write(text),
    end() {
      scanner.end();
      return session.summary();
    },
  };
}
