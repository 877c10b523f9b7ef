import { normaliseDoi, normaliseIsbn, normaliseIssn } from '@/lib/bibliography/identifiers';
import { type ColumnKind } from '@/lib/bibliography/readers/delimited-columns';
import { isOthers } from '@/lib/bibliography/names';
import { tidyText } from '@/lib/bibliography/plain-text';
import { type Entry, type Format, type Identifiers, type PersonName, type Problem, type ReadLimits, type ReadSummary, type RecordFields } from '@/lib/bibliography/record';

export interface ReaderOptions {
  limits: ReadLimits;
  /** Of a table: what its columns hold, where their heads do not decide. */
  columns?: readonly (ColumnKind | null)[];
  onEntry: (entry: Entry) => void;
  onProblem: (problem: Problem) => void;
}

/** A push parser: text in, entries out. */
export interface Reader {
  write(text: string): void;
  end(): ReadSummary;
}

const mostProblemsOfEntry = 100;
const mostProblemsOfFile = 10_000;
const mostKeywords = 500;
const mostAffiliations = 1_000;
const mostSerialNumbers = 50;
const mostOtherFields = 1_000;
const retractedTitle = /^\s{0,9}(?:\[?retracted(?: article| paper)?\]?\s{0,3}[:.-]|\[retracted[^\]]{0,40}\])/i;

/** One entry under construction: collects problems with their place and keeps the limits. */
export class EntryBuilder {
  readonly problems: Problem[] = [];
  readonly fields: RecordFields = { type: 'other', authors: [], identifiers: {}, references: [] };
  key: string | undefined;
  /** Made when first needed: most entries have no problem. */
  private told: Set<string> | null = null;
  private otherFields = 0;

  constructor(readonly line: number, readonly limits: ReadLimits) {}

  problem(severity: Problem['severity'], code: string, message: string, line = this.line): void {
    // A thousand problems of one entry say no more than the first hundred.
    if (this.problems.length === mostProblemsOfEntry) this.push('warning', 'more-problems', `The entry has more than ${mostProblemsOfEntry} problems; the rest is not listed.`, line);
    else if (this.problems.length < mostProblemsOfEntry) this.push(severity, code, message, line);
  }

  private push(severity: Problem['severity'], code: string, message: string, line: number): void {
    this.problems.push({ severity, code, message: message.slice(0, 400), line, ...(this.key ? { key: this.key.slice(0, 255) } : {}) });
  }

  /** A problem that is told once for an entry, however often it occurs. */
  private problemOnce(code: string, message: string, line = this.line): void {
    this.told ??= new Set();
    if (this.told.has(code)) return;
    this.told.add(code);
    this.problem('error', code, message, line);
  }

  /** Sets those fields that have a value; text is tidied. */
  set(values: Partial<RecordFields>): void {
    const fields = this.fields as unknown as Record<string, unknown>;
    for (const name in values) {
      const value = values[name as keyof RecordFields];
      const tidy = typeof value === 'string' ? tidyText(value) : value;
      if (tidy !== undefined && tidy !== '') fields[name] = tidy;
    }
  }

  /** Sets those identifiers that have a value and are not known yet. */
  identify(values: Partial<Identifiers>): void {
    const identifiers = this.fields.identifiers as unknown as Record<string, unknown>;
    for (const name in values) {
      const value = values[name as keyof Identifiers];
      if (value !== undefined && value !== '' && identifiers[name] === undefined) identifiers[name] = value;
    }
  }

  /** Cuts a field at the limit and says so. */
  bounded(value: string, name: string, line = this.line): string {
    if (value.length <= this.limits.fieldLength) return value;
    this.problem('error', 'field-too-long', `The field ${name.slice(0, 60)} has ${value.length} characters; it was cut at ${this.limits.fieldLength}.`, line);
    return value.slice(0, this.limits.fieldLength);
  }

  setDoi(text: string | undefined, line = this.line): void {
    if (!text || text.trim() === '') return;
    const doi = normaliseDoi(text);
    if (doi) this.identify({ doi });
    else {
      this.problem('warning', 'invalid-doi', `"${text.trim().slice(0, 80)}" is not a DOI; it was kept as text only.`, line);
      this.other('doi', text.trim().slice(0, 1_000));
    }
  }

  /** ISSN or ISBN, told apart by their check characters. */
  addSerialNumber(text: string, line = this.line): void {
    let found = false;
    for (const piece of text.slice(0, 5_000).split(/[,;]|\s{2,}|\s(?=\d{4}-\d{3})|\band\b/).map((one) => one.trim()).filter(Boolean).slice(0, mostSerialNumbers)) {
      const digits = piece.replace(/[^\dXx]/g, '');
      const isbn = digits.length >= 10 ? normaliseIsbn(piece) : undefined;
      const issn = isbn ? undefined : normaliseIssn(piece);
      if (isbn) this.addNumber('isbn', isbn);
      else if (issn) this.addNumber('issn', issn);
      else if (digits.length >= 7) this.problem('warning', 'invalid-serial-number', `"${piece.slice(0, 60)}" is neither a valid ISSN nor a valid ISBN; it was kept as text only.`, line);
      found ||= Boolean(isbn ?? issn);
    }
    if (!found) this.other('serial-number', text.slice(0, 5_000));
  }

