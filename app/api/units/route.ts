import { z } from 'zod';

import { unitFields } from '@/lib/access/unit-fields';
import { createUnit, listUnits } from '@/lib/access/units';
import { route } from '@/lib/api/route';
import { paging } from '@/lib/api/schemas';

export const GET = route({
  action: 'unit.view',
  query: z.object({ page: paging.page, pageSize: paging.pageSize }),
  handler: ({ query }) => listUnits(query),
});

export const POST = route({
  action: 'unit.manage',
  body: unitFields,
  status: 201,
  handler: ({ actor, body, request }) => createUnit(actor, body, request.headers),
});
