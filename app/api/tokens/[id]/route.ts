import { z } from 'zod';

import { revokeToken } from '@/lib/access/tokens';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const DELETE = route({
  action: 'account.use',
  params: z.object({ id }),
  handler: ({ actor, params, request }) => revokeToken(actor, params.id, request.headers),
});
