/** RIS: two-character tag, two spaces, hyphen, space; TY opens, ER closes; an untagged line continues the one before. Tag meanings: common practice. */
import { parseAnyReference } from '@/lib/bibliography/cited-reference';
import { parseDate, parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseDoi, normaliseOrcid, normalisePmcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { body, parseInvertedName } from '@/lib/bibliography/names';
import { withoutTags } from '@/lib/bibliography/plain-text';
import { type PersonName, type WorkType } from '@/lib/bibliography/record';
import { type EntryBuilder, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { boundedText, TaggedLineReader, type TaggedValues } from '@/lib/bibliography/readers/tagged-lines';

const types = new Map<string, WorkType>(Object.entries({
  JOUR: 'article', JFULL: 'article', MGZN: 'article', NEWS: 'article', EJOUR: 'article', ABST: 'article', INPR: 'preprint', UNPB: 'preprint', PREPRINT: 'preprint', BOOK: 'book', EBOOK: 'book', EDBOOK: 'book', SER: 'book', CHAP: 'chapter', ECHAP: 'chapter', ENCYC: 'chapter', DICT: 'chapter',
  CONF: 'conference-paper', CPAPER: 'conference-paper', THES: 'thesis', RPRT: 'report', GOVDOC: 'report', STAND: 'report', DATA: 'dataset', DBASE: 'dataset', AGGR: 'dataset', PAT: 'patent', COMP: 'software', ELEC: 'web', WEB: 'web', BLOG: 'web', ICOMM: 'web',
}));

/** The form as it should be, and the spaced differently ones of real files, for which the tag must be a known one. */
const strictLine = /^([A-Z][A-Z0-9]) {2}-(?: (.*)|\s*)$/;
const looseLine = /^\s{0,3}([A-Z][A-Z0-9])\s{0,3}-(?:\s(.*)|(\S.*)|)$/;
const known = new Set(['TY', 'ER', 'AU', 'A1', 'A2', 'A3', 'A4', 'ED', 'TI', 'T1', 'T2', 'T3', 'CT', 'BT', 'JO', 'JF', 'JA', 'J1', 'J2', 'PY', 'Y1', 'Y2', 'DA', 'VL', 'IS', 'CP', 'SP', 'EP', 'DO', 'M1', 'M2', 'M3', 'L1', 'L2', 'L3', 'L4', 'LK', 'AN', 'ID', 'U1', 'U2', 'U3', 'U4', 'U5', 'SN', 'UR', 'AB', 'N1', 'N2',
  'KW', 'PB', 'PP', 'CY', 'ET', 'AD', 'LA', 'DB', 'DP', 'CN', 'CR', 'RP', 'AV', 'SE', 'ST', 'NV', 'OP', 'RI', 'RN', 'TT', 'TA', 'C1', 'C2', 'C3', 'C4', 'C5', 'C6', 'C7', 'C8']);
const placed = new Set(['TY', 'ER', 'AU', 'A1', 'ED', 'A2', 'KW', 'SN', 'AD', 'CR', 'TI', 'T1', 'CT', 'JO', 'JF', 'T2', 'JA', 'J2', 'J1', 'PY', 'Y1', 'DA', 'VL', 'IS', 'CP', 'SP', 'EP', 'PB', 'CY', 'PP', 'ET', 'AB', 'N2', 'LA', 'UR', 'DO', 'ID', 'AN']);

function parseLine(text: string): { tag: string; value: string } | null {
  const strict = strictLine.exec(text);
  if (strict) return { tag: strict[1], value: strict[2] ?? '' };
  const loose = looseLine.exec(text);
  // Without a blank behind the hyphen only the signs of begin and end are believed: "UV-light" continues a line.
  if (!loose || !known.has(loose[1]) || (loose[3] !== undefined && !/^\s{0,3}[A-Z][A-Z0-9] {2}-/.test(text))) return null;
  // "AB - text" may also be the middle of an abstract, but not with two blanks before the hyphen.
  return { tag: loose[1], value: loose[2] ?? loose[3] ?? '' };
}

/** Without a comma, several words are a body more often than a person in this format; initials speak for a person. */
function authorOf(value: string): PersonName | undefined {
  if (value.includes(',') || !/\s/.test(value)) return parseInvertedName(value);
  return /^(?:\p{Lu}\.?\s?){1,3}\p{Lu}\p{Ll}|\s\p{Lu}\.$|^\p{Lu}\p{Ll}+\s(?:\p{Lu}\.?\s)?\p{Lu}\p{Ll}+$/u.test(value) ? parseInvertedName(value) : body(value);
}

class RisReader extends TaggedLineReader implements Reader {
  protected readonly endTag = 'ER';

  constructor(options: ReaderOptions) {
    super('ris', options);
  }

  protected takeLine(text: string, line: number): void {
    const tagged = parseLine(text);
    if (!tagged) {
      if (!this.record) return this.stray(text, line);
      this.record.keepRaw(text);
      if (text.trim() !== '') this.record.continueWith(text, this.record.lastTag === 'N1' || this.record.lastTag === 'CR' ? '\n' : ' ');
      return;
    }
    const { tag, value } = tagged;
    if (tag === 'TY' && this.record) {
      this.session.problem('warning', 'end-missing', 'ER is missing before the next TY; the record was closed there.', line);
      this.close();
    }
    if (!this.record && tag === 'ER') return this.session.problem('warning', 'stray-text', 'ER closes a record that never began.', line);
    if (!this.record && tag !== 'TY') this.session.problem('warning', 'type-missing', `A record begins with ${tag}, without TY before it.`, line);
    const record = this.record ?? this.begin(line);
    record.keepRaw(text);
    record.add(tag, value, line);
    if (tag === 'ER') this.close();
  }

  protected fill(builder: EntryBuilder, values: TaggedValues): boolean {
    if (values.isEmpty('TY', 'ER')) return false;
    const text = (...tags: string[]) => boundedText(builder, values, ...tags);
    const type = text('TY')?.toUpperCase().split(/\s/)[0];
    if (!type) builder.problem('warning', 'type-missing', 'The record names no type after TY.');
    const workType = types.get(type ?? '') ?? 'other';
    for (const { text: name, line } of [...values.all('AU'), ...values.all('A1')]) builder.addAuthor(authorOf(name), line);
    for (const { text: name, line } of [...values.all('ED'), ...values.all('A2')]) builder.addEditor(parseInvertedName(name), line);
    for (const { text: words, line } of values.all('KW')) builder.addKeywords(words, /[;\n]/, line);
    for (const { text: numbers, line } of values.all('SN')) builder.addSerialNumber(numbers, line);
    for (const { text: place, line } of values.all('AD')) builder.addAffiliation(place, line);
    const full = text('JF', 'T2') ?? (workType === 'book' ? undefined : text('BT'));
    const short = text('JA', 'J2', 'J1');
    const venue = full ?? text('JO') ?? short ?? text('T3');
    const title = text('TI', 'T1', 'CT') ?? (workType === 'book' ? text('BT') : undefined);
    builder.set({
      type: workType,
      title: title === undefined ? undefined : withoutTags(title),
      venue,
      venueShort: short !== venue ? short : undefined,
      volume: text('VL'),
      issue: text('IS', 'CP'),
      publisher: text('PB'),
      place: text('CY', 'PP'),
      edition: text('ET'),
      abstract: text('AB', 'N2'),
      language: text('LA'),
      url: text('UR', 'LK', 'L1', 'L2'),
    });
    builder.key = text('ID', 'AN');
    this.fillDate(builder, values);
    this.fillPages(builder, values);
    this.fillIdentifiers(builder, values);
    this.fillReferences(builder, values);
    for (const [tag, all] of values.tags) if (!placed.has(tag)) for (const { text: value, line } of all) builder.other(tag, value, line);
    return true;
  }

  private fillDate(builder: EntryBuilder, values: TaggedValues): void {
    const dates = ['PY', 'Y1', 'DA'].map((tag) => values.first(tag)).filter((found) => found !== undefined);
    if (dates.length === 0) return;
    const parsed = dates.map((found) => parseDate(found.text));
    const dated = parsed.find((date) => date.year !== undefined);
    if (!dated) return builder.problem('warning', 'year-not-read', `"${dates[0].text.slice(0, 60)}" holds no year.`, dates[0].line);
    // PY often has the year alone while DA has the day of the same year.
    const fuller = dated.month ? dated : (parsed.find((date) => date.year === dated.year && date.month) ?? dated);
    builder.set({ year: dated.year, month: fuller.month, day: fuller.day });
  }

  private fillPages(builder: EntryBuilder, values: TaggedValues): void {
    const start = boundedText(builder, values, 'SP');
    const end = boundedText(builder, values, 'EP');
    if (!start) return builder.set({ lastPage: end });
    const { firstPage, lastPage } = parsePages(start);
    // SP may hold the whole range; EP then repeats its end.
    builder.set({ firstPage, lastPage: lastPage ?? (end ? (parsePages(`${firstPage ?? ''}-${end}`).lastPage ?? end) : undefined) });
  }

  private fillIdentifiers(builder: EntryBuilder, values: TaggedValues): void {
    const doi = values.first('DO');
    if (doi) builder.setDoi(doi.text, doi.line);
    // Old files keep the DOI in other places; there only a whole DOI or a resolver's address counts.
    for (const tag of ['M3', 'L3', 'UR', 'L2', 'LK']) for (const { text } of values.all(tag).slice(0, 20)) builder.identify({ doi: /doi\.org\//i.test(text) ? findDoi(text) : tag === 'M3' || tag === 'L3' ? normaliseDoi(text) : undefined });
    for (const tag of ['AN', 'C2', 'U2', 'ID']) {
      for (const { text } of values.all(tag).slice(0, 20)) {
        builder.identify({ pmcid: normalisePmcid(text) });
        if (/pmid/i.test(text)) builder.identify({ pmid: normalisePmid(text) });
      }
    }
    builder.identify({ accession: values.first('AN')?.text.slice(0, 200) });
    const orcid = builder.fields.authors.length === 1 ? normaliseOrcid(values.first('RI', 'C6')?.text ?? '') : undefined;
    if (orcid) builder.fields.authors[0].orcid = orcid;
  }

  private fillReferences(builder: EntryBuilder, values: TaggedValues): void {
    for (const { text, line } of values.all('CR')) builder.addReferences(text.split('\n').map((one, index) => parseAnyReference(one, line + index)));
    for (const { text, line } of values.all('N1')) {
      const times = /^cited by\s{0,9}:\s{0,9}(\d{1,7})/i.exec(text);
      if (times) builder.set({ reportedCitations: Number(times[1]) });
      const label = /^(?:cited )?references?\s{0,9}:/i.exec(text);
      if (!label) continue;
      // One note holds the whole list; items stand on lines of their own or between semicolons.
      text.slice(label[0].length).split('\n').forEach((row, index) => builder.addReferences(row.split(/; /).map((one) => one.trim()).filter((one) => one.length > 10).map((one) => parseAnyReference(one, line + index))));
    }
  }
}

export function createRisReader(options: ReaderOptions): Reader {
  return new RisReader(options);
}
