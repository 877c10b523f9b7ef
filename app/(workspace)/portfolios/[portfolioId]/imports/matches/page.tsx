import { type Metadata } from 'next';

import { PortfolioMatches } from '@/components/imports/portfolio-matches';
import { may } from '@/lib/access/permissions';
import { listMatches } from '@/lib/matches/matches';
import { portfolioForPage } from '@/lib/portfolios/page';

export const metadata: Metadata = { title: 'Matches to review' };

export default async function MatchesPage({ params }: { params: Promise<{ portfolioId: string }> }) {
  const { actor, row, level } = await portfolioForPage((await params).portfolioId);
  const [open, later] = await Promise.all([
    listMatches(actor, row.id, { page: 1, pageSize: 50, state: 'open' }),
    listMatches(actor, row.id, { page: 1, pageSize: 1, state: 'later' }),
  ]);
  return <PortfolioMatches portfolioId={String(row.id)} initial={open} later={later.total} mayDecide={may(actor, 'match.decide', level)} />;
}
