import { route } from '@/lib/api/route';
import { type PortfolioView } from '@/lib/api/types';
import { newPortfolio } from '@/lib/portfolios/fields';
import { createPortfolio, listPortfolios, portfoliosQuery } from '@/lib/portfolios/portfolios';

export const dynamic = 'force-dynamic';

export const GET = route({ action: 'portfolio.list', query: portfoliosQuery, handler: ({ actor, query }) => listPortfolios(actor, query) });

export const POST = route({
  action: 'portfolio.create',
  body: newPortfolio,
  status: 201,
  handler: ({ actor, body }) => createPortfolio(actor, body),
  audit: ({ body }, result) => ({ action: 'portfolio.created', subjectType: 'portfolio', subjectId: (result as PortfolioView).id, details: { name: body.name } }),
});
