import { RunningAnalysis } from '@/components/analyses/running-analysis';
import { ButtonLink } from '@/components/ui/button';
import { PageHeader } from '@/components/ui/page-header';
import { EmptyState } from '@/components/ui/status';
import { type AnalysisView } from '@/lib/api/types';

interface NoAnalysisProps {
  title: string;
  portfolioId: string;
  latest: AnalysisView | null;
  mayRun: boolean;
}

/** A page of results before there are any: what is under way, or what to do. */
export function NoAnalysis({ title, portfolioId, latest, mayRun }: NoAnalysisProps) {
  return (
    <div className="grid max-w-[64rem] gap-5 px-4 py-6 md:px-7">
      <PageHeader title={title} />
      {latest && <RunningAnalysis initial={latest} mayRun={mayRun} />}
      {(!latest || latest.state === 'failed' || latest.state === 'cancelled') && (
        <EmptyState title="No analysis yet" action={mayRun && <ButtonLink kind="primary" href={`/portfolios/${portfolioId}/analyses/new`}>Analyse this portfolio</ButtonLink>}>
          {mayRun
            ? 'An analysis ranks the works of this portfolio and those that they cite, groups them and draws them on a map. The defaults are good; a few hundred works take seconds.'
            : 'Rankings, clusters and maps come from an analysis, and nobody has run one here. Evaluators and administrators who hold this portfolio can.'}
        </EmptyState>
      )}
    </div>
  );
}
