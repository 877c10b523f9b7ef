import { z } from 'zod';

import { listGrants } from '@/lib/access/grants';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { grantList } from '@/lib/portfolios/fields';
import { replaceGrants } from '@/lib/portfolios/grants';
import { loadPortfolio } from '@/lib/portfolios/load';

export const dynamic = 'force-dynamic';

const params = z.object({ portfolioId: id });

/** Everybody who holds the portfolio, on one page: the list is short, and is edited as a whole. */
const present = async (portfolioId: number) => {
  const items = await listGrants(portfolioId);
  return { items, total: items.length, page: 1, pageSize: Math.max(items.length, 1) };
};

export const GET = route({ action: 'portfolio.edit', params, load: loadPortfolio, handler: ({ row }) => present(row.id) });

export const PUT = route({
  action: 'portfolio.edit',
  params,
  body: grantList,
  load: loadPortfolio,
  async handler({ actor, row, body }) {
    await replaceGrants(actor, row.id, body.grants);
    return present(row.id);
  },
  audit: ({ row, body }) => ({ action: 'portfolio.given', subjectType: 'portfolio', subjectId: String(row.id), details: { grants: body.grants } }),
});
