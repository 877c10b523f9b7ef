/** RIS: two-character tag, two spaces, hyphen, space; TY opens, ER closes; an untagged line continues the one before. Tag meanings: common practice. */
import { parseCitedLine, parseUnstructured } from '@/lib/bibliography/cited-reference';
import { parseDate, parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseDoi, normalisePmcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { body, parseInvertedName } from '@/lib/bibliography/names';
import { type WorkType } from '@/lib/bibliography/record';
import { EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { LineSplitter } from '@/lib/bibliography/readers/lines';

const types = new Map<string, WorkType>(Object.entries({
  JOUR: 'article', JFULL: 'article', MGZN: 'article', NEWS: 'article', EJOUR: 'article', ABST: 'article', INPR: 'preprint', UNPB: 'preprint', BOOK: 'book', EBOOK: 'book', EDBOOK: 'book', CHAP: 'chapter', ECHAP: 'chapter', ENCYC: 'chapter', DICT: 'chapter',
  CONF: 'conference-paper', CPAPER: 'conference-paper', THES: 'thesis', RPRT: 'report', GOVDOC: 'report', STAND: 'report', DATA: 'dataset', DBASE: 'dataset', AGGR: 'dataset', PAT: 'patent', COMP: 'software', ELEC: 'web', WEB: 'web', BLOG: 'web', ICOMM: 'web',
}));

interface Tagged {
  tag: string;
  value: string;
  line: number;
}

const tagLine = /^\s{0,3}([A-Z][A-Z0-9])\s{0,2}-(?:\s|$)(.*)$/;

function fill(builder: EntryBuilder, tags: Tagged[]): void {
  const { fields } = builder;
  const all = (name: string) => tags.filter((one) => one.tag === name && one.value !== '');
  const first = (...names: string[]) => {
    for (const name of names) {
      const found = all(name)[0];
      if (found) return builder.bounded(found.value, name, found.line);
    }
    return undefined;
  };
  const type = first('TY')?.toUpperCase();
  fields.type = types.get(type ?? '') ?? 'other';
  if (!type) builder.problem('warning', 'type-missing', 'The record names no type after TY.');
  for (const { tag, value, line } of tags) {
    if (value === '') continue;
    if (tag === 'AU' || tag === 'A1') builder.addAuthor(/,/.test(value) || !/\s/.test(value) ? parseInvertedName(value) : nameOrBody(value), line);
    else if (tag === 'ED' || tag === 'A2') (fields.editors ??= []).push(parseInvertedName(value) ?? body(value));
    else if (tag === 'KW') builder.addKeywords(value, /;/);
    else if (tag === 'SN') builder.addSerialNumber(value, line);
    else if (tag === 'AD') (fields.affiliations ??= []).push(value.slice(0, 2_000));
    else if (tag === 'CR') builder.addReferences([reference(value, line)]);
  }
  fields.title = first('TI', 'T1', 'CT') ?? (fields.type === 'book' ? first('BT') : undefined);
  fields.venue = first('JO', 'JF', 'T2', 'JA', 'J2', 'J1') ?? (fields.type === 'book' ? undefined : first('BT', 'T3'));
  const full = first('JF', 'T2');
  const short = first('JA', 'J2', 'J1');
  if (full && short && full !== short) Object.assign(fields, { venue: full, venueShort: short });
  const date = first('PY', 'Y1', 'DA');
  if (date) {
    Object.assign(fields, parseDate(date));
    if (fields.year === undefined) {
      Object.assign(fields, parseDate(first('DA') ?? ''));
      if (fields.year === undefined) builder.problem('warning', 'year-not-read', `"${date.slice(0, 60)}" holds no year.`, all('PY')[0]?.line ?? builder.line);
    }
  }
  fields.volume = first('VL');
  fields.issue = first('IS', 'CP');
  const start = first('SP');
  if (start) {
    const pages = parsePages(start);
    fields.firstPage = pages.firstPage;
    fields.lastPage = first('EP') ?? pages.lastPage;
    if (fields.lastPage && start.includes('-')) fields.lastPage = pages.lastPage ?? fields.lastPage;
  }
  fields.publisher = first('PB');
  fields.place = first('CY', 'PP');
  fields.edition = first('ET');
  fields.abstract = first('AB', 'N2');
  fields.language = first('LA');
  fields.url = first('UR', 'LK', 'L1', 'L2');
  builder.key = first('ID', 'AN');
  const doi = first('DO');
  if (doi) builder.setDoi(doi, all('DO')[0].line);
  // Old files keep the DOI in other places; there only a whole DOI or a resolver's address counts.
  for (const name of ['M3', 'L3', 'UR', 'L2']) for (const { value } of all(name)) if (!fields.identifiers.doi) fields.identifiers.doi = name === 'UR' || name === 'L2' ? (/doi\.org\//i.test(value) ? findDoi(value) : undefined) : normaliseDoi(value);
  for (const name of ['AN', 'C2', 'U2']) for (const { value } of all(name)) {
    fields.identifiers.pmcid ??= normalisePmcid(value);
    if (/pmid/i.test(value)) fields.identifiers.pmid ??= normalisePmid(value);
  }
  fields.identifiers.accession = first('AN')?.slice(0, 200);
  for (const { value, line } of all('N1')) {
    const cited = /^\s*(?:cited )?references?\s*:\s*(.+)$/is.exec(value);
    if (cited) builder.addReferences(cited[1].split(/;\s+|\n/).filter((text) => text.trim().length > 10).map((text) => reference(text.trim(), line)));
    const times = /^\s*cited by\s*:\s*(\d{1,7})/i.exec(value);
    if (times) fields.reportedCitations = Number(times[1]);
  }
  if (/^\s*(?:retracted(?: article)?\s*[:.]|\[retracted\])/i.test(fields.title ?? '')) fields.retracted = true;
  const placed = new Set(['TY', 'ER', 'AU', 'A1', 'ED', 'A2', 'KW', 'SN', 'AD', 'CR', 'TI', 'T1', 'JO', 'JF', 'T2', 'JA', 'J2', 'J1', 'PY', 'Y1', 'DA', 'VL', 'IS', 'SP', 'EP', 'PB', 'CY', 'ET', 'AB', 'N2', 'LA', 'UR', 'DO', 'ID', 'AN']);
  for (const { tag, value } of tags) if (!placed.has(tag)) builder.other(tag, value);
}

function reference(text: string, line: number) {
  const found = parseCitedLine(text, line);
  return found.unstructured ? parseUnstructured(text, line) : found;
}

function nameOrBody(value: string) {
  // Without a comma, several words are a body more often than a person in this format; initials at an end speak for a person.
  return /^(?:\p{Lu}\.?\s?){1,3}\p{Lu}\p{Ll}|\s\p{Lu}\.$|^\p{Lu}\p{Ll}+\s(?:\p{Lu}\.?\s)?\p{Lu}\p{Ll}+$/u.test(value) ? parseInvertedName(value) : body(value);
}

export function tidyFields(builder: EntryBuilder): void {
  const { fields } = builder;
  for (const key of Object.keys(fields) as (keyof typeof fields)[]) {
    const value = fields[key];
    if (typeof value === 'string') (fields as unknown as Record<string, unknown>)[key] = value.replace(/\s+/g, ' ').trim().normalize('NFC');
    if (value === undefined || fields[key] === '') delete fields[key];
  }
  for (const key of Object.keys(fields.identifiers) as (keyof typeof fields.identifiers)[]) if (fields.identifiers[key] === undefined) delete fields.identifiers[key];
}

export function createRisReader(options: ReaderOptions): Reader {
  const session = new ReadSession('ris', options);
  let tags: Tagged[] = [];
  let raw: string[] = [];
  let rawLength = 0;
  let begun = 0;
  let stray = 0;

  const close = (): void => {
    if (begun === 0) return;
    const builder = new EntryBuilder(begun, options.limits);
    fill(builder, tags);
    tidyFields(builder);
    const text = raw.join('\n').trimEnd();
    const empty = tags.every((one) => one.tag === 'TY' || one.tag === 'ER' || one.value === '');
    if (empty) builder.problem('error', 'empty-entry', 'The record holds nothing but its type.');
    session.emit((position) => (empty ? builder.rejected(position, text) : builder.record(position, text)));
    tags = [];
    raw = [];
    rawLength = 0;
    begun = 0;
  };

  const lines = new LineSplitter((rawLine, line) => {
    const text = line === 1 ? rawLine.replace(/^\uFEFF/, '') : rawLine;
    const match = tagLine.exec(text);
    if (match) {
      const [, tag, value] = match;
      if (tag === 'TY') {
        if (begun > 0) {
          session.problem('warning', 'end-missing', 'ER is missing before the next TY; the record was closed there.', line);
          close();
        }
        begun = line;
      } else if (begun === 0) {
        if (tag === 'ER') return;
        session.problem('warning', 'type-missing', `A record begins with ${tag}, without TY before it.`, line);
        begun = line;
      }
      tags.push({ tag, value: value.trim(), line });
    } else if (begun > 0 && text.trim() !== '') {
      const last = tags[tags.length - 1];
      if (last && last.value.length < options.limits.fieldLength) last.value += `${last.tag === 'N1' ? '\n' : ' '}${text.trim()}`;
    } else if (text.trim() !== '') {
      stray += 1;
      if (stray <= 100) session.problem('warning', 'stray-text', `Text outside a record: ${text.trim().slice(0, 60)}`, line);
    }
    if (begun > 0 && rawLength <= options.limits.rawLength) {
      raw.push(text);
      rawLength += text.length + 1;
    }
    if (match?.[1] === 'ER') close();
  });
  return {
    write: (text) => lines.write(text),
    end() {
      lines.end();
      if (begun > 0) {
        session.problem('warning', 'end-missing', 'The file ends within a record; ER is missing.', begun);
        close();
      }
      return session.summary();
    },
  };
}
