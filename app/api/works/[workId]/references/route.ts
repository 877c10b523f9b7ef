import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id, paging } from '@/lib/api/schemas';
import { listReferences } from '@/lib/catalogue/reading/citations';
import { loadWork } from '@/lib/catalogue/reading/visibility';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'work.view',
  params: z.object({ workId: id }),
  query: z.object({ page: paging.page, pageSize: paging.pageSize }),
  load: loadWork,
  handler: ({ actor, row, query }) => listReferences(actor, row.id, query),
});
