import { once } from 'node:events';

import { type ComputeMessage, type ComputeRequest } from '@/lib/analyses/compute-thread';
import { ExpectedError } from '@/lib/errors';
import { type JobContext } from '@/lib/jobs/context';
import { startThread } from '@/lib/jobs/threads';

export type Computed = Extract<ComputeMessage, { kind: 'done' }>;

/** Memory for one analysis; past it the thread ends, not the worker. */
const threadMegabytes = 8_192;

/** Computes in a thread of its own, so that heartbeats go on, and ends the thread when the job is cancelled. */
export async function compute(request: ComputeRequest, context: JobContext): Promise<Computed> {
  const thread = startThread(new URL('./compute-thread.ts', import.meta.url), request, threadMegabytes);
  const stop = () => void thread.terminate();
  context.signal.addEventListener('abort', stop);
  let done: Computed | null = null;
  let failure: Error | null = null;
  let chain = Promise.resolve();
  thread.on('error', (error) => {
    failure = (error as NodeJS.ErrnoException).code === 'ERR_WORKER_OUT_OF_MEMORY' ? new ExpectedError(422, 'too-demanding', 'Too demanding', 'The network is too large for the memory of one analysis. Narrow the period or raise the least number of citations.') : error;
  });
  thread.on('message', (message: ComputeMessage) => {
    if (message.kind === 'done') done = message;
    else chain = chain.then(() => context.progress(message.stage, Math.round(message.share * 1000), 1000)).catch(stop);
  });
  try {
    await once(thread, 'exit');
    await chain;
  } finally {
    context.signal.removeEventListener('abort', stop);
  }
  if (context.signal.aborted) throw context.signal.reason;
  if (failure) throw failure;
  if (!done) throw new Error('The computing thread ended without an answer.');
  return done;
}
