import { hostname } from 'node:os';

import { type Transaction } from 'sequelize';

import { database } from '@/lib/db/connection';
import { run, select } from '@/lib/db/bulk';
import { Job } from '@/models/job';

/** Kinds of jobs and what each needs to know. */
export interface JobPayloads {
  'import.read': { importId: number };
  'import.accept': { importId: number; userId: number | null };
  'import.undo': { importId: number; userId: number | null };
  'analysis.run': { analysisId: number };
  'analysis.verify': { analysisId: number };
}
export type JobKind = keyof JobPayloads;

export interface ClaimedJob {
  id: number;
  kind: JobKind;
  payload: JobPayloads[JobKind];
  attempts: number;
  maximumAttempts: number;
}

/** How long a claim holds without a sign of life. */
export const leaseSeconds = 60;

/** A name that no other worker has. */
export const workerName = `${hostname().slice(0, 40).replace(/[^a-zA-Z0-9.-]/g, '-')}-${process.pid}`;

/** Puts a job in the queue, in the caller's transaction: it exists if and only if what it works on exists. */
export async function enqueue<Kind extends JobKind>(
  kind: Kind,
  payload: JobPayloads[Kind],
  options: { portfolioId?: number; createdById?: number | null; transaction?: Transaction; maximumAttempts?: number } = {},
): Promise<number> {
  const job = await Job.create(
    { kind, payload: payload as Record<string, unknown>, portfolioId: options.portfolioId ?? null, createdById: options.createdById ?? null, maximumAttempts: options.maximumAttempts ?? 3 },
    { transaction: options.transaction },
  );
  return job.id;
}

/** Takes the oldest waiting job, or one whose worker has died. Safe with any number of workers. */
export async function claim(): Promise<ClaimedJob | null> {
  return database().transaction(async (transaction) => {
    const [row] = await select<{ id: number; kind: JobKind; payload: string | ClaimedJob['payload']; attempts: number; maximumAttempts: number }>(
      transaction,
      `SELECT id, kind, payload, attempts, maximumAttempts FROM jobs
       WHERE (state = 'queued' AND runAfter <= NOW(3)) OR (state = 'running' AND leaseUntil < NOW(3))
       ORDER BY id LIMIT 1 FOR UPDATE SKIP LOCKED`,
    );
    if (!row) return null;
    await run(
      transaction,
      `UPDATE jobs SET state = 'running', attempts = attempts + 1, worker = ?, leaseUntil = NOW(3) + INTERVAL ${leaseSeconds} SECOND,
       startedAt = COALESCE(startedAt, NOW(3)), updatedAt = NOW(3) WHERE id = ?`,
      [workerName, row.id],
    );
    const payload = typeof row.payload === 'string' ? (JSON.parse(row.payload) as ClaimedJob['payload']) : row.payload;
    return { id: row.id, kind: row.kind, payload, attempts: row.attempts + 1, maximumAttempts: row.maximumAttempts };
  });
}

/** Extends the claim. 'lost' when another worker has taken the job over, 'cancelled' when a person asked to stop it. */
export async function heartbeat(job: ClaimedJob): Promise<'held' | 'lost' | 'cancelled'> {
  await run(null, `UPDATE jobs SET leaseUntil = NOW(3) + INTERVAL ${leaseSeconds} SECOND WHERE id = ? AND worker = ? AND attempts = ? AND state = 'running'`, [job.id, workerName, job.attempts]);
  const [row] = await select<{ worker: string; attempts: number; state: string; cancelRequested: number }>(null, 'SELECT worker, attempts, state, cancelRequested FROM jobs WHERE id = ?', [job.id]);
  if (!row || row.worker !== workerName || row.attempts !== job.attempts || row.state !== 'running') return 'lost';
  return row.cancelRequested ? 'cancelled' : 'held';
}

export async function reportProgress(job: ClaimedJob, stage: string, done: number, total: number): Promise<void> {
  await run(null, 'UPDATE jobs SET progressStage = ?, progressDone = ?, progressTotal = ? WHERE id = ? AND worker = ? AND attempts = ?', [stage, Math.round(done), Math.round(total), job.id, workerName, job.attempts]);
}

/** Ends a job; only the worker that holds it can. */
export async function finish(job: ClaimedJob, state: 'done' | 'failed' | 'cancelled', error: string | null = null): Promise<void> {
  await run(null, 'UPDATE jobs SET state = ?, error = ?, finishedAt = NOW(3), leaseUntil = NULL, updatedAt = NOW(3) WHERE id = ? AND worker = ? AND attempts = ?', [state, error, job.id, workerName, job.attempts]);
}

/** Puts a job back after a passing fault, later each time. */
export async function putBack(job: ClaimedJob, error: string): Promise<void> {
  await run(
    null,
    `UPDATE jobs SET state = 'queued', error = ?, leaseUntil = NULL, runAfter = NOW(3) + INTERVAL ? SECOND, updatedAt = NOW(3) WHERE id = ? AND worker = ? AND attempts = ?`,
    [error, 2 ** job.attempts, job.id, workerName, job.attempts],
  );
}

/** Asks a job to stop: at once when it still waits, at its next heartbeat when it runs. */
export async function requestCancel(kind: JobKind, field: 'importId' | 'analysisId', id: number): Promise<void> {
  await run(null, `UPDATE jobs SET cancelRequested = 1 WHERE kind = ? AND JSON_VALUE(payload, '$.${field}') = ? AND state IN ('queued', 'running')`, [kind, id]);
}

/** Shows that a worker is alive; read by the health route. */
export async function signOfLife(): Promise<void> {
  await run(null, 'INSERT INTO workers (name, startedAt, seenAt) VALUES (?, NOW(3), NOW(3)) ON DUPLICATE KEY UPDATE seenAt = NOW(3)', [workerName]);
  await run(null, 'DELETE FROM workers WHERE seenAt < NOW(3) - INTERVAL 1 DAY');
}
