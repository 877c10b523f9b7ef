import { type ClaimedJob } from '@/lib/jobs/queue';

/** Thrown inside a job when a person has cancelled it or another worker has taken it over. */
export class JobStopped extends Error {
  constructor(readonly reason: 'cancelled' | 'lost') {
    super(reason === 'cancelled' ? 'Cancelled' : 'Taken over by another worker');
    this.name = 'JobStopped';
  }
}

/** What a job handler is given. */
export interface JobContext {
  job: ClaimedJob;
  signal: AbortSignal;
  /** Written at most twice a second; throws JobStopped once the job is to stop. */
  progress(stage: string, done: number, total: number): Promise<void>;
}
