/** Turns an entry, as a reader gave it, into rows of the database. Runs in the reading thread; the worker only writes what comes out. */
import { keyHashHex } from '@/lib/catalogue/key-hash';
import { recordKeys, referenceKeys } from '@/lib/linking/keys';
import { type CitedReference, type Entry, type Problem } from '@/lib/bibliography/record';

export interface RecordRow {
  position: number;
  line: number;
  entryKey: string | null;
  title: string | null;
  raw: string;
  fields: string | null;
  rejected: boolean;
  referenceCount: number;
  keys: { hash: string; kind: 1 | 2 | 3 | 4 }[];
  references: { line: number; raw: string; variant: string }[];
}

/** A row of reference_variants, in the order of `variantColumns`. */
export type VariantRow = (string | number | null)[];

/** The first five hold hashes: hexadecimal here, since text crosses from thread to thread much faster than buffers do. */
export const variantColumns = ['hash', 'identifierKey', 'fieldKey', 'titleKey', 'ownKey', 'doi', 'pmid', 'author', 'family', 'year', 'title', 'source', 'volume', 'issue', 'page', 'raw'] as const;

export const variantHashes = 5;

export interface ProblemRow extends Problem {
  position: number | null;
}

export interface Batch {
  records: RecordRow[];
  variants: VariantRow[];
  problems: ProblemRow[];
  /** Bytes of the file read so far. */
  bytes: number;
}

const cut = (text: string | undefined, length: number): string | null => (text ? text.slice(0, length) : null);

/** The variant of a reference: its hash is made of all that is shown of it, so that a row is the same whichever reference made it first. */
function variantRow(reference: CitedReference): { hash: string; row: VariantRow } {
  const keys = referenceKeys(reference);
  const shown = [
    cut(reference.doi, 300), cut(reference.pmid, 20), cut(reference.author, 200), cut(reference.family, 120), reference.year ?? null, cut(reference.title, 600), cut(reference.source, 300),
    cut(reference.volume, 60), cut(reference.issue, 60), cut(reference.page, 60),
  ] as const;
  const told = [reference.author, reference.title, reference.source].some(Boolean);
  const raw = told ? '' : reference.raw.slice(0, 1000);
  const hash = keyHashHex(JSON.stringify([...shown, keys.ownKey, raw]));
  const [doi, pmid, author, family, year, title, source, volume, issue, page] = shown;
  const hashed = (key: string | null) => (key ? keyHashHex(key) : null);
  return { hash, row: [hash, hashed(keys.identifierKey), hashed(keys.fieldKey), hashed(keys.titleKey), hashed(keys.ownKey), doi, pmid, author, family, year, title, source, volume, issue, page, raw] };
}

/** Collects rows until somebody takes them; remembers the references already met, so that one file works each out once. */
export class BatchBuilder {
  private batch: Batch = { records: [], variants: [], problems: [], bytes: 0 };
  /** Hash by the reference as it stood: most references of a file stand in it more than once. */
  private readonly known = new Map<string, string>();
  private weight = 0;

  addEntry(entry: Entry): void {
    for (const problem of entry.problems) this.addProblem(problem, entry.position);
    if (entry.kind === 'rejected') {
      this.batch.records.push({ position: entry.position, line: entry.line, entryKey: cut(entry.key, 255), title: null, raw: entry.raw, fields: null, rejected: true, referenceCount: 0, keys: [], references: [] });
      this.weight += 1;
      return;
    }
    const { references, ...fields } = entry.fields;
    const keys = recordKeys(entry.fields);
    const rows: RecordRow['references'] = references.map((reference) => {
      let hash = this.known.get(reference.raw);
      if (!hash) {
        const variant = variantRow(reference);
        hash = variant.hash;
        // Bounded: forgetting only costs a row that the database ignores.
        if (this.known.size > 500_000) this.known.clear();
        this.known.set(reference.raw, hash);
        this.batch.variants.push(variant.row);
      }
      return { line: reference.line, raw: reference.raw.slice(0, 4000), variant: hash };
    });
    this.batch.records.push({
      position: entry.position,
      line: entry.line,
      entryKey: cut(fields.key, 255),
      title: cut(fields.title, 500),
      raw: entry.raw,
      fields: JSON.stringify(fields),
      rejected: false,
      referenceCount: references.length,
      keys: [
        ...keys.identifiers.map((key) => ({ hash: keyHashHex(key), kind: 1 as const })),
        ...(keys.fingerprint ? [{ hash: keyHashHex(keys.fingerprint), kind: 2 as const }] : []),
        ...keys.referenceKeys.map((key) => ({ hash: keyHashHex(key), kind: 3 as const })),
        ...keys.blocks.map((key) => ({ hash: keyHashHex(key), kind: 4 as const })),
      ],
      references: rows,
    });
    this.weight += 1 + references.length / 10;
  }

  addProblem(problem: Problem, position: number | null): void {
    this.batch.problems.push({ ...problem, position });
    this.weight += 0.1;
  }

  get full(): boolean {
    return this.weight >= 1_000;
  }

  take(bytes: number): Batch {
    const batch = { ...this.batch, bytes };
    this.batch = { records: [], variants: [], problems: [], bytes: 0 };
    this.weight = 0;
    return batch;
  }
}
