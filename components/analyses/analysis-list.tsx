'use client';

import Link from 'next/link';

import { analysisFacts, parameterWords, progressOf, stateWords } from '@/components/analyses/analysis-words';
import { analysisMoves, useAnalyses } from '@/components/analyses/use-analyses';
import { ButtonLink } from '@/components/ui/button';
import { DateText } from '@/components/ui/date-text';
import { PageHeader } from '@/components/ui/page-header';
import { Pagination } from '@/components/ui/pagination';
import { Progress } from '@/components/ui/progress';
import { EmptyState, Pill, type Tone } from '@/components/ui/status';
import { useAddress } from '@/components/ui/use-address';
import { type Page } from '@/lib/api/schemas';
import { type AnalysisView } from '@/lib/api/types';

const tones: Record<AnalysisView['state'], Tone> = { queued: 'neutral', running: 'neutral', finished: 'done', failed: 'problem', cancelled: 'neutral' };

function Row({ analysis }: { analysis: AnalysisView }) {
  const base = `/portfolios/${analysis.portfolioId}`;
  const { words, done, total } = progressOf(analysis.progress);
  return (
    <li className="grid gap-x-6 gap-y-2 border-b border-thread py-4 md:grid-cols-[minmax(0,1fr)_auto]">
      <div className="grid min-w-0 gap-1">
        <p className="flex flex-wrap items-center gap-x-3 gap-y-1">
          <Link prefetch={false} href={`${base}/analyses/${analysis.id}`} className="font-serif text-work font-medium"><DateText at={analysis.finishedAt ?? analysis.createdAt} withTime /></Link>
          <Pill tone={tones[analysis.state]}>{stateWords[analysis.state]}</Pill>
          {analysis.verified === 'same' && <Pill tone="done">Verified</Pill>}
          {analysis.verified === 'different' && <Pill tone="problem">Not the same when run again</Pill>}
        </p>
        {analysis.state === 'finished' && <p className="text-table">{analysisFacts(analysis)}</p>}
        {analysisMoves(analysis) && <Progress label="Progress of the analysis" done={done} total={total} detail={analysis.state === 'queued' ? 'Waiting' : words} className="max-w-[30rem]" />}
        {analysis.error && <p className="text-table text-madder">{analysis.error}</p>}
        <p className="text-small text-ink-soft">No. {analysis.id}{analysis.createdBy && `, ${analysis.createdBy}`}: {parameterWords(analysis.parameters)}</p>
      </div>
      {analysis.state === 'finished' && (
        <p className="flex items-start gap-x-4 text-table">
          <Link prefetch={false} href={`${base}/rankings?analysis=${analysis.id}`}>Rankings</Link>
          <Link prefetch={false} href={`${base}/clusters?analysis=${analysis.id}`}>Clusters</Link>
          <Link prefetch={false} href={`${base}/map?analysis=${analysis.id}`}>Map</Link>
        </p>
      )}
    </li>
  );
}

/** Every analysis of a portfolio, newest first. */
export function AnalysisList({ portfolioId, initial, mayRun }: { portfolioId: string; initial: Page<AnalysisView>; mayRun: boolean }) {
  const { data: list = initial } = useAnalyses(portfolioId, { page: initial.page }, { fallbackData: initial });
  const { href } = useAddress();
  const start = mayRun && <ButtonLink kind="primary" href={`/portfolios/${portfolioId}/analyses/new`}>New analysis</ButtonLink>;
  return (
    <div className="grid max-w-[64rem] gap-5 px-4 pt-6 pb-12 md:px-7">
      <PageHeader title="Analyses" subtitle="Each stands as it was computed, with its parameters, coverage and fingerprints." actions={start} />
      {list.total === 0 ? (
        <EmptyState title="No analysis yet" action={start}>{mayRun ? 'The first one needs no settings: the defaults are good.' : 'Evaluators and administrators who hold this portfolio can run one.'}</EmptyState>
      ) : (
        <ul className="border-t border-ink">{list.items.map((analysis) => <Row key={analysis.id} analysis={analysis} />)}</ul>
      )}
      <Pagination page={list.page} pageSize={list.pageSize} total={list.total} hrefOf={(change) => href({ page: change.page && change.page > 1 ? change.page : null })} />
    </div>
  );
}
