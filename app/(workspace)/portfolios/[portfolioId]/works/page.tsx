import { type Metadata } from 'next';

import { WorksPage } from '@/components/works/works-page';
import { may } from '@/lib/access/permissions';
import { type PageSearch } from '@/lib/api/page-query';
import { readWorksPage } from '@/lib/catalogue/reading/pages';
import { portfolioForPage } from '@/lib/portfolios/page';

export const metadata: Metadata = { title: 'Works' };

export default async function Page({ params, searchParams }: { params: Promise<{ portfolioId: string }>; searchParams: PageSearch }) {
  const { actor, row, level } = await portfolioForPage((await params).portfolioId);
  return <WorksPage portfolioId={String(row.id)} mayCurate={may(actor, 'portfolio.curate', level)} initial={await readWorksPage(row.id, await searchParams)} />;
}