  private addNumber(kind: 'isbn' | 'issn', value: string): void {
    const list = (this.fields.identifiers[kind] ??= []);
    if (!list.includes(value) && list.length < mostSerialNumbers) list.push(value);
  }

  addAuthor(name: PersonName | undefined, line = this.line): void {
    if (!name) return;
    if (isOthers(name)) this.fields.othersFollow = true;
    else if (this.fields.authors.length < this.limits.authors) this.fields.authors.push(name);
    else this.problemOnce('too-many-authors', `More than ${this.limits.authors} authors; the rest was left out.`, line);
  }

  addEditor(name: PersonName | undefined, line = this.line): void {
    if (!name || isOthers(name)) return;
    const editors = (this.fields.editors ??= []);
    if (editors.length < this.limits.authors) editors.push(name);
    else this.problemOnce('too-many-editors', `More than ${this.limits.authors} editors; the rest was left out.`, line);
  }

  addKeywords(text: string, separator: RegExp, line = this.line): void {
    const known = (this.fields.keywords ??= []);
    for (const word of text.split(separator).map((one) => one.replace(/\s+/g, ' ').trim())) {
      if (word === '' || word.length > 200) continue;
      if (known.length >= mostKeywords) {
        this.problemOnce('too-many-keywords', `More than ${mostKeywords} keywords; the rest was left out.`, line);
        break;
      }
      if (!known.includes(word)) known.push(word);
    }
    if (known.length === 0) delete this.fields.keywords;
  }

  addAffiliation(text: string, line = this.line): void {
    const known = (this.fields.affiliations ??= []);
    const place = text.slice(0, 2_000);
    if (known.includes(place)) return;
    if (known.length < mostAffiliations) known.push(place);
    else this.problemOnce('too-many-affiliations', `More than ${mostAffiliations} affiliations; the rest was left out.`, line);
  }

  /** Keeps a field that has no place of its own; a repeated one gets its values joined by newline. */
  other(name: string, value: string, line = this.line): void {
    if (value === '') return;
    // Without prototype: a field may be called __proto__.
    const other = (this.fields.other ??= Object.create(null) as Record<string, string>);
    const former = other[name];
    if (former === undefined) {
      if (this.otherFields >= mostOtherFields) return this.problemOnce('too-many-fields', `More than ${mostOtherFields} fields of unknown kind; the rest stands in the raw text only.`, line);
      this.otherFields += 1;
    }
    if ((former?.length ?? 0) + value.length <= this.limits.fieldLength) other[name] = former === undefined ? value : `${former}\n${value}`;
    else this.problemOnce('field-too-long', `The field ${name.slice(0, 60)} is longer than ${this.limits.fieldLength} characters; the rest was left out.`, line);
  }

  addReferences(references: RecordFields['references']): void {
    const known = this.fields.references;
    for (const reference of references) {
      if (known.length >= this.limits.references) return this.problemOnce('too-many-references', `More than ${this.limits.references} references; the rest was left out.`, reference.line);
      known.push(reference);
    }
  }

  /** True when nothing was read that would tell which work this is. */
  get tellsNothing(): boolean {
    const { title, authors, editors, identifiers, venue, url, references } = this.fields;
    return !title && authors.length === 0 && !editors && !identifiers.doi && !identifiers.pmid && !identifiers.arxiv && !identifiers.isbn && !venue && !url && references.length === 0;
  }

  record(position: number, raw: string): Entry {
    const { fields } = this;
    const { declaredReferences, references } = fields;
    if (declaredReferences !== undefined && references.length > 0 && declaredReferences !== references.length) {
      this.problem('warning', 'reference-count', `The record declares ${declaredReferences} references and lists ${references.length}.`);
    }
    if (retractedTitle.test(fields.title ?? '')) fields.retracted = true;
    if (this.key !== undefined) fields.key = this.key.slice(0, 255);
    return { kind: 'record', position, line: this.line, raw: raw.slice(0, this.limits.rawLength), fields, problems: this.problems };
  }

  rejected(position: number, raw: string): Entry {
    return { kind: 'rejected', position, line: this.line, raw: raw.slice(0, this.limits.rawLength), ...(this.key ? { key: this.key.slice(0, 255) } : {}), problems: this.problems };
  }
}

/** Counts entries and gathers the problems of the file itself. */
export class ReadSession {
  entries = 0;
  readonly problems: Problem[] = [];
  constructor(readonly format: Format, private readonly options: ReaderOptions) {}

  get limits(): ReadLimits {
    return this.options.limits;
  }

  /** Hands an entry over under the next position, or under one that was given out before. */
  emit(make: (position: number) => Entry, position = this.entries): void {
    this.entries += 1;
    this.options.onEntry(make(position));
  }

  problem(severity: Problem['severity'], code: string, message: string, line: number): void {
    // Hostile input may hold a million stray signs; the first ten thousand are told.
    if (this.problems.length < mostProblemsOfFile) this.tell({ severity, code, message: message.slice(0, 400), line });
    else if (this.problems.length === mostProblemsOfFile) this.tell({ severity: 'warning', code: 'more-problems', message: `The file has more than ${mostProblemsOfFile} problems outside its entries; the rest is not listed.`, line });
  }

  private tell(problem: Problem): void {
    this.problems.push(problem);
    this.options.onProblem(problem);
  }

  summary(): ReadSummary {
    return { format: this.format, entries: this.entries, problems: this.problems };
  }
}
