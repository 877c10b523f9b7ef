import { setTimeout as sleep } from 'node:timers/promises';

import { closeDatabase } from '@/lib/db/connection';
import { claim, signOfLife, workerName } from '@/lib/jobs/queue';
import { runJob } from '@/lib/jobs/run-job';
import { log } from '@/lib/log';

/** The worker process: takes jobs from the queue, a few at a time, until it is told to stop. Start as many as there are machines. */
const atOnce = 2;
let stopping = false;
const running = new Set<Promise<void>>();

for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => (stopping = true));

log().info({ worker: workerName }, 'worker started');
let lastSign = 0;
while (!stopping) {
  try {
    if (Date.now() - lastSign > 5_000) {
      lastSign = Date.now();
      await signOfLife();
    }
    const job = running.size < atOnce ? await claim() : null;
    if (job) {
      const work: Promise<void> = runJob(job)
        .catch((error: unknown) => log().error({ jobId: job.id, error: error instanceof Error ? error.stack : String(error) }, 'job could not be ended properly'))
        .finally(() => running.delete(work));
      running.add(work);
    } else await sleep(running.size > 0 ? 200 : 500);
  } catch (error) {
    log().warn({ error: error instanceof Error ? error.message : String(error) }, 'queue out of reach');
    await sleep(2_000);
  }
}
// What still runs is given a moment; its lease ends otherwise and another worker takes it up again.
await Promise.race([Promise.all(running), sleep(8_000)]);
await closeDatabase();
process.exit(0);
