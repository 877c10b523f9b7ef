/**
 * Delimited tables (RFC 4180, and what spreadsheets make of it): one work a row, columns told by their heads.
 * Rows are told by line; a column without a known head is kept under its own name.
 */
import { parseAnyReference } from '@/lib/bibliography/cited-reference';
import { parseDate, parsePages } from '@/lib/bibliography/dates';
import { normalisePmid } from '@/lib/bibliography/identifiers';
import { body, parseListedName } from '@/lib/bibliography/names';
import { EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { isSeparatorLine, readTableHead, type ColumnKind, type TableHead } from '@/lib/bibliography/readers/delimited-columns';
import { DelimitedRows, type DelimitedRow } from '@/lib/bibliography/readers/delimited-rows';
import { type PersonName, type ReadSummary, type WorkType } from '@/lib/bibliography/record';

const longestHead = 100_000;
/** "Brae A., Castellano B.": names that carry initials and are parted by commas alone. */
const initialedName = /^[^,;]{1,60}\s(?:\p{Lu}\.?[-\s]?){1,4}$/u;

const types: [RegExp, WorkType][] = [
  [/\b(?:conference|proceedings|konferenz|congreso)/i, 'conference-paper'],
  [/\bchapter|kapitel|cap[ií]tulo/i, 'chapter'],
  [/\b(?:thesis|dissertation|tesis)/i, 'thesis'],
  [/\b(?:report|bericht|informe)/i, 'report'],
  [/\bpreprint/i, 'preprint'],
  [/\bdata\s?set/i, 'dataset'],
  [/\bpatent/i, 'patent'],
  [/\bsoftware/i, 'software'],
  [/\b(?:book|buch|libro|monograph)/i, 'book'],
  [/\b(?:article|review|journal|letter|note|editorial|artikel|art[ií]culo)/i, 'article'],
  [/\bweb/i, 'web'],
];

/** Authors of one cell: parted by semicolons, bars or line ends, else by "and", else by commas where every part carries its initials. */
export function splitNames(cell: string): string[] {
  const text = cell.trim();
  const parts = (pieces: string[]) => pieces.map((piece) => piece.trim()).filter((piece) => piece !== '');
  if (/[;|\n]/.test(text)) return parts(text.split(/[;|\n]/));
  if (/\s(?:and|&|und|y)\s/.test(text)) return parts(text.split(/,?\s(?:and|&|und|y)\s/).flatMap((piece) => splitByInitials(piece)));
  return splitByInitials(text);
}

function splitByInitials(text: string): string[] {
  const pieces = text.split(',').map((piece) => piece.trim()).filter((piece) => piece !== '');
  return pieces.length > 1 && pieces.every((piece) => initialedName.test(piece)) ? pieces : [text];
}

const nameOf = (text: string): PersonName | undefined => (/\b(?:university|institute|consortium|group|committee|organi[sz]ation|ministry|agency)\b/i.test(text) ? body(text) : parseListedName(text));

/** One reference a line, or parted by semicolons. */
function splitReferences(cell: string): string[] {
  return (cell.includes('\n') ? cell.split('\n') : cell.split(/;\s/)).map((one) => one.trim().replace(/;$/, '')).filter((one) => one !== '');
}

class DelimitedReader implements Reader {
  private readonly session: ReadSession;
  private beginning = '';
  private linesBefore = 0;
  private rows: DelimitedRows | null = null;
  private head: TableHead | null = null;
  private failed = false;

  constructor(private readonly options: ReaderOptions) {
    this.session = new ReadSession('delimited', options);
  }

  write(text: string): void {
    if (this.rows) return this.rows.write(text);
    // Of a refused table the text alone is kept, as much of it as of any entry.
    if (!this.failed) this.beginning += text;
    else if (this.beginning.length < this.session.limits.rawLength) this.beginning += text.slice(0, this.session.limits.rawLength);
    this.begin(false);
  }

  end(): ReadSummary {
    this.begin(true);
    if (this.failed) this.refuse(this.beginning);
    this.rows?.end();
    return this.session.summary();
  }

  /** Looks for the head of the table: the first line that says something, after a "sep=" line if there is one. */
  private begin(whole: boolean): void {
    while (!this.rows && !this.failed) {
      const end = this.beginning.indexOf('\n');
      if (end < 0 && !whole && this.beginning.length <= longestHead) return;
      if (end < 0 && this.beginning === '') return;
      const text = end < 0 ? this.beginning : this.beginning.slice(0, end);
      this.linesBefore += 1;
      const rest = end < 0 ? '' : this.beginning.slice(end + 1);
      const tooLongForHead = text.length > longestHead;
      if (!tooLongForHead && (text.replace(/^\uFEFF/, '').trim() === '' || isSeparatorLine(text))) {
        this.beginning = rest;
        continue;
      }
      this.head = tooLongForHead ? null : readTableHead(text, this.options.columns);
      this.failed = !this.head;
      if (!this.head) return;
      this.beginning = '';
      const tooLong = (line: number) => this.session.problem('error', 'line-too-long', 'The line is too long; the rest of it was left out.', line);
      this.rows = new DelimitedRows(this.head.delimiter, this.session.limits.fieldLength, (row) => this.take(row), tooLong, this.linesBefore);
      this.rows.write(rest);
    }
  }

  private refuse(text: string): void {
    const builder = new EntryBuilder(this.linesBefore, this.session.limits);
    builder.problem('error', 'no-columns', 'The first line names no column that tells what a work is. Name at least "Title" or "DOI", and one more, e.g. "Authors", "Year", "Journal", "References".');
    this.session.emit((position) => builder.rejected(position, text));
  }

  private take(row: DelimitedRow): void {
    if (row.cells.every((cell) => cell.trim() === '')) return;
    const head = this.head as TableHead;
    const builder = new EntryBuilder(row.line, this.session.limits);
    if (row.unclosed) builder.problem('warning', 'unclosed-quote', 'A quotation mark is opened and never closed; the line was read as it stands.');
    if (row.cells.slice(head.columns.length).some((cell) => cell.trim() !== '')) {
      builder.problem('warning', 'too-many-cells', `The row has ${row.cells.length} cells under ${head.columns.length} heads; those without a head were kept as text.`);
      builder.other('cells without a head', row.cells.slice(head.columns.length).join(head.delimiter));
    }
    const values = new Map<ColumnKind, string>();
    head.columns.forEach((kind, at) => {
      const cell = builder.bounded(row.cells[at]?.trim() ?? '', head.heads[at] || `column ${at + 1}`);
      if (cell === '') return;
      // The first column of a kind counts; a second one is kept by its name. Serial numbers, keywords and places add up.
      if (kind === 'serial') builder.addSerialNumber(cell);
      else if (kind === 'keywords') builder.addKeywords(cell, /[;|\n]/.test(cell) ? /[;|\n]/ : /,/);
      else if (kind === 'affiliations') cell.split(/;\s|\n/).forEach((place) => builder.addAffiliation(place.trim()));
      else if (kind && !values.has(kind)) values.set(kind, cell);
      else builder.other(head.heads[at] || `column ${at + 1}`, cell);
    });
    this.fill(builder, values);
    if (builder.tellsNothing) {
      builder.problem('error', 'empty-entry', 'The row holds nothing that tells which work it is.');
      this.session.emit((position) => builder.rejected(position, row.raw));
    } else this.session.emit((position) => builder.record(position, row.raw));
  }

  private fill(builder: EntryBuilder, values: Map<ColumnKind, string>): void {
    const text = (kind: ColumnKind) => values.get(kind);
    const type = text('type');
    const dated = text('year');
    builder.key = text('key');
    builder.set({
      type: (type && types.find(([sign]) => sign.test(type))?.[1]) || (type || !text('venue') ? 'other' : 'article'),
      title: text('title'),
      ...(dated ? parseDate(dated) : {}),
      venue: text('venue') ?? text('venueShort'),
      venueShort: text('venueShort'),
      volume: text('volume'),
      issue: text('issue'),
      ...(text('pages') ? parsePages(text('pages') as string) : {}),
      firstPage: text('firstPage') ?? (text('pages') ? parsePages(text('pages') as string).firstPage : undefined),
      lastPage: text('lastPage') ?? (text('pages') ? parsePages(text('pages') as string).lastPage : undefined),
      articleNumber: text('articleNumber'),
      publisher: text('publisher'),
      place: text('place'),
      abstract: text('abstract'),
      language: text('language'),
      url: text('url'),
    });
    if (dated && builder.fields.year === undefined) builder.problem('warning', 'year-not-read', `"${dated.slice(0, 60)}" holds no year.`);
    builder.setDoi(text('doi'));
    builder.identify({ pmid: normalisePmid(text('pmid') ?? '') });
    for (const name of splitNames(text('authors') ?? '')) builder.addAuthor(nameOf(name));
    for (const name of splitNames(text('editors') ?? '')) builder.addEditor(nameOf(name));
    const references = text('references');
    // The list of a row stands in the row; its line is the row's.
    if (references) builder.addReferences(splitReferences(references).map((raw) => parseAnyReference(raw, builder.line)));
  }
}

export function createDelimitedReader(options: ReaderOptions): Reader {
  return new DelimitedReader(options);
}
