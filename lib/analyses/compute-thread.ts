/** The thread that computes an analysis. It gets plain data and gives plain data; it knows no database. */
import { createHash } from 'node:crypto';
import { parentPort, workerData } from 'node:worker_threads';

import { type ThreadData } from '@/lib/jobs/threads';
import { analyseNetwork, serialiseInput, serialiseResult } from '@/lib/network/analysis';
import { type AnalysisInput, type AnalysisParameters, type AnalysisResult } from '@/lib/network/types';

export interface ComputeRequest {
  input: AnalysisInput;
  parameters: AnalysisParameters;
}

export type ComputeMessage =
  | { kind: 'progress'; stage: string; share: number }
  | { kind: 'done'; result: AnalysisResult; inputFingerprint: string; resultFingerprint: string };

if (parentPort) {
  const port = parentPort;
  const { input, parameters } = (workerData as ThreadData<ComputeRequest>).request;
  const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');
  let last = 0;
  let lastStage = '';
  const result = analyseNetwork(input, parameters, (stage, share) => {
    const now = Date.now();
    if (stage === lastStage && now - last < 250) return;
    last = now;
    lastStage = stage;
    port.postMessage({ kind: 'progress', stage, share } satisfies ComputeMessage);
  });
  port.postMessage({ kind: 'done', result, inputFingerprint: sha256(serialiseInput(input, parameters)), resultFingerprint: sha256(serialiseResult(result)) } satisfies ComputeMessage);
}
