import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id, paging } from '@/lib/api/schemas';
import { listImports, presentImports } from '@/lib/imports/lists';
import { receiveFiles } from '@/lib/imports/receive';
import { loadPortfolio } from '@/lib/portfolios/load';

export const dynamic = 'force-dynamic';

const params = z.object({ portfolioId: id });

export const GET = route({
  action: 'portfolio.view',
  params,
  query: z.object({ page: paging.page, pageSize: paging.pageSize }),
  load: loadPortfolio,
  handler: ({ row, query }) => listImports(row.id, query),
});

export const POST = route({
  action: 'import.create',
  params,
  query: z.object({ accept: z.enum(['auto']).optional() }),
  load: loadPortfolio,
  status: 202,
  async handler({ actor, row, request, query }) {
    const received = await receiveFiles(actor, row.id, request, query.accept === 'auto');
    const items = await presentImports(received.map((one) => one.row), received.map((one) => one.alreadyThere));
    return { items, total: items.length, page: 1, pageSize: Math.max(items.length, 1) };
  },
  audit: ({ row }, result) => ({ action: 'import.uploaded', subjectType: 'portfolio', subjectId: String(row.id), details: { files: (result as { total: number }).total } }),
});
