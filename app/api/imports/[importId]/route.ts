import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { loadImport, presentImports } from '@/lib/imports/lists';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'portfolio.view',
  params: z.object({ importId: id }),
  load: loadImport,
  handler: async ({ row }) => (await presentImports([row]))[0],
});
