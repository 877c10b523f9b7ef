import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id, paging } from '@/lib/api/schemas';
import { listMatches } from '@/lib/matches/matches';
import { loadPortfolio } from '@/lib/portfolios/load';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'portfolio.view',
  params: z.object({ portfolioId: id }),
  query: z.object({ page: paging.page, pageSize: paging.pageSize, state: z.enum(['open', 'same', 'different', 'later']).optional(), import: id.optional() }),
  load: loadPortfolio,
  handler: ({ actor, row, query }) => listMatches(actor, row.id, query),
});
