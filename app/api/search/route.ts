import { z } from 'zod';

import { route } from '@/lib/api/route';
import { search } from '@/lib/catalogue/reading/search';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'work.view',
  query: z.object({ q: z.string().trim().max(300).default('') }),
  handler: ({ actor, query }) => search(actor, query.q),
});
