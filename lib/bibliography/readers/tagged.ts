/**
 * Tagged text exports with cited-reference lines: two-letter tag, one space, value; continuation three spaces; PT opens, ER closes.
 * Also the tab-delimited form (first line the tags, cited references joined by "; "). Tag meanings: common practice.
 */
import { parseCitedLine, parseUnstructured } from '@/lib/bibliography/cited-reference';
import { parseMonth } from '@/lib/bibliography/dates';
import { normaliseOrcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { body, parseListedName } from '@/lib/bibliography/names';
import { findYear } from '@/lib/bibliography/normalise';
import { withoutTags } from '@/lib/bibliography/plain-text';
import { type WorkType } from '@/lib/bibliography/record';
import { type EntryBuilder, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { TaggedLineReader, type TaggedValue, type TaggedValues } from '@/lib/bibliography/readers/tagged-lines';

const publicationTypes = new Map<string, WorkType>([['J', 'article'], ['B', 'book'], ['C', 'conference-paper'], ['S', 'article'], ['P', 'patent']]);
/** Tags whose every line is an item of its own; all others are wrapped prose. */
const itemised = new Set(['AU', 'AF', 'CR', 'C1', 'BA', 'BF', 'BE', 'GP', 'CA']);
const placed = new Set(['PT', 'AU', 'AF', 'TI', 'SO', 'JI', 'J9', 'DT', 'LA', 'DE', 'ID', 'AB', 'C1', 'CR', 'NR', 'TC', 'PY', 'PD', 'VL', 'IS', 'BP', 'EP', 'AR', 'DI', 'D2', 'PM', 'SN', 'EI', 'BN', 'PU', 'PI', 'UT', 'OI', 'CA', 'GP', 'BE', 'ED', 'ER']);
const header = /^[A-Z][A-Z0-9]\t(?:[A-Z][A-Z0-9](?:\t|$)){4,}/;
const tagLine = /^([A-Z][A-Z0-9])(?: (.*)|)$/;
const anonymous = /^\[?anonymous\]?$/i;

function fillRecord(builder: EntryBuilder, values: TaggedValues): void {
  const prose = (...tags: string[]): string | undefined => {
    for (const tag of tags) {
      const all = values.all(tag);
      if (all.length > 0) return builder.bounded(all.map((value) => value.text).join(' '), tag, all[0].line);
    }
    return undefined;
  };
  const lineOf = (...tags: string[]) => values.first(...tags)?.line ?? builder.line;
  const number = (tag: string) => (/^\d{1,9}$/.test(prose(tag) ?? '') ? Number(prose(tag)) : undefined);
  const documentType = prose('DT') ?? '';
  const title = prose('TI');
  builder.set({
    type: /proceedings paper/i.test(documentType) ? 'conference-paper' : /book chapter/i.test(documentType) ? 'chapter' : /data (?:paper|set)/i.test(documentType) ? 'dataset' : (publicationTypes.get(prose('PT')?.[0] ?? '') ?? 'other'),
    retracted: /retracted publication/i.test(documentType) || undefined,
    title: title === undefined ? undefined : withoutTags(title),
    venue: prose('SO'),
    venueShort: prose('JI', 'J9'),
    volume: prose('VL'),
    issue: prose('IS'),
    firstPage: prose('BP'),
    lastPage: prose('EP'),
    articleNumber: prose('AR'),
    publisher: prose('PU'),
    place: prose('PI'),
    abstract: prose('AB'),
    language: prose('LA'),
    reportedCitations: number('TC'),
    declaredReferences: number('NR'),
    month: parseMonth(prose('PD') ?? ''),
  });
  builder.key = prose('UT');
  fillNames(builder, values);
  const year = prose('PY');
  const found = findYear(year ?? '') ?? findYear(prose('PD') ?? '');
  builder.set({ year: found });
  if (year && found === undefined) builder.problem('warning', 'year-not-read', `"${year.slice(0, 60)}" holds no year.`, lineOf('PY'));
  builder.setDoi(prose('DI', 'D2'), lineOf('DI', 'D2'));
  builder.identify({ accession: builder.key?.slice(0, 200), pmid: normalisePmid(prose('PM') ?? '') });
  for (const tag of ['SN', 'EI', 'BN']) {
    const value = prose(tag);
    if (value) builder.addSerialNumber(value, lineOf(tag));
  }
  for (const tag of ['DE', 'ID']) {
    const value = prose(tag);
    if (value) builder.addKeywords(value, /;/, lineOf(tag));
  }
  for (const { text, line } of values.all('C1')) builder.addAffiliation(text, line);
  builder.addReferences(values.all('CR').map(({ text, line }) => {
    const reference = parseCitedLine(text, line);
    return reference.unstructured ? parseUnstructured(text, line) : reference;
  }));
  for (const [tag, all] of values.tags) if (!placed.has(tag)) builder.other(tag, all.map((value) => value.text).join(itemised.has(tag) ? '\n' : ' ').trim(), all[0].line);
}

function fillNames(builder: EntryBuilder, values: TaggedValues): void {
  const long = values.all('AF');
  const short = values.all('AU');
  // Full and short forms run in parallel; the full ones are taken when there are as many.
  for (const { text, line } of long.length > 0 && long.length >= short.length ? long : short) if (!anonymous.test(text)) builder.addAuthor(parseListedName(text), line);
  for (const { text, line } of [...values.all('CA'), ...values.all('GP')]) builder.addAuthor(body(text), line);
  for (const { text, line } of [...values.all('BE'), ...values.all('ED')]) builder.addEditor(parseListedName(text), line);
  // "Family, Given/0000-0000-0000-000X; ...": a claim counts when its family name fits one author only.
  const owners = new Map<string, number>();
  builder.fields.authors.forEach((name, at) => {
    const family = (name.particle ? `${name.particle} ${name.family}` : (name.family ?? '')).toLowerCase();
    owners.set(family, owners.has(family) ? -1 : at);
  });
  for (const claim of values.all('OI').map((value) => value.text).join(' ').split(';')) {
    const orcid = normaliseOrcid(claim);
    const at = owners.get(claim.split(',')[0].trim().toLowerCase()) ?? -1;
    if (orcid && at >= 0) builder.fields.authors[at].orcid = orcid;
  }
}

class TaggedReader extends TaggedLineReader implements Reader {
  protected readonly endTag = 'ER';
  /** Tags by column, once the file has turned out to be tab-delimited. */
  private columns: string[] | null = null;

  constructor(options: ReaderOptions) {
    super('tagged', options);
  }

  protected fill(builder: EntryBuilder, values: TaggedValues): boolean {
    fillRecord(builder, values);
    return !builder.tellsNothing;
  }

  private takeRow(columns: string[], text: string, line: number): void {
    if (text.trim() === '') return;
    const cells = text.split('\t');
    const record = this.begin(line);
    record.keepRaw(text);
    columns.forEach((tag, column) => {
      const cell = cells[column]?.trim().replace(/^"(.*)"$/, '$1');
      if (!cell) return;
      const items = itemised.has(tag) && tag !== 'C1' ? cell.split(/; /) : tag === 'C1' ? cell.split(/; (?=\[)/) : [cell];
      for (const item of items) record.add(tag, item, line);
    });
    if (cells.length > columns.length && cells.slice(columns.length).some((cell) => cell.trim() !== '')) this.session.problem('warning', 'too-many-cells', `The line has ${cells.length} cells, the header names ${columns.length}.`, line);
    this.close();
  }

  /** FN, VR and EF frame the file; true when the line was one of them. */
  private takeFrame(tag: string, line: number): boolean {
    if (tag === 'EF') {
      if (this.record) this.session.problem('warning', 'end-missing', 'ER is missing before the end of the file; the record was closed there.', line);
      this.close();
      return true;
    }
    return !this.record && (tag === 'FN' || tag === 'VR');
  }

  protected takeLine(text: string, line: number): void {
    if (this.columns) return this.takeRow(this.columns, text, line);
    if (!this.record && header.test(text)) {
      this.columns = text.trimEnd().split('\t').map((tag) => tag.trim());
      return;
    }
    const match = tagLine.exec(text.trimEnd());
    if (match && this.takeFrame(match[1], line)) return;
    if (match?.[1] === 'PT' && this.record) {
      this.session.problem('warning', 'end-missing', 'ER is missing before the next PT; the record was closed there.', line);
      this.close();
    }
    if (!this.record) {
      if (!match) return this.stray(text, line);
      if (match[1] === 'ER') return this.session.problem('warning', 'stray-text', 'ER closes a record that never began.', line);
      if (match[1] !== 'PT') this.session.problem('warning', 'type-missing', `A record begins with ${match[1]}, without PT before it.`, line);
    }
    const record = this.record ?? this.begin(line);
    record.keepRaw(text);
    if (match?.[1] === 'ER') return this.close();
    const value: TaggedValue = { text: match ? (match[2] ?? '') : text, line };
    if (match) record.add(match[1], value.text, line);
    else if (text.trim() === '') return;
    else if (itemised.has(record.lastTag)) record.add(record.lastTag, value.text, line);
    else record.continueWith(value.text);
  }
}

export function createTaggedReader(options: ReaderOptions): Reader {
  return new TaggedReader(options);
}
