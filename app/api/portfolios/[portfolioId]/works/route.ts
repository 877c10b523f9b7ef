import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { listWorks, worksQuery } from '@/lib/catalogue/reading/list-works';
import { workIds } from '@/lib/portfolios/fields';
import { loadPortfolio } from '@/lib/portfolios/load';
import { addWorks, removeWorks } from '@/lib/portfolios/membership';

export const dynamic = 'force-dynamic';

const params = z.object({ portfolioId: id });

export const GET = route({ action: 'portfolio.view', params, query: worksQuery, load: loadPortfolio, handler: ({ row, query }) => listWorks(row.id, query) });

export const POST = route({
  action: 'portfolio.curate',
  params,
  body: workIds,
  load: loadPortfolio,
  handler: ({ actor, row, body }) => addWorks(actor, row.id, body.workIds),
  audit: ({ row, body }) => ({ action: 'portfolio.works-added', subjectType: 'portfolio', subjectId: String(row.id), details: { workIds: body.workIds } }),
});

export const DELETE = route({
  action: 'portfolio.curate',
  params,
  body: workIds,
  load: loadPortfolio,
  handler: ({ actor, row, body }) => removeWorks(actor, row.id, body.workIds),
  audit: ({ row, body }) => ({ action: 'portfolio.works-removed', subjectType: 'portfolio', subjectId: String(row.id), details: { workIds: body.workIds } }),
});
