import { once } from 'node:events';

import { type Transaction } from 'sequelize';

import { database } from '@/lib/db/connection';
import { insertRows, run, select, type Cell } from '@/lib/db/bulk';
import { ExpectedError } from '@/lib/errors';
import { recallColumns } from '@/lib/imports/table-columns';
import { variantColumns, variantHashes, type Batch } from '@/lib/imports/rows';
import { type ReadRequest, type ThreadMessage } from '@/lib/imports/read-thread';
import { type JobContext } from '@/lib/jobs/context';
import { startThread } from '@/lib/jobs/threads';
import { type Import } from '@/models/import';

/** Memory that the reading of one file may take; past it the thread ends, not the worker. */
const threadMegabytes = 1_536;
/** Without a sign from the thread for this long the file is given up. */
const silenceMs = 120_000;

async function writeBatch(transaction: Transaction, importId: number, batch: Batch): Promise<void> {
  await insertRows(
    transaction,
    'INSERT INTO import_records (importId, position, line, entryKey, title, raw, fields, outcome, referenceCount)',
    batch.records.map((record) => [importId, record.position, record.line, record.entryKey, record.title, record.raw, record.fields, record.rejected ? 'rejected' : null, record.referenceCount]),
  );
  const positions = batch.records.map((record) => record.position);
  const rows = positions.length === 0 ? [] : await select<{ id: number; position: number }>(transaction, 'SELECT id, position FROM import_records WHERE importId = ? AND position BETWEEN ? AND ?', [importId, Math.min(...positions), Math.max(...positions)]);
  const idAt = new Map(rows.map((row) => [row.position, row.id]));
  const keys: Cell[][] = [];
  const references: Cell[][] = [];
  for (const record of batch.records) {
    const id = idAt.get(record.position) as number;
    for (const key of record.keys) keys.push([Buffer.from(key.hash, 'hex'), id, key.kind]);
    record.references.forEach((reference, position) => references.push([id, position, reference.line, Buffer.from(reference.variant, 'hex'), reference.raw]));
  }
  await insertRows(transaction, 'INSERT IGNORE INTO record_keys (keyHash, recordId, kind)', keys);
  await insertRows(
    transaction,
    `INSERT IGNORE INTO reference_variants (${variantColumns.join(', ')})`,
    batch.variants.map((row) => row.map((cell, place) => (place < variantHashes && cell !== null ? Buffer.from(cell as string, 'hex') : cell))),
  );
  await insertRows(transaction, 'INSERT INTO cited_references (recordId, position, line, variantHash, raw)', references);
  await insertRows(
    transaction,
    'INSERT INTO import_problems (importId, position, line, severity, code, message, entryKey)',
    batch.problems.map((problem) => [importId, problem.position, problem.line, problem.severity, problem.code.slice(0, 60), problem.message.slice(0, 500), problem.key?.slice(0, 255) ?? null]),
  );
}

/**
 * Reads an import's file in a thread of its own and stores its records batch by batch.
 */
export async function readImport(row: Import, context: JobContext): Promise<void> {
  // A reading that was broken off (a killed worker) begins anew: entries that inherit come out of order, so there is no place to go on from.
  await run(null, 'DELETE FROM import_records WHERE importId = ?', [row.id]);
  await run(null, 'DELETE FROM import_problems WHERE importId = ?', [row.id]);
  const columns = row.columns ?? (await recallColumns(row));
  const request: ReadRequest = { storageKey: row.storageKey, format: row.chosenFormat, encoding: row.encoding, columns };
  const thread = startThread(new URL('./read-thread.ts', import.meta.url), request, threadMegabytes);
  const stop = () => void thread.terminate();
  context.signal.addEventListener('abort', stop);
  let silence = setTimeout(stop, silenceMs);
  let timedOut = false;
  let failure: Error | null = null;
  let done: Extract<ThreadMessage, { kind: 'done' }> | null = null;
  let chain = Promise.resolve();
  const fail = (error: unknown) => {
    failure ??= error instanceof Error ? error : new Error(String(error));
    void thread.terminate();
  };
  thread.on('error', (error) => fail((error as NodeJS.ErrnoException).code === 'ERR_WORKER_OUT_OF_MEMORY' ? new ExpectedError(422, 'too-demanding', 'File too demanding', 'Reading this file took more memory than one file may take. It was kept; split it and upload the parts.') : error));
  thread.on('message', (message: ThreadMessage) => {
    clearTimeout(silence);
    silence = setTimeout(() => {
      timedOut = true;
      stop();
    }, silenceMs);
    if (message.kind === 'refused') return fail(new ExpectedError(422, 'unreadable', 'File cannot be read', message.message));
    if (message.kind === 'done') {
      done = message;
      return;
    }
    chain = chain.then(async () => {
      if (failure) return;
      await database().transaction((transaction) => writeBatch(transaction, row.id, message.batch));
      await context.progress('reading', message.batch.bytes, row.bytes);
      thread.postMessage('more');
    }).catch(fail);
  });
  try {
    await once(thread, 'exit');
    await chain;
  } finally {
    clearTimeout(silence);
    context.signal.removeEventListener('abort', stop);
  }
  if (context.signal.aborted) throw context.signal.reason;
  if (timedOut) throw new ExpectedError(422, 'too-demanding', 'File too demanding', 'Reading this file came to no end. It was kept; split it, or export it in another format.');
  if (failure) throw failure;
  const ended = done as Extract<ThreadMessage, { kind: 'done' }> | null;
  if (!ended) throw new Error('The reading thread ended without an answer.');
  await row.update({ format: ended.format, encoding: ended.encoding });
}
