import { type Metadata } from 'next';

import { NoAnalysis } from '@/components/analyses/no-analysis';
import { ClustersPage } from '@/components/clusters/clusters-page';
import { analysesForPage, readClusters } from '@/lib/analyses/reading/pages';
import { type PageSearch } from '@/lib/api/page-query';

export const metadata: Metadata = { title: 'Clusters' };

export default async function Page({ params, searchParams }: { params: Promise<{ portfolioId: string }>; searchParams: PageSearch }) {
  const search = await searchParams;
  const { row, chosen, finished, latest, mayRun } = await analysesForPage((await params).portfolioId, String(search.analysis ?? ''));
  if (!chosen) return <NoAnalysis title="What the works are about" portfolioId={String(row.id)} latest={latest} mayRun={mayRun} />;
  return <ClustersPage chosen={chosen} finished={finished} latest={latest} mayRun={mayRun} {...await readClusters(chosen, search)} />;
}
