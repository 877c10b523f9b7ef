/**
 * Tagged text exports with cited-reference lines: two-letter tag, one space, value; continuation three spaces; PT opens, ER closes.
 * Also the tab-delimited form (first line the tags, cited references joined by "; "). Tag meanings: common practice.
 */
import { parseCitedLine, parseUnstructured } from '@/lib/bibliography/cited-reference';
import { parseMonth } from '@/lib/bibliography/dates';
import { normaliseOrcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { body, parseInvertedName } from '@/lib/bibliography/names';
import { findYear } from '@/lib/bibliography/normalise';
import { type WorkType } from '@/lib/bibliography/record';
import { EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { LineSplitter } from '@/lib/bibliography/readers/lines';
import { tidyFields } from '@/lib/bibliography/readers/ris';

const publicationTypes = new Map<string, WorkType>([['J', 'article'], ['B', 'book'], ['C', 'conference-paper'], ['S', 'article'], ['P', 'patent']]);
/** Tags whose every line is an item of its own; all others are wrapped prose. */
const itemised = new Set(['AU', 'AF', 'CR', 'C1', 'BA', 'BF', 'BE', 'GP', 'CA']);
const placed = new Set(['PT', 'AU', 'AF', 'TI', 'SO', 'JI', 'J9', 'DT', 'LA', 'DE', 'ID', 'AB', 'C1', 'CR', 'NR', 'TC', 'PY', 'PD', 'VL', 'IS', 'BP', 'EP', 'AR', 'DI', 'D2', 'PM', 'SN', 'EI', 'BN', 'PU', 'PI', 'UT', 'OI', 'CA', 'GP']);

interface Value {
  text: string;
  line: number;
}
type Tags = Map<string, Value[]>;

function fill(builder: EntryBuilder, tags: Tags): void {
  const { fields } = builder;
  const prose = (...names: string[]): string | undefined => {
    for (const name of names) {
      const values = tags.get(name);
      if (!values) continue;
      const joined = values.map((value) => value.text).join(' ').trim();
      if (joined !== '') return builder.bounded(joined, name, values[0].line);
    }
    return undefined;
  };
  const lineOf = (name: string) => tags.get(name)?.[0].line ?? builder.line;
  const documentType = prose('DT') ?? '';
  fields.type = publicationTypes.get(prose('PT')?.[0] ?? '') ?? 'other';
  if (/proceedings paper/i.test(documentType)) fields.type = 'conference-paper';
  else if (/book chapter/i.test(documentType)) fields.type = 'chapter';
  else if (/data (?:paper|set)/i.test(documentType)) fields.type = 'dataset';
  if (/retracted publication/i.test(documentType)) fields.retracted = true;
  const long = tags.get('AF') ?? [];
  const short = tags.get('AU') ?? [];
  // Full and short forms run in parallel; the full ones are taken when there are as many.
  for (const value of long.length >= short.length ? long : short) if (value.text !== '') builder.addAuthor(/^\[?anonymous\]?$/i.test(value.text) ? undefined : parseInvertedName(value.text), value.line);
  for (const value of [...(tags.get('CA') ?? []), ...(tags.get('GP') ?? [])]) if (value.text !== '') builder.addAuthor(body(value.text), value.line);
  fields.title = prose('TI');
  fields.venue = prose('SO');
  fields.venueShort = prose('JI', 'J9');
  const year = prose('PY');
  fields.year = findYear(year ?? '') ?? findYear(prose('PD') ?? '');
  if (year && fields.year === undefined) builder.problem('warning', 'year-not-read', `"${year.slice(0, 60)}" holds no year.`, lineOf('PY'));
  fields.month = parseMonth((prose('PD') ?? '').split(/[\s-]/)[0]);
  fields.volume = prose('VL');
  fields.issue = prose('IS');
  fields.firstPage = prose('BP');
  fields.lastPage = prose('EP');
  fields.articleNumber = prose('AR');
  fields.publisher = prose('PU');
  fields.place = prose('PI');
  fields.abstract = prose('AB');
  fields.language = prose('LA');
  builder.key = prose('UT');
  fields.identifiers.accession = builder.key?.slice(0, 200);
  builder.setDoi(prose('DI', 'D2'), lineOf(tags.has('DI') ? 'DI' : 'D2'));
  fields.identifiers.pmid = normalisePmid(prose('PM') ?? '');
  for (const name of ['SN', 'EI', 'BN']) {
    const value = prose(name);
    if (value) builder.addSerialNumber(value, lineOf(name));
  }
  for (const name of ['DE', 'ID']) {
    const value = prose(name);
    if (value) builder.addKeywords(value, /;/);
  }
  const affiliations = (tags.get('C1') ?? []).map((value) => value.text).filter(Boolean);
  if (affiliations.length > 0) fields.affiliations = affiliations.slice(0, 1_000).map((text) => text.slice(0, 2_000));
  for (const claim of (prose('OI') ?? '').split(';')) {
    const orcid = normaliseOrcid(claim);
    const family = claim.split(',')[0].trim().toLowerCase();
    const owners = fields.authors.filter((name) => name.family?.toLowerCase() === family);
    if (orcid && owners.length === 1) owners[0].orcid = orcid;
  }
  const times = Number(prose('TC'));
  if (prose('TC') && Number.isInteger(times) && times >= 0) fields.reportedCitations = times;
  const declared = Number(prose('NR'));
  if (prose('NR') && Number.isInteger(declared) && declared >= 0) fields.declaredReferences = declared;
  builder.addReferences(
    (tags.get('CR') ?? []).filter((value) => value.text !== '').map((value) => {
      const text = value.text.slice(0, 10_000);
      const reference = parseCitedLine(text, value.line);
      return reference.unstructured ? parseUnstructured(text, value.line) : reference;
    }),
  );
  for (const [tag, values] of tags) if (!placed.has(tag)) builder.other(tag, values.map((value) => value.text).join(itemised.has(tag) ? '\n' : ' '));
}

export function createTaggedReader(options: ReaderOptions): Reader {
  const session = new ReadSession('tagged', options);
  let tags: Tags = new Map();
  let current: Value[] | null = null;
  let currentTag = '';
  let raw: string[] = [];
  let rawLength = 0;
  let begun = 0;
  let ended = false;
  let header: string[] | null = null;

  const close = (): void => {
    if (begun === 0) return;
    const builder = new EntryBuilder(begun, options.limits);
    fill(builder, tags);
    tidyFields(builder);
    const text = raw.join('\n').trimEnd();
    const empty = !builder.fields.title && builder.fields.authors.length === 0 && !builder.fields.identifiers.doi && builder.fields.references.length === 0;
    if (empty) builder.problem('error', 'empty-entry', 'The record holds neither title nor authors, DOI or references.');
    session.emit((position) => (empty ? builder.rejected(position, text) : builder.record(position, text)));
    tags = new Map();
    current = null;
    raw = [];
    rawLength = 0;
    begun = 0;
  };

  const takeRow = (text: string, line: number): void => {
    if (text.trim() === '') return;
    const cells = text.split('\t');
    begun = line;
    raw = [text];
    (header as string[]).forEach((tag, column) => {
      const cell = cells[column]?.trim();
      if (!cell) return;
      const items = tag === 'CR' || tag === 'AU' || tag === 'AF' || tag === 'C1' ? cell.split(/;\s+/) : [cell];
      tags.set(tag, items.map((item) => ({ text: item.trim(), line })));
    });
    if (cells.length > (header as string[]).length) session.problem('warning', 'too-many-cells', `The line has ${cells.length} cells, the header names ${(header as string[]).length}.`, line);
    close();
  };

  const lines = new LineSplitter((rawLine, line) => {
    const text = line === 1 ? rawLine.replace(/^\uFEFF/, '') : rawLine;
    if (header) return takeRow(text, line);
    if (begun === 0 && /^[A-Z][A-Z0-9]\t(?:[A-Z][A-Z0-9]\t?){4,}/.test(text)) {
      header = text.split('\t').map((tag) => tag.trim());
      return;
    }
    const match = /^([A-Z][A-Z0-9])(?: (.*))?$/.exec(text.trimEnd());
    if (match && /^(?:FN|VR|EF)$/.test(match[1]) && (begun === 0 || match[1] === 'EF')) {
      if (match[1] === 'EF') {
        if (begun > 0) session.problem('warning', 'end-missing', 'ER is missing before the end of the file; the record was closed there.', line);
        close();
        ended = true;
      }
      return;
    }
    if (match && (match[1] === 'PT' || begun === 0)) {
      if (begun > 0) {
        session.problem('warning', 'end-missing', 'ER is missing before the next PT; the record was closed there.', line);
        close();
      }
      if (match[1] === 'ER') return;
      if (match[1] !== 'PT') session.problem('warning', 'type-missing', `A record begins with ${match[1]}, without PT before it.`, line);
      begun = line;
      ended = false;
    }
    if (begun === 0) {
      if (text.trim() !== '' && !ended) session.problem('warning', 'stray-text', `Text outside a record: ${text.trim().slice(0, 60)}`, line);
      return;
    }
    if (rawLength <= options.limits.rawLength) {
      raw.push(text);
      rawLength += text.length + 1;
    }
    if (match?.[1] === 'ER') return close();
    if (match) {
      currentTag = match[1];
      const value = { text: (match[2] ?? '').trim(), line };
      const former = tags.get(currentTag);
      if (former) former.push(value);
      else tags.set(currentTag, [value]);
      current = tags.get(currentTag) as Value[];
    } else if (current && text.trim() !== '') {
      if (itemised.has(currentTag)) current.push({ text: text.trim(), line });
      else if (current[current.length - 1].text.length < options.limits.fieldLength) current[current.length - 1].text += ` ${text.trim()}`;
    }
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
