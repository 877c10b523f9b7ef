/** MEDLINE text (nbib): tag padded to four characters, hyphen, space; continuation six spaces; a record ends at a blank line. It has no reference lists. */
import { parseDate, parsePages } from '@/lib/bibliography/dates';
import { normaliseDoi, normaliseOrcid, normalisePmcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { body, parseListedName } from '@/lib/bibliography/names';
import { type WorkType } from '@/lib/bibliography/record';
import { type EntryBuilder, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { boundedText, TaggedLineReader, type TaggedValues } from '@/lib/bibliography/readers/tagged-lines';

const tagLine = /^([A-Z][A-Z0-9]{1,3}) {0,2}-(?: (.*)|)$/;
const placed = new Set(['PMID', 'PMC', 'TI', 'BTI', 'AB', 'OAB', 'FAU', 'AU', 'AD', 'AUID', 'CN', 'ED', 'FED', 'JT', 'TA', 'IS', 'ISBN', 'DP', 'VI', 'IP', 'PG', 'PT', 'LA', 'MH', 'OT', 'LID', 'AID', 'PL', 'PB', 'RF']);

function typeOf(kinds: string[]): WorkType {
  const told = (pattern: RegExp) => kinds.some((kind) => pattern.test(kind));
  if (told(/preprint/i)) return 'preprint';
  if (told(/book chapter|study guide/i)) return 'chapter';
  if (told(/^book/i)) return 'book';
  if (told(/dataset/i)) return 'dataset';
  if (told(/technical report/i)) return 'report';
  return 'article';
}

class NbibReader extends TaggedLineReader implements Reader {
  protected readonly endTag = undefined;

  constructor(options: ReaderOptions) {
    super('nbib', options);
  }

  protected takeLine(text: string, line: number): void {
    if (text.trim() === '') return this.close();
    // The hyphen stands in the fifth column whatever the length of the tag: prose cannot be taken for a tag.
    const match = text[4] === '-' ? tagLine.exec(text.trimEnd()) : null;
    if (!match) {
      if (!this.record) return this.stray(text, line);
      this.record.keepRaw(text);
      return this.record.continueWith(text);
    }
    if (match[1] === 'PMID' && this.record?.values.has('PMID')) this.close();
    const record = this.record ?? this.begin(line);
    record.keepRaw(text);
    record.add(match[1], match[2] ?? '', line);
  }

  protected fill(builder: EntryBuilder, values: TaggedValues): boolean {
    const text = (...tags: string[]) => boundedText(builder, values, ...tags);
    const kinds = values.all('PT').map((value) => value.text);
    const pages = text('PG');
    builder.key = text('PMID', 'PMC');
    builder.set({
      type: typeOf(kinds),
      retracted: kinds.some((kind) => /^retracted publication/i.test(kind)) || undefined,
      title: text('TI', 'BTI'),
      ...parseDate(text('DP') ?? text('DEP') ?? ''),
      venue: text('JT') ?? (values.has('TI') ? text('BTI') : undefined) ?? text('TA'),
      venueShort: values.has('JT') ? text('TA') : undefined,
      volume: text('VI'),
      issue: text('IP'),
      ...(pages ? parsePages(pages) : {}),
      publisher: text('PB'),
      place: text('PL'),
      abstract: text('AB', 'OAB'),
      language: text('LA'),
      declaredReferences: /^\d{1,6}$/.test(text('RF') ?? '') ? Number(text('RF')) : undefined,
    });
    if (values.has('DP') && builder.fields.year === undefined) builder.problem('warning', 'year-not-read', `"${(text('DP') ?? '').slice(0, 60)}" holds no year.`, values.first('DP')?.line);
    this.fillNames(builder, values);
    builder.identify({ pmid: normalisePmid(text('PMID') ?? ''), pmcid: normalisePmcid(text('PMC') ?? '') });
    for (const { text: id, line } of [...values.all('LID'), ...values.all('AID')]) {
      const doi = /^(.+)\s\[doi\]$/i.exec(id);
      if (!doi) continue;
      if (normaliseDoi(doi[1])) builder.identify({ doi: normaliseDoi(doi[1]) });
      else builder.setDoi(doi[1], line);
    }
    for (const { text: number, line } of [...values.all('IS'), ...values.all('ISBN')]) builder.addSerialNumber(number.replace(/\s*\([^()]{0,40}\)$/, ''), line);
    for (const { text: word, line } of [...values.all('OT'), ...values.all('MH')]) builder.addKeywords(word, /\n/, line);
    for (const { text: place, line } of values.all('AD')) builder.addAffiliation(place, line);
    for (const [tag, all] of values.tags) if (!placed.has(tag)) for (const { text: value, line } of all) builder.other(tag, value, line);
    return !builder.tellsNothing;
  }

  private fillNames(builder: EntryBuilder, values: TaggedValues): void {
    const long = values.all('FAU');
    const short = values.all('AU');
    // Full and short names run in pairs; the full ones are taken when there are as many.
    const names = long.length >= short.length ? long : short;
    for (const { text, line } of names) builder.addAuthor(parseListedName(text), line);
    for (const { text, line } of values.all('CN')) builder.addAuthor(body(text), line);
    for (const { text, line } of values.has('FED') ? values.all('FED') : values.all('ED')) builder.addEditor(parseListedName(text), line);
    // An author's id stands behind the author, before the next one.
    for (const { text, line } of values.all('AUID').slice(0, 1_000)) {
      const orcid = normaliseOrcid(text);
      const after = names.findIndex((name) => name.line > line);
      const owner = builder.fields.authors[(after < 0 ? names.length : after) - 1];
      if (orcid && owner) owner.orcid = orcid;
    }
  }
}

export function createNbibReader(options: ReaderOptions): Reader {
  return new NbibReader(options);
}
