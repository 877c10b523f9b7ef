import { defaultLimits, type Entry, type Format, type Problem, type ReadLimits, type ReadSummary } from '@/lib/bibliography/record';
import { type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { createBibtexReader } from '@/lib/bibliography/readers/bibtex';
import { createCslJsonReader } from '@/lib/bibliography/readers/csl-json';
import { createDelimitedReader } from '@/lib/bibliography/readers/delimited';
import { createNbibReader } from '@/lib/bibliography/readers/nbib';
import { createReferReader } from '@/lib/bibliography/readers/refer';
import { createRegistryJsonReader } from '@/lib/bibliography/readers/registry-json';
import { createRisReader } from '@/lib/bibliography/readers/ris';
import { createTaggedReader } from '@/lib/bibliography/readers/tagged';

const readers = { bibtex: createBibtexReader, ris: createRisReader, tagged: createTaggedReader, 'csl-json': createCslJsonReader, 'registry-json': createRegistryJsonReader, nbib: createNbibReader, refer: createReferReader, delimited: createDelimitedReader };

/**
 * A reader of one format: text in (LF line ends), entries out as soon as they are complete.
 *
 * @param handlers `onEntry` for each entry, `onProblem` for problems that belong to no entry
 */
export function createReader(format: Format, handlers: { onEntry: (entry: Entry) => void; onProblem: (problem: Problem) => void; limits?: Partial<ReadLimits>; columns?: ReaderOptions['columns'] }): Reader {
  return readers[format]({ onEntry: handlers.onEntry, onProblem: handlers.onProblem, limits: { ...defaultLimits, ...handlers.limits }, columns: handlers.columns });
}

/** Reads a text at once. */
export function readText(format: Format, text: string, limits?: Partial<ReadLimits>): { entries: Entry[]; summary: ReadSummary } {
  const entries: Entry[] = [];
  const reader = createReader(format, { onEntry: (entry) => entries.push(entry), onProblem: () => undefined, limits });
  reader.write(text.includes('\r') ? text.replace(/\r\n?/g, '\n') : text);
  const summary = reader.end();
  return { entries: entries.sort((a, b) => a.position - b.position), summary };
}
