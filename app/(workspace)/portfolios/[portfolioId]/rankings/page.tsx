import { type Metadata } from 'next';

import { NoAnalysis } from '@/components/analyses/no-analysis';
import { RankingsPage } from '@/components/rankings/rankings-page';
import { analysesForPage, readRankings } from '@/lib/analyses/reading/pages';
import { type PageSearch } from '@/lib/api/page-query';

export const metadata: Metadata = { title: 'Rankings' };

export default async function Page({ params, searchParams }: { params: Promise<{ portfolioId: string }>; searchParams: PageSearch }) {
  const search = await searchParams;
  const { row, chosen, finished, latest, mayRun, mayExport } = await analysesForPage((await params).portfolioId, String(search.analysis ?? ''));
  if (!chosen) return <NoAnalysis title="Works this portfolio rests on" portfolioId={String(row.id)} latest={latest} mayRun={mayRun} />;
  return <RankingsPage chosen={chosen} finished={finished} latest={latest} mayRun={mayRun} mayExport={mayExport} {...await readRankings(chosen, search)} />;
}
