import { Worker } from 'node:worker_threads';

/** What a thread started by `startThread` finds in its workerData. */
export interface ThreadData<Request> {
  module: string;
  request: Request;
}

/**
 * Starts a thread on a TypeScript module.
 *
 * @param module file URL of the module, e.g. new URL('./read-thread.ts', import.meta.url)
 * @param memoryMegabytes past this the thread ends with ERR_WORKER_OUT_OF_MEMORY, and the process lives on
 */
export function startThread<Request>(module: URL, request: Request, memoryMegabytes: number): Worker {
  const workerData: ThreadData<Request> = { module: module.href, request };
  return new Worker(new URL('./thread-loader.mjs', import.meta.url), { workerData, execArgv: [], resourceLimits: { maxOldGenerationSizeMb: memoryMegabytes } });
}
