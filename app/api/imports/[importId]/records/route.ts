import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id, paging } from '@/lib/api/schemas';
import { listImportRecords, loadImport } from '@/lib/imports/lists';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'portfolio.view',
  params: z.object({ importId: id }),
  query: z.object({ ...paging, outcome: z.enum(['new', 'known', 'review', 'rejected']).optional() }),
  load: loadImport,
  handler: ({ row, query }) => listImportRecords(row.id, query),
});
