/**
 * The shapes that every reader gives and everything behind the readers takes.
 *
 * A reader turns the text of one file into entries. An entry is either a record (it could be read, perhaps with
 * problems) or a rejection (it could not, and says why). Nothing a file holds is lost without an entry or a problem.
 */

/** The formats that Heddle reads, by the name used in the API and stored with an import. */
export const formats = ['bibtex', 'ris', 'csl-json', 'tagged', 'registry-json', 'nbib', 'refer', 'delimited'] as const;
export type Format = (typeof formats)[number];

/** What kind of thing a work is. Reader types that fit none become 'other'. */
export const workTypes = ['article', 'chapter', 'book', 'thesis', 'report', 'conference-paper', 'dataset', 'preprint', 'patent', 'software', 'web', 'other'] as const;
export type WorkType = (typeof workTypes)[number];

/** A name as it was read: a person (family, given, ...) or a body (literal only). */
export interface PersonName {
  family?: string;
  given?: string;
  /** "van der", "de": kept apart from the family name. */
  particle?: string;
  /** "Jr.", "III". */
  suffix?: string;
  /** A corporate author, or a name that could not be taken apart. */
  literal?: string;
  /** Canonical form, with hyphens, only when its check character is right. */
  orcid?: string;
}

/** Identifiers in canonical form (lower-case DOI without prefix, ISSN NNNN-NNNC, ISBN-13). Only valid ones stand here; invalid ones become problems. */
export interface Identifiers {
  doi?: string;
  pmid?: string;
  pmcid?: string;
  arxiv?: string;
  isbn?: string[];
  issn?: string[];
  /** The exporting database's own record id, e.g. the UT tag; unique only within its source. */
  accession?: string;
}

/** One cited reference of a record, as far as its source tells. */
export interface CitedReference {
  /** The reference as it stood in the file (one line, or the JSON object as text). */
  raw: string;
  /** Line of the file on which it begins, counted from 1. */
  line: number;
  doi?: string;
  pmid?: string;
  isbn?: string;
  /** First author as written: "MACARTHUR RH", "de Vries, J." */
  author?: string;
  /** First author's family name as far as it can be told. */
  family?: string;
  year?: number;
  /** Title of the cited work itself, where the source gives one. */
  title?: string;
  /** Journal, book or series it appeared in. */
  source?: string;
  volume?: string;
  issue?: string;
  /** First page or article number. */
  page?: string;
  unstructured?: boolean;
}

/** The parsed fields of a record. Text is Unicode in NFC, without markup. */
export interface RecordFields {
  type: WorkType;
  title?: string;
  authors: PersonName[];
  /** "and others" or "et al." stood in the list. */
  othersFollow?: boolean;
  editors?: PersonName[];
  year?: number;
  month?: number;
  day?: number;
  /** Journal, book or proceedings that holds the work. */
  venue?: string;
  venueShort?: string;
  volume?: string;
  issue?: string;
  firstPage?: string;
  lastPage?: string;
  /** Article number, where there are no pages. */
  articleNumber?: string;
  publisher?: string;
  place?: string;
  edition?: string;
  abstract?: string;
  keywords?: string[];
  language?: string;
  url?: string;
  identifiers: Identifiers;
  retracted?: boolean;
  references: CitedReference[];
  /** The number of references that the source declares, to compare with those it lists. */
  declaredReferences?: number;
  /** A "times cited" figure found in the file; never mixed with Heddle's own counts. */
  reportedCitations?: number;
  /** Affiliations as written. */
  affiliations?: string[];
  /** Citation key or id within the file. */
  key?: string;
  /** Fields and tags that have no place above, by their own name. Values are text; a repeated tag has its values joined by newline. */
  other?: Record<string, string>;
}

/** How bad a problem is: an 'error' lost an entry or a field, a 'warning' means that something was mended or doubted. */
export type Severity = 'error' | 'warning';

/** A problem with its place. */
export interface Problem {
  severity: Severity;
  /** A stable word for the kind of problem, e.g. 'unbalanced-braces', 'invalid-doi', 'reference-count'. */
  code: string;
  /** One plain sentence. Never holds more of the file than 200 characters. */
  message: string;
  /** Line of the file, counted from 1. */
  line: number;
  /** Citation key or record id, if one was read. */
  key?: string;
}

export interface ReadRecord {
  kind: 'record';
  /** Position among the entries of the file, counted from 0. */
  position: number;
  line: number;
  /** The text of the entry as it stands in the file (after decoding), cut at 256 KiB. */
  raw: string;
  fields: RecordFields;
  problems: Problem[];
}

export interface RejectedEntry {
  kind: 'rejected';
  position: number;
  line: number;
  raw: string;
  key?: string;
  problems: Problem[];
}

export type Entry = ReadRecord | RejectedEntry;

/** What a reader gives back beside the entries: problems that belong to no entry (stray text, a file cut short). */
export interface ReadSummary {
  format: Format;
  entries: number;
  problems: Problem[];
}

/** Limits that every reader keeps; exceeding one loses a field or an entry with a problem, never the file. */
export interface ReadLimits {
  /** Characters in one field. */
  fieldLength: number;
  authors: number;
  references: number;
  /** Characters that macros may grow to within one entry. */
  macroGrowth: number;
  /** Characters of raw text kept with an entry. */
  rawLength: number;
}

export const defaultLimits: ReadLimits = {
  fieldLength: 1_000_000,
  authors: 10_000,
  references: 20_000,
  macroGrowth: 1_000_000,
  rawLength: 262_144,
};
