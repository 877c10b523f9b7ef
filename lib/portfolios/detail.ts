import { listGrants } from '@/lib/access/grants';
import { may, type Actor } from '@/lib/access/permissions';
import { type PortfolioDetail } from '@/lib/api/types';
import { asItStands } from '@/lib/catalogue/reading/as-it-stands';
import { standingMember } from '@/lib/catalogue/reading/work-items';
import { select } from '@/lib/db/bulk';
import { notFound } from '@/lib/errors';
import { listMatches } from '@/lib/matches/matches';
import { readCoverage } from '@/lib/portfolios/coverage';
import { latestAnalysis } from '@/lib/portfolios/latest-analysis';
import { presentPortfolios } from '@/lib/portfolios/present';
import { type Portfolio } from '@/models/portfolio';

async function countYears(portfolioId: number): Promise<PortfolioDetail['years']> {
  const rows = await select<{ year: number; works: number }>(
    null,
    `SELECT work.year, COUNT(*) AS works FROM portfolio_works membership JOIN works work ON work.id = membership.workId AND work.catalogued = 1
     WHERE ${standingMember} AND work.year IS NOT NULL GROUP BY work.year ORDER BY work.year`,
    { portfolioId },
  );
  return rows.map((row) => ({ year: row.year, works: Number(row.works) }));
}

async function countImports(portfolioId: number): Promise<PortfolioDetail['imports']> {
  const [row] = await select<{ accepted: number; waiting: number; failed: number }>(
    null,
    `SELECT COALESCE(SUM(state = 'accepted'), 0) AS accepted, COALESCE(SUM(state IN ('uploaded', 'reading', 'checking', 'review', 'accepting', 'undoing')), 0) AS waiting,
       COALESCE(SUM(state = 'failed'), 0) AS failed FROM imports WHERE portfolioId = :portfolioId`,
    { portfolioId },
  );
  return { accepted: Number(row.accepted), open: Number(row.waiting), failed: Number(row.failed) };
}

/** Everything that the overview of a portfolio shows. Coverage is counted as analyses count it, on the portfolio as it stands now. */
export async function readPortfolio(actor: Actor, row: Portfolio): Promise<PortfolioDetail> {
  const [[view], coverage, years, imports, openMatches, analysis] = await Promise.all([
    presentPortfolios(actor, [row]), readCoverage(row.id), asItStands(row.id, 'years', () => countYears(row.id)), countImports(row.id),
    listMatches(actor, row.id, { page: 1, pageSize: 1, state: 'open' }), latestAnalysis(row.id),
  ]);
  if (!view) throw notFound();
  return {
    ...view,
    coverage,
    years,
    imports,
    openMatches: openMatches.total,
    latestAnalysis: analysis,
    grants: may(actor, 'portfolio.edit', view.level) ? await listGrants(row.id) : null,
  };
}
