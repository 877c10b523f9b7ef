import { z } from 'zod';

import { listAudit } from '@/lib/access/audit';
import { route } from '@/lib/api/route';
import { id, paging } from '@/lib/api/schemas';

export const GET = route({
  action: 'audit.view',
  query: z.object({ ...paging, userId: id.optional() }),
  handler: ({ query }) => listAudit(query),
});
