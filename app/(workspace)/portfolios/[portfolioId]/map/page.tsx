import { type Metadata } from 'next';

import { NoAnalysis } from '@/components/analyses/no-analysis';
import { MapPage } from '@/components/map/map-page';
import { analysesForPage, readMapPage } from '@/lib/analyses/reading/pages';
import { type PageSearch } from '@/lib/api/page-query';

export const metadata: Metadata = { title: 'Map' };

export default async function Page({ params, searchParams }: { params: Promise<{ portfolioId: string }>; searchParams: PageSearch }) {
  const search = await searchParams;
  const { row, chosen, finished, latest, mayRun, mayExport } = await analysesForPage((await params).portfolioId, String(search.analysis ?? ''));
  if (!chosen) return <NoAnalysis title="Map of works" portfolioId={String(row.id)} latest={latest} mayRun={mayRun} />;
  return <MapPage chosen={chosen} finished={finished} latest={latest} mayRun={mayRun} mayExport={mayExport} portfolio={row.name} {...readMapPage(chosen, row.name, search)} />;
}
