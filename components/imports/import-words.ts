import { count, formatBytes, formatNumber } from '@/components/ui/numbers';
import { timeLeft } from '@/components/ui/progress';
import { type Tone } from '@/components/ui/status';
import { type ImportView } from '@/lib/api/types';

/** Formats by the names that people find in the menus of their sources. */
export const formatWords: Record<string, string> = {
  bibtex: 'BibTeX',
  ris: 'RIS',
  'csl-json': 'CSL-JSON',
  tagged: 'tagged text with cited references',
  'registry-json': 'DOI registry JSON',
  nbib: 'MEDLINE (nbib)',
  delimited: 'delimited table (CSV, TSV)',
  refer: 'refer (%-tagged)',
  jats: 'JATS XML',
  'pubmed-xml': 'PubMed XML',
};

export const encodingWords: Record<string, string> = { 'utf-8': 'UTF-8', 'utf-16le': 'UTF-16, little-endian', 'utf-16be': 'UTF-16, big-endian', 'windows-1252': 'Windows-1252' };

const stages: Record<string, string> = { reading: 'Reading', checking: 'Checking against the catalogue', grouping: 'Grouping records', cataloguing: 'Cataloguing', linking: 'Linking references', citations: 'Counting citations', undoing: 'Undoing' };

/** Whether the import is being taken out again: a stage of an accepted import. */
export const isUndoing = (row: ImportView): boolean => row.progress.stage?.startsWith('undoing') ?? false;

export function stateWords(row: ImportView): { words: string; tone: Tone } {
  if (isUndoing(row)) return { words: 'undoing', tone: 'neutral' };
  switch (row.state) {
    case 'uploaded': return { words: 'waiting to be read', tone: 'neutral' };
    case 'reading': return { words: 'reading', tone: 'neutral' };
    case 'checking': return { words: 'checking', tone: 'neutral' };
    case 'review': return { words: 'to accept', tone: 'caution' };
    case 'accepting': return { words: 'accepting', tone: 'neutral' };
    case 'accepted': return { words: 'accepted', tone: 'done' };
    case 'undoing': return { words: 'undoing', tone: 'neutral' };
    case 'set-aside': return { words: 'set aside', tone: 'neutral' };
    case 'undone': return { words: 'undone', tone: 'neutral' };
    case 'failed': return { words: 'failed', tone: 'problem' };
  }
}

/** "Reading, 3.1 MiB of 12 MiB, about 20 seconds left". `now` in milliseconds. */
export function progressWords(row: ImportView, now: number): string {
  const { stage, done, total } = row.progress;
  if (row.state === 'uploaded') return 'Waiting for the worker';
  const last = (stage ?? row.state).replace('undoing: ', '');
  const name = isUndoing(row) && last !== 'undoing' ? `Undoing: ${(stages[last] ?? last).toLowerCase()}` : (stages[last] ?? `${last.charAt(0).toUpperCase()}${last.slice(1)}`);
  const amount = total > 1 ? (last === 'reading' ? `${formatBytes(done)} of ${formatBytes(total)}` : `${formatNumber(done)} of ${formatNumber(total)}`) : null;
  return [name, amount, last === 'reading' ? timeLeft(row.startedAt, done, total, now) : null].filter(Boolean).join(', ');
}

/** "Read as RIS, 2,310 records · nothing is catalogued until you accept": what the file is and where it stands. */
export function summaryWords(row: ImportView): string {
  const read = row.counts ? `${row.format ? `Read as ${formatWords[row.format] ?? row.format}` : 'Read'}, ${count(row.counts.records, 'record')}` : row.format ? `Taken for ${formatWords[row.format]}` : formatBytes(row.bytes);
  switch (row.state) {
    case 'review': return `${read} · nothing is catalogued until you accept`;
    case 'accepting': return `${read} · being catalogued; it is safe to leave this page`;
    case 'accepted': return isUndoing(row) ? `${read} · being taken out again; it is safe to leave this page` : `${read} · catalogued`;
    case 'undone': return `${read} · taken out again; the records are kept and can be accepted once more`;
    case 'set-aside': return row.counts ? `${read} · set aside; nothing of it is catalogued, and it can still be accepted` : 'Set aside before it was read';
    case 'failed': return 'Could not be read; the file is kept';
    default: return `${read} · it is safe to leave this page`;
  }
}
