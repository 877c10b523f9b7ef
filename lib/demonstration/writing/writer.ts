import { type Format } from '@/lib/bibliography/record';
import { type Chance } from '@/lib/demonstration/chance';
import { type Publication, type VariantCounts, type WrittenRecord } from '@/lib/demonstration/publication';

/** What a writer is given beside the record. */
export interface WritingContext {
  chance: Chance;
  counts: VariantCounts;
  /** Told of every reference that is written, with its text. */
  onReference: (cited: Publication, text: string) => void;
}

/** Writes one format: an opening, records with something between them, an end. */
export interface FormatWriter {
  format: Format;
  opening(records: number): string;
  between: string;
  ending: string;
  record(record: WrittenRecord, context: WritingContext): string;
  /** Kinds of broken entries that this format can hold; `rejected` tells whether nothing of it can be read. */
  faults: readonly { kind: string; rejected: boolean }[];
  /** The text of a record, broken. */
  break(text: string, kind: string): string;
}
