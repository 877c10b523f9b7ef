import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { restorePortfolio } from '@/lib/portfolios/portfolios';

export const dynamic = 'force-dynamic';

/** Brings a deleted portfolio back. The wrapper cannot load what is deleted, so the service settles who may: those who could delete it. */
export const POST = route({
  action: 'portfolio.view',
  params: z.object({ portfolioId: id }),
  handler: ({ actor, params }) => restorePortfolio(actor, params.portfolioId),
  audit: ({ params }) => ({ action: 'portfolio.restored', subjectType: 'portfolio', subjectId: String(params.portfolioId) }),
});
