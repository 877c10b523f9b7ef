import { type Metadata } from 'next';

import { NewAnalysisForm } from '@/components/analyses/new-analysis-form';
import { PageHeader } from '@/components/ui/page-header';
import { EmptyState } from '@/components/ui/status';
import { firstParameters } from '@/lib/analyses/reading/pages';
import { type PageSearch } from '@/lib/api/page-query';
import { may } from '@/lib/access/permissions';
import { portfolioForPage } from '@/lib/portfolios/page';

export const metadata: Metadata = { title: 'New analysis' };

export default async function Page({ params, searchParams }: { params: Promise<{ portfolioId: string }>; searchParams: PageSearch }) {
  const { actor, row, level } = await portfolioForPage((await params).portfolioId);
  const allowed = may(actor, 'analysis.run', level);
  const { like } = await searchParams;
  return (
    <div className="grid max-w-[64rem] gap-8 px-4 pt-6 pb-12 md:px-7">
      <PageHeader title="New analysis" subtitle="The defaults are good. What you choose is kept with the result and printed in every export." />
      {allowed ? (
        <NewAnalysisForm portfolioId={String(row.id)} initial={await firstParameters(row, typeof like === 'string' ? like : null)} />
      ) : (
        <EmptyState title="Your role or your grant does not allow this">Analyses are run by evaluators and administrators who hold this portfolio.</EmptyState>
      )}
    </div>
  );
}
