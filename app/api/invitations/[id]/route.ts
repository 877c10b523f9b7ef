import { z } from 'zod';

import { revokeInvitation } from '@/lib/access/invitations';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const DELETE = route({
  action: 'user.manage',
  params: z.object({ id }),
  handler: ({ actor, params, request }) => revokeInvitation(actor, params.id, request.headers),
});
