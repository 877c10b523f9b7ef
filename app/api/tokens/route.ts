import { z } from 'zod';

import { createToken, listTokens } from '@/lib/access/tokens';
import { tokenFields } from '@/lib/access/token-fields';
import { route } from '@/lib/api/route';
import { paging } from '@/lib/api/schemas';

export const GET = route({
  action: 'account.use',
  query: z.object({ page: paging.page, pageSize: paging.pageSize }),
  handler: ({ actor, query }) => listTokens(actor, query),
});

/** The answer holds the secret; it is never given again. */
export const POST = route({
  action: 'account.use',
  body: tokenFields,
  status: 201,
  handler: ({ actor, body, request }) => createToken(actor, body, request.headers),
});
