'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useRef, useState } from 'react';

import { progressOf } from '@/components/analyses/analysis-words';
import { analysisMoves, useAnalysis } from '@/components/analyses/use-analyses';
import { useNow } from '@/components/imports/use-now';
import { Button, ButtonLink } from '@/components/ui/button';
import { Progress, timeLeft } from '@/components/ui/progress';
import { Notice } from '@/components/ui/status';
import { messageOf, send } from '@/lib/api/client';
import { type AnalysisView } from '@/lib/api/types';

/** An analysis that has not finished: how far it is, or why it ended. Looks again by itself and draws the page anew when it is done. */
export function RunningAnalysis({ initial, mayRun }: { initial: AnalysisView; mayRun: boolean }) {
  const { data: analysis = initial, mutate } = useAnalysis(initial.id, { fallbackData: initial });
  const router = useRouter();
  const now = useNow(analysisMoves(analysis));
  const [problem, setProblem] = useState<string | null>(null);
  const refreshed = useRef(false);
  useEffect(() => {
    if (analysis.state !== 'finished' || refreshed.current) return;
    refreshed.current = true;
    router.refresh();
  }, [analysis.state, router]);

  const cancel = async () => {
    try {
      await mutate(await send<AnalysisView>('POST', `/api/analyses/${analysis.id}/cancel`), { revalidate: false });
      setProblem(null);
    } catch (error) {
      setProblem(messageOf(error));
    }
  };
  const again = mayRun && <ButtonLink href={`/portfolios/${analysis.portfolioId}/analyses/new?like=${analysis.id}`}>Run it again</ButtonLink>;
  if (analysis.state === 'failed') return <Notice tone="problem" title="The analysis failed" actions={again}>{analysis.error ?? 'No reason was given.'} Earlier analyses are untouched.</Notice>;
  if (analysis.state === 'cancelled') return <Notice title="The analysis was cancelled" actions={again}>Nothing of it was kept; earlier analyses are untouched.</Notice>;
  if (analysis.state === 'finished') return <Notice tone="done" title="The analysis has finished">Its results are being shown.</Notice>;
  const { words, done, total } = progressOf(analysis.progress);
  const left = now === null ? null : timeLeft(analysis.startedAt, done, total, now);
  return (
    <div className="grid gap-2 border-l-[3px] border-indigo py-1 pl-3">
      <div className="flex flex-wrap items-center justify-between gap-3">
        <p className="font-semibold">{analysis.state === 'queued' ? 'An analysis waits for its turn' : 'An analysis is running'}</p>
        {mayRun && <Button kind="quiet" onClick={() => void cancel()}>Cancel</Button>}
      </div>
      <Progress label="Progress of the analysis" done={done} total={total} detail={[analysis.state === 'queued' ? 'Waiting' : words, left].filter(Boolean).join(' · ')} />
      <p className="text-small text-ink-soft">You can leave this page; the analysis goes on, and the progress stands here when you return.</p>
      {problem && <p role="alert" className="text-small text-madder">{problem}</p>}
    </div>
  );
}
