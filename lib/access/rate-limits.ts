import { QueryTypes } from 'sequelize';

import { type Actor } from '@/lib/access/permissions';
import { database } from '@/lib/db/connection';
import { tooMany } from '@/lib/errors';

const requestsPerMinute = 1200;
const minute = 60_000;
const windows = new Map<number, { start: number; hits: number }>();

/** Stops a person's runaway script. Kept in the process: it protects this process, and a look-up in the database would cost more than it saves. */
export async function checkRequestRate(actor: Pick<Actor, 'userId'>): Promise<void> {
  const now = Date.now();
  let window = windows.get(actor.userId);
  if (!window || now - window.start >= minute) {
    if (windows.size > 10_000) for (const [userId, old] of windows) if (now - old.start >= minute) windows.delete(userId);
    window = { start: now, hits: 0 };
    windows.set(actor.userId, window);
  }
  window.hits += 1;
  if (window.hits <= requestsPerMinute) return;
  const seconds = Math.ceil((window.start + minute - now) / 1000);
  throw tooMany(`You sent more than ${requestsPerMinute} requests within a minute. Go on in ${seconds} seconds.`, seconds);
}

/** "40 seconds", "12 minutes": how long to wait, rounded up. */
export function waitInWords(seconds: number): string {
  if (seconds < 100) return `${seconds} second${seconds === 1 ? '' : 's'}`;
  return `${Math.ceil(seconds / 60)} minutes`;
}

let counted = 0;

/**
 * Counts a try in a bucket (ASCII, at most 160 characters) and answers 429 once there were more than `most` within the window.
 * One statement counts and reads, so that tries at the same moment, on any number of processes, are all counted.
 */
export async function limitTries(bucket: string, most: number, windowSeconds: number): Promise<void> {
  const rows = await database().query<{ hits: number; wait: number }>(
    `INSERT INTO rate_limits (bucket, windowStart, hits) VALUES (:bucket, NOW(3), 1)
     ON DUPLICATE KEY UPDATE
       hits = IF(windowStart <= NOW(3) - INTERVAL :windowSeconds SECOND, 1, hits + 1),
       windowStart = IF(windowStart <= NOW(3) - INTERVAL :windowSeconds SECOND, NOW(3), windowStart)
     RETURNING hits, CEIL(TIMESTAMPDIFF(MICROSECOND, NOW(3), windowStart + INTERVAL :windowSeconds SECOND) / 1000000) AS \`wait\``,
    { replacements: { bucket, windowSeconds }, type: QueryTypes.SELECT },
  );
  counted += 1;
  if (counted % 200 === 0) await database().query('DELETE FROM rate_limits WHERE windowStart < NOW(3) - INTERVAL 1 DAY LIMIT 1000');
  const { hits, wait } = rows[0];
  if (hits <= most) return;
  const seconds = Math.max(1, Number(wait));
  throw tooMany(`There were too many tries. Try again in ${waitInWords(seconds)}.`, seconds);
}

/** Forgets the tries of a bucket, after a success. */
export async function forgetTries(bucket: string): Promise<void> {
  await database().query('DELETE FROM rate_limits WHERE bucket = :bucket', { replacements: { bucket } });
}
