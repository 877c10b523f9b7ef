/**
 * A work's canonical fields from the records that stand on it: the fullest record first, what it lacks from the next.
 * Depends on the set of records alone. Ties in fullness are settled by the records' own text, never by their ids.
 */
import { formatNames } from '@/lib/bibliography/names';
import { normaliseText } from '@/lib/bibliography/normalise';
import { type Identifiers, type RecordFields } from '@/lib/bibliography/record';

export interface DeriveInput {
  id: number;
  fields: RecordFields;
  /** Number of references in the record; its reference list is kept apart from `fields`. */
  referenceCount: number;
  /** Stable text that settles ties, e.g. the stored JSON of the fields. */
  tieBreak: string;
}

export interface DerivedWork {
  fields: Omit<RecordFields, 'references'>;
  authorsLabel: string | null;
  /** For sorting: normalised title, cut at 160 characters. */
  titleSort: string | null;
  firstFamily: string | null;
  /** The record whose reference list the work cites by (the longest one); null when none has references. */
  citingRecordId: number | null;
  /** Records in order of fullness. */
  order: number[];
}

const single = ['title', 'year', 'venue', 'venueShort', 'volume', 'issue', 'firstPage', 'lastPage', 'articleNumber', 'publisher', 'place', 'edition', 'abstract', 'language', 'url', 'month', 'day'] as const;

function fullness(input: DeriveInput): number {
  const { fields } = input;
  let points = single.reduce((sum, name) => sum + (fields[name] === undefined ? 0 : 1), 0);
  if (fields.identifiers.doi) points += 4;
  if (fields.authors.length > 0) points += fields.othersFollow ? 1 : 2;
  if (fields.keywords?.length) points += 1;
  if (fields.type !== 'other') points += 1;
  if (input.referenceCount > 0) points += 2;
  return points;
}

function mergeIdentifiers(inputs: DeriveInput[]): Identifiers {
  const merged: Identifiers = {};
  for (const { fields } of inputs) {
    for (const name of ['doi', 'pmid', 'pmcid', 'arxiv'] as const) {
      const value = fields.identifiers[name];
      if (value && (merged[name] === undefined || value < merged[name])) merged[name] = value;
    }
    for (const name of ['isbn', 'issn'] as const) {
      const values = fields.identifiers[name];
      if (values?.length) merged[name] = [...new Set([...(merged[name] ?? []), ...values])].sort();
    }
  }
  return merged;
}

/** @throws never for a non-empty list; an empty list is a programming error */
export function deriveWork(inputs: DeriveInput[]): DerivedWork {
  if (inputs.length === 0) throw new Error('A catalogued work stands on at least one record.');
  const ordered = [...inputs].sort((a, b) => fullness(b) - fullness(a) || (a.tieBreak < b.tieBreak ? -1 : a.tieBreak > b.tieBreak ? 1 : 0));
  const fields: Omit<RecordFields, 'references'> = { type: 'other', authors: [], identifiers: mergeIdentifiers(ordered) };
  const take = <Name extends (typeof single)[number]>(name: Name) => {
    const holder = ordered.find((input) => input.fields[name] !== undefined);
    if (holder) fields[name] = holder.fields[name];
  };
  for (const name of single) take(name);
  fields.type = ordered.find((input) => input.fields.type !== 'other')?.fields.type ?? 'other';
  const withAuthors = ordered.find((input) => input.fields.authors.length > 0 && !input.fields.othersFollow) ?? ordered.find((input) => input.fields.authors.length > 0);
  if (withAuthors) {
    fields.authors = withAuthors.fields.authors;
    if (withAuthors.fields.othersFollow) fields.othersFollow = true;
  }
  const keywords = [...new Set(ordered.flatMap((input) => input.fields.keywords ?? []))];
  if (keywords.length > 0) fields.keywords = keywords.slice(0, 100);
  if (ordered.some((input) => input.fields.retracted)) fields.retracted = true;

  const citing = ordered.reduce<DeriveInput | null>((best, input) => (input.referenceCount > (best?.referenceCount ?? 0) ? input : best), null);
  const first = fields.authors[0];
  return {
    fields,
    authorsLabel: fields.authors.length > 0 ? formatNames(fields.authors, 3).slice(0, 300) : null,
    titleSort: fields.title ? normaliseText(fields.title).slice(0, 160) || fields.title.slice(0, 160).toLowerCase() : null,
    firstFamily: first ? (first.family ?? first.literal ?? '').slice(0, 120) || null : null,
    citingRecordId: citing?.id ?? null,
    order: ordered.map((input) => input.id),
  };
}
