/**
 * The thread that reads one file: bytes, text, entries, rows. It touches no database, so that a file that is too demanding ends this
 * thread and nothing else.
 */
import { workerData, parentPort } from 'node:worker_threads';

import { createDecoder, detectEncoding, createUtf8Validator, looksBinary } from '@/lib/bibliography/decode';
import { detectFormat } from '@/lib/bibliography/detect';
import { createReader } from '@/lib/bibliography/readers';
import { type Format } from '@/lib/bibliography/record';
import { BatchBuilder, type Batch } from '@/lib/imports/rows';
import { storage } from '@/lib/services/storage';

export interface ReadRequest {
  storageKey: string;
  /** Chosen by a person; null to detect it. */
  format: Format | null;
  encoding: string | null;
  /** Entries up to and including this position are stored already. */
  after: number;
}

export type ThreadMessage =
  | { kind: 'batch'; batch: Batch }
  | { kind: 'refused'; message: string }
  | { kind: 'done'; format: Format; encoding: string; entries: number };
