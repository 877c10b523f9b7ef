import { ExpectedError } from '@/lib/errors';
import { JobStopped, type JobContext } from '@/lib/jobs/context';
import { handlers } from '@/lib/jobs/handlers';
import { finish, heartbeat, leaseSeconds, putBack, reportProgress, type ClaimedJob } from '@/lib/jobs/queue';
import { log } from '@/lib/log';

const progressEveryMs = 500;

/**
 * Runs one claimed job to its end: heartbeat, progress, cancellation, retries. Expected errors are final (the same file fails the same way
 * again); all others are tried again, later each time, until the attempts are used up.
 */
export async function runJob(job: ClaimedJob): Promise<void> {
  const handler = handlers[job.kind];
  const stop = new AbortController();
  const beat = setInterval(() => {
    heartbeat(job).then(
      (state) => state !== 'held' && stop.abort(new JobStopped(state)),
      (error: unknown) => log().warn({ jobId: job.id, error: String(error) }, 'heartbeat failed'),
    );
  }, Math.min(2_000, (leaseSeconds * 1000) / 4));
  let lastWrite = 0;
  let lastStage = '';
  const context: JobContext = {
    job,
    signal: stop.signal,
    async progress(stage, done, total) {
      if (stop.signal.aborted) throw stop.signal.reason;
      const now = Date.now();
      if (stage === lastStage && now - lastWrite < progressEveryMs) return;
      lastWrite = now;
      lastStage = stage;
      await reportProgress(job, stage, done, total);
      await handler.progress?.(job, stage, done, total);
    },
  };
  try {
    if (job.attempts > job.maximumAttempts) throw new ExpectedError(500, 'given-up', 'Given up', 'The worker died on this several times; it was not tried again.');
    if ((await heartbeat(job)) === 'cancelled') throw new JobStopped('cancelled');
    await handler.run(context);
    await finish(job, 'done');
  } catch (error) {
    const reason = stop.signal.aborted && stop.signal.reason instanceof JobStopped ? stop.signal.reason : error;
    if (reason instanceof JobStopped) {
      if (reason.reason === 'lost') return;
      await handler.ended?.(job, 'cancelled', null);
      await finish(job, 'cancelled');
    } else if (!(error instanceof ExpectedError) && job.attempts < job.maximumAttempts) {
      log().warn({ jobId: job.id, kind: job.kind, error: error instanceof Error ? error.stack : String(error) }, 'job failed, will be tried again');
      await putBack(job, String(error instanceof Error ? error.message : error).slice(0, 1000));
    } else {
      log().error({ jobId: job.id, kind: job.kind, error: error instanceof Error ? error.stack : String(error) }, 'job failed');
      const text = error instanceof ExpectedError ? error.message : 'Something went wrong on our side; the attempt was repeated and failed each time. Tell your administrator the job number.';
      await handler.ended?.(job, 'failed', text);
      await finish(job, 'failed', String(error instanceof Error ? error.message : error).slice(0, 2000));
    }
  } finally {
    clearInterval(beat);
  }
}
