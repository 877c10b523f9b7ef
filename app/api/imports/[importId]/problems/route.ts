import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id, paging } from '@/lib/api/schemas';
import { listImportProblems, loadImport } from '@/lib/imports/lists';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'portfolio.view',
  params: z.object({ importId: id }),
  query: z.object({ page: paging.page, pageSize: paging.pageSize, severity: z.enum(['error', 'warning']).optional() }),
  load: loadImport,
  handler: ({ row, query }) => listImportProblems(row.id, query),
});
