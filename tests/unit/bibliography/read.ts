import { readText } from '@/lib/bibliography/readers';
import { type Format, type ReadRecord, type RecordFields } from '@/lib/bibliography/record';

export function records(format: Format, text: string): ReadRecord[] {
  return readText(format, text).entries.filter((entry) => entry.kind === 'record');
}

/** Fields of the only record of a text. */
export function fieldsOf(format: Format, text: string): RecordFields {
  const found = records(format, text);
  if (found.length !== 1) throw new Error(`${found.length} records where one was expected`);
  return found[0].fields;
}

/** "code@line" of every problem, those of the file last. */
export function problemsOf(format: Format, text: string): string[] {
  const { entries, summary } = readText(format, text);
  return [...entries.flatMap((entry) => entry.problems), ...summary.problems].map((problem) => `${problem.code}@${problem.line}`);
}
