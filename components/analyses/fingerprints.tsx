'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';

import { useJob } from '@/components/analyses/use-analyses';
import { Button } from '@/components/ui/button';
import { FactList } from '@/components/ui/definition-list';
import { Progress } from '@/components/ui/progress';
import { Notice } from '@/components/ui/status';
import { messageOf, send } from '@/lib/api/client';
import { type AnalysisView } from '@/lib/api/types';

function Verdict({ verified }: { verified: AnalysisView['verified'] }) {
  if (verified === 'same') return <Notice tone="done" title="Verified">The analysis was run again on its stored input, and gave the same result, byte for byte.</Notice>;
  if (verified === 'different') return <Notice tone="problem" title="Not the same">Run again on its stored input, the analysis gave another result. Do not rely on it; tell your administrator, and run a new one.</Notice>;
  return <p className="text-table text-ink-soft">Not verified yet: run again on its stored input, an analysis must give the same result.</p>;
}

/** Fingerprints of input and result, and running the analysis again to compare them. */
export function Fingerprints({ analysis, mayRun }: { analysis: AnalysisView; mayRun: boolean }) {
  const router = useRouter();
  const [jobId, setJobId] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const { data: job } = useJob(jobId);
  const running = jobId !== null && (!job || job.state === 'queued' || job.state === 'running');
  useEffect(() => {
    if (job && (job.state === 'done' || job.state === 'failed' || job.state === 'cancelled')) router.refresh();
  }, [job, router]);
  const verify = async () => {
    try {
      setProblem(null);
      setJobId((await send<{ jobId: string }>('POST', `/api/analyses/${analysis.id}/verify`)).jobId);
    } catch (error) {
      setProblem(messageOf(error));
    }
  };
  return (
    <div className="grid gap-3">
      <FactList
        items={[
          { label: 'Input', value: <span className="font-mono text-small">{analysis.fingerprints.input ?? '–'}</span> },
          { label: 'Result', value: <span className="font-mono text-small">{analysis.fingerprints.result ?? '–'}</span> },
          { label: 'Engine', value: analysis.engine ?? '–' },
        ]}
      />
      {running ? <Progress label="Verification" done={0} total={0} detail="Running it again and comparing; you can leave this page" /> : <Verdict verified={analysis.verified} />}
      {job?.state === 'failed' && <Notice tone="problem" title="The verification failed">{job.error ?? 'No reason was given.'}</Notice>}
      {problem && <p role="alert" className="text-small text-madder">{problem}</p>}
      {mayRun && !running && <div><Button onClick={() => void verify()}>{analysis.verified ? 'Verify again' : 'Verify'}</Button></div>}
    </div>
  );
}
