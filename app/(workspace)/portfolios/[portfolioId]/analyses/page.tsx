import { type Metadata } from 'next';

import { AnalysisList } from '@/components/analyses/analysis-list';
import { may } from '@/lib/access/permissions';
import { listAnalyses } from '@/lib/analyses/reading/analyses';
import { analysesQuery } from '@/lib/analyses/reading/queries';
import { queryOfPage, type PageSearch } from '@/lib/api/page-query';
import { portfolioForPage } from '@/lib/portfolios/page';

export const metadata: Metadata = { title: 'Analyses' };

export default async function Page({ params, searchParams }: { params: Promise<{ portfolioId: string }>; searchParams: PageSearch }) {
  const { actor, row, level } = await portfolioForPage((await params).portfolioId);
  const { page, pageSize } = queryOfPage(analysesQuery, await searchParams);
  return <AnalysisList portfolioId={String(row.id)} initial={await listAnalyses(row.id, { page, pageSize })} mayRun={may(actor, 'analysis.run', level)} />;
}
