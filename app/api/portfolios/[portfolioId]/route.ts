import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { readPortfolio } from '@/lib/portfolios/detail';
import { portfolioChanges } from '@/lib/portfolios/fields';
import { loadPortfolio } from '@/lib/portfolios/load';
import { changePortfolio, deletePortfolio } from '@/lib/portfolios/portfolios';

export const dynamic = 'force-dynamic';

const params = z.object({ portfolioId: id });

export const GET = route({ action: 'portfolio.view', params, load: loadPortfolio, handler: ({ actor, row }) => readPortfolio(actor, row) });

export const PATCH = route({
  action: 'portfolio.edit',
  params,
  body: portfolioChanges,
  load: loadPortfolio,
  handler: ({ actor, row, body }) => changePortfolio(actor, row, body),
  audit: ({ row, body }) => ({ action: 'portfolio.changed', subjectType: 'portfolio', subjectId: String(row.id), details: body }),
});

export const DELETE = route({
  action: 'portfolio.edit',
  params,
  load: loadPortfolio,
  handler: ({ row }) => deletePortfolio(row),
  audit: ({ row }) => ({ action: 'portfolio.deleted', subjectType: 'portfolio', subjectId: String(row.id), details: { name: row.name } }),
});
