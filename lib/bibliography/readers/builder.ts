import { normaliseDoi, normaliseIsbn, normaliseIssn } from '@/lib/bibliography/identifiers';
import { type Entry, type Format, type PersonName, type Problem, type ReadLimits, type ReadSummary, type RecordFields } from '@/lib/bibliography/record';

export interface ReaderOptions {
  limits: ReadLimits;
  onEntry: (entry: Entry) => void;
  onProblem: (problem: Problem) => void;
}

/** A push parser: text in, entries out. */
export interface Reader {
  write(text: string): void;
  end(): ReadSummary;
}

/** One entry under construction: collects problems with their place and keeps the limits. */
export class EntryBuilder {
  readonly problems: Problem[] = [];
  readonly fields: RecordFields = { type: 'other', authors: [], identifiers: {}, references: [] };
  key: string | undefined;

  constructor(readonly line: number, private readonly limits: ReadLimits) {}

  problem(severity: Problem['severity'], code: string, message: string, line = this.line): void {
    // A thousand problems of one entry say no more than the first hundred.
    if (this.problems.length < 100) this.problems.push({ severity, code, message: message.slice(0, 400), line, ...(this.key ? { key: this.key.slice(0, 255) } : {}) });
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
    if (doi) this.fields.identifiers.doi ??= doi;
    else this.problem('warning', 'invalid-doi', `"${text.trim().slice(0, 80)}" is not a DOI; it was kept as text only.`, line);
  }

  /** ISSN or ISBN, told apart by their check characters. */
  addSerialNumber(text: string, line = this.line): void {
    const { identifiers } = this.fields;
    let found = false;
    for (const piece of text.split(/[,;]|\s{2,}|\s(?=\d{4}-\d{3})|\band\b/).map((one) => one.trim()).filter(Boolean).slice(0, 50)) {
      const digits = piece.replace(/[^\dXx]/g, '');
      const isbn = digits.length >= 10 ? normaliseIsbn(piece) : undefined;
      const issn = isbn ? undefined : normaliseIssn(piece);
      if (isbn) identifiers.isbn = [...new Set([...(identifiers.isbn ?? []), isbn])];
      else if (issn) identifiers.issn = [...new Set([...(identifiers.issn ?? []), issn])];
      else if (digits.length >= 7) this.problem('warning', 'invalid-serial-number', `"${piece.slice(0, 60)}" is neither a valid ISSN nor a valid ISBN; it was kept as text only.`, line);
      found ||= Boolean(isbn ?? issn);
    }
    if (!found) this.other('serial-number', text);
  }

  addAuthor(name: PersonName | undefined, line = this.line): void {
    if (!name) return;
    if (this.fields.authors.length < this.limits.authors) this.fields.authors.push(name);
    else if (this.fields.authors.length === this.limits.authors && !this.problems.some((problem) => problem.code === 'too-many-authors')) this.problem('error', 'too-many-authors', `More than ${this.limits.authors} authors; the rest was left out.`, line);
  }

  addKeywords(text: string, separator: RegExp): void {
    const words = text.split(separator).map((word) => word.replace(/\s+/g, ' ').trim()).filter((word) => word !== '' && word.length <= 200);
    if (words.length > 0) this.fields.keywords = [...new Set([...(this.fields.keywords ?? []), ...words])].slice(0, 500);
  }

  /** Keeps a field that has no place of its own; a repeated one gets its values joined by newline. */
  other(name: string, value: string): void {
    if (value === '') return;
    const other = (this.fields.other ??= Object.create(null) as Record<string, string>);
    other[name] = other[name] === undefined ? value : `${other[name]}\n${value}`;
  }

  addReferences(references: RecordFields['references']): void {
    const room = this.limits.references - this.fields.references.length;
    this.fields.references.push(...references.slice(0, Math.max(0, room)));
    if (references.length > room) this.problem('error', 'too-many-references', `More than ${this.limits.references} references; the rest was left out.`);
  }

  /** Compares the declared number of references with those listed. */
  checkDeclaredReferences(): void {
    const { declaredReferences, references } = this.fields;
    if (declaredReferences !== undefined && references.length > 0 && declaredReferences !== references.length) this.problem('warning', 'reference-count', `The record declares ${declaredReferences} references and lists ${references.length}.`);
  }

  record(position: number, raw: string): Entry {
    this.checkDeclaredReferences();
    if (this.key !== undefined) this.fields.key = this.key.slice(0, 255);
    // A plain object again: the null prototype was there to withstand names such as __proto__ while filling.
    return { kind: 'record', position, line: this.line, raw: raw.slice(0, this.limits.rawLength), fields: this.fields, problems: this.problems };
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

  emit(make: (position: number) => Entry): void {
    this.options.onEntry(make(this.entries));
    this.entries += 1;
  }

  problem(severity: Problem['severity'], code: string, message: string, line: number): void {
    const problem = { severity, code, message: message.slice(0, 400), line };
    // Hostile input may hold a million stray signs; the first ten thousand are told.
    if (this.problems.length >= 10_000) return;
    this.problems.push(problem);
    this.options.onProblem(problem);
  }

  summary(): ReadSummary {
    return { format: this.format, entries: this.entries, problems: this.problems };
  }
}
