import { analysisRunJob, analysisVerifyJob } from '@/lib/analyses/jobs';
import { importAcceptJob, importReadJob, importUndoJob } from '@/lib/imports/jobs';
import { type JobContext } from '@/lib/jobs/context';
import { type ClaimedJob, type JobKind } from '@/lib/jobs/queue';

export interface JobHandler {
  run(context: JobContext): Promise<void>;
  /** Copies progress to the row that people look at. */
  progress?(job: ClaimedJob, stage: string, done: number, total: number): Promise<void>;
  /** Leaves the row that people look at in a true state when the job did not succeed. */
  ended?(job: ClaimedJob, how: 'failed' | 'cancelled', message: string | null): Promise<void>;
}

/** One handler a kind of job. */
export const handlers: Record<JobKind, JobHandler> = {
  'import.read': importReadJob,
  'import.accept': importAcceptJob,
  'import.undo': importUndoJob,
  'analysis.run': analysisRunJob,
  'analysis.verify': analysisVerifyJob,
};
