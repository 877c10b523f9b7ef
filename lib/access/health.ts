import { QueryTypes } from 'sequelize';

import { database } from '@/lib/db/connection';
import { log } from '@/lib/log';

export interface Health {
  status: 'ok' | 'degraded';
  database: 'ok' | 'unreachable';
  /** 'ok' when a worker was seen within 30 seconds. */
  worker: 'ok' | 'missing';
  queue: { queued: number; running: number } | null;
}

const answerWithinMs = 5000;

/** Rejects when the database has not answered in time: a balancer must hear "degraded" rather than wait for the pool. */
function inTime<Result>(work: Promise<Result>): Promise<Result> {
  let timer: NodeJS.Timeout;
  const late = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => reject(new Error('the database did not answer in time')), answerWithinMs);
  });
  return Promise.race([work, late]).finally(() => clearTimeout(timer));
}

async function countRows(): Promise<{ workers: number; queued: number; running: number }> {
  const [row] = await database().query<{ workers: number; queued: number; running: number }>(
    `SELECT (SELECT COUNT(*) FROM workers WHERE seenAt > NOW(3) - INTERVAL 30 SECOND) AS workers,
            (SELECT COUNT(*) FROM jobs WHERE state = 'queued') AS queued,
            (SELECT COUNT(*) FROM jobs WHERE state = 'running') AS running`,
    { type: QueryTypes.SELECT },
  );
  return row;
}

/** What balancers and the start script ask: database, worker, queue. Names nothing that a stranger may not know. */
export async function readHealth(): Promise<Health> {
  try {
    const { workers, queued, running } = await inTime(countRows());
    const worker = workers > 0 ? 'ok' : 'missing';
    return { status: worker === 'ok' ? 'ok' : 'degraded', database: 'ok', worker, queue: { queued, running } };
  } catch (error) {
    log().error({ error: error instanceof Error ? error.message : error }, 'health: the database cannot be asked');
    return { status: 'degraded', database: 'unreachable', worker: 'missing', queue: null };
  }
}
