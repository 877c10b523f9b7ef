/**
 * The thread that reads one file: bytes, text, entries, rows. It touches no database, so that a file that is too demanding ends this
 * thread and nothing else.
 */
import { workerData, parentPort } from 'node:worker_threads';

import { createDecoder, detectEncoding, createUtf8Validator, looksBinary } from '@/lib/bibliography/decode';
import { detectFormat } from '@/lib/bibliography/detect';
import { type ColumnKind } from '@/lib/bibliography/readers/delimited-columns';
import { createReader } from '@/lib/bibliography/readers';
import { type Format } from '@/lib/bibliography/record';
import { BatchBuilder, type Batch } from '@/lib/imports/rows';
import { type ThreadData } from '@/lib/jobs/threads';
import { storage } from '@/lib/services/storage';

export interface ReadRequest {
  storageKey: string;
  /** Chosen by a person; null to detect it. */
  format: Format | null;
  encoding: string | null;
  /** Of a table: what its columns hold; null where their heads decide. */
  columns: (ColumnKind | null)[] | null;
}

export type ThreadMessage =
  | { kind: 'batch'; batch: Batch }
  | { kind: 'refused'; message: string }
  | { kind: 'done'; format: Format; encoding: string; entries: number };

/** Batches under way before the reader waits: enough to keep the database busy, few enough to keep memory small. */
const underWay = 3;

class Refusal extends Error {}

async function decideEncoding(request: ReadRequest): Promise<{ encoding: string; fellBack: boolean }> {
  if (request.encoding) return { encoding: request.encoding, fellBack: false };
  let head: Buffer | null = null;
  const validator = createUtf8Validator();
  for await (const chunk of storage().stream(request.storageKey) as AsyncIterable<Buffer>) {
    if (!head) {
      head = chunk;
      const detected = detectEncoding(chunk);
      if (detected.encoding.startsWith('utf-16')) return { encoding: detected.encoding, fellBack: false };
      if (looksBinary(chunk)) throw new Refusal('This is not a text file (it holds zero bytes near its beginning). Export the references as BibTeX, RIS, CSL-JSON, tagged text or JSON and upload that.');
    }
    if (!validator.push(chunk)) return { encoding: 'windows-1252', fellBack: true };
  }
  return validator.end() ? { encoding: 'utf-8', fellBack: false } : { encoding: 'windows-1252', fellBack: true };
}

async function readFile(request: ReadRequest, send: (message: ThreadMessage) => void, room: () => Promise<void>): Promise<void> {
  const { encoding, fellBack } = await decideEncoding(request);
  const builder = new BatchBuilder();
  if (fellBack) {
    builder.addProblem({ severity: 'warning', code: 'encoding-guessed', message: 'The file is not valid UTF-8; it was read as windows-1252 (Western European). If accents look wrong, choose another encoding and read it again.', line: 1 }, null);
  }
  const decoder = createDecoder(encoding);
  let format = request.format;
  let reader: ReturnType<typeof createReader> | null = null;
  let head = '';
  let bytes = 0;
  const open = () => {
    const detected = format ? { format } : detectFormat(head);
    if (!detected) throw new Refusal('The format was not recognised. Heddle reads BibTeX, RIS, CSL-JSON, tagged text exports with cited references, MEDLINE/nbib, %-tagged (refer) text, DOI-registry JSON and tables (CSV, TSV) whose first line names their columns; choose the format and read the file again, or export it anew.');
    format = detected.format;
    reader = createReader(detected.format, {
      onEntry: (entry) => builder.addEntry(entry),
      onProblem: (problem) => builder.addProblem(problem, null),
      columns: request.columns ?? undefined,
    });
    reader.write(head);
  };
  for await (const chunk of storage().stream(request.storageKey) as AsyncIterable<Buffer>) {
    bytes += chunk.length;
    const text = decoder.write(chunk);
    if (reader) (reader as ReturnType<typeof createReader>).write(text);
    else {
      head += text;
      // A first look at enough text to tell the format by.
      if (head.length >= 65_536) open();
    }
    if (builder.full) {
      send({ kind: 'batch', batch: builder.take(bytes) });
      await room();
    }
  }
  const rest = decoder.end();
  if (!reader) {
    head += rest;
    open();
  } else (reader as ReturnType<typeof createReader>).write(rest);
  const summary = (reader as unknown as ReturnType<typeof createReader>).end();
  send({ kind: 'batch', batch: builder.take(bytes) });
  send({ kind: 'done', format: format as Format, encoding, entries: summary.entries });
}

if (parentPort) {
  const port = parentPort;
  let waiting = 0;
  let wake: (() => void) | null = null;
  port.on('message', () => {
    waiting -= 1;
    wake?.();
  });
  const room = async () => {
    while (waiting >= underWay) await new Promise<void>((resolve) => (wake = resolve));
  };
  const send = (message: ThreadMessage) => {
    if (message.kind === 'batch') waiting += 1;
    port.postMessage(message);
  };
  try {
    await readFile((workerData as ThreadData<ReadRequest>).request, send, room);
    // Stay until every batch has been stored: an early end would look like a death.
    while (waiting > 0) await new Promise<void>((resolve) => (wake = resolve));
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    send({ kind: 'refused', message: error.message });
  }
  port.close();
}
