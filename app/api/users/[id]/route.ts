import { z } from 'zod';

import { personNameField } from '@/lib/access/email';
import { roles } from '@/lib/access/permissions';
import { changeUser, getUser } from '@/lib/access/users';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { notFound } from '@/lib/errors';

const params = z.object({ id });

export const GET = route({
  action: 'user.manage',
  params,
  handler: async ({ params }) => {
    const user = await getUser(params.id);
    if (!user) throw notFound();
    return user;
  },
});

export const PATCH = route({
  action: 'user.manage',
  params,
  body: z.strictObject({ name: personNameField.optional(), role: z.enum(roles).optional(), disabled: z.boolean().optional() }),
  handler: ({ actor, params, body, request }) => changeUser(actor, params.id, body, request.headers),
});
