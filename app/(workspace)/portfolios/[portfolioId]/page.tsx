import { Overview } from '@/components/portfolios/overview';
import { may } from '@/lib/access/permissions';
import { unitTree } from '@/lib/access/units';
import { readPortfolio } from '@/lib/portfolios/detail';
import { portfolioForPage } from '@/lib/portfolios/page';

export default async function OverviewPage({ params }: { params: Promise<{ portfolioId: string }> }) {
  const { actor, row, level } = await portfolioForPage((await params).portfolioId);
  const edit = may(actor, 'portfolio.edit', level);
  const [portfolio, units] = await Promise.all([readPortfolio(actor, row), edit ? unitTree() : []]);
  return <Overview initial={portfolio} units={units} may={{ edit, import: may(actor, 'import.decide', level), analyse: may(actor, 'analysis.run', level) }} />;
}
