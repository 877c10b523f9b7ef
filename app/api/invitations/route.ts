import { z } from 'zod';

import { emailField, personNameField } from '@/lib/access/email';
import { createInvitation, listInvitations } from '@/lib/access/invitations';
import { roles } from '@/lib/access/permissions';
import { route } from '@/lib/api/route';
import { paging } from '@/lib/api/schemas';

export const GET = route({
  action: 'user.manage',
  query: z.object({ page: paging.page, pageSize: paging.pageSize, state: z.enum(['open', 'all']).default('all') }),
  handler: ({ query }) => listInvitations(query),
});

export const POST = route({
  action: 'user.manage',
  body: z.object({ email: emailField, name: personNameField, role: z.enum(roles) }),
  status: 201,
  handler: ({ actor, body, request }) => createInvitation(actor, body, request.headers),
});
