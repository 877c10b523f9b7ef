import { z } from 'zod';

import { roles } from '@/lib/access/permissions';
import { listUsers, userSorts } from '@/lib/access/users';
import { route } from '@/lib/api/route';
import { paging, sortBy } from '@/lib/api/schemas';

export const GET = route({
  action: 'user.manage',
  query: z.object({ ...paging, role: z.enum(roles).optional(), sort: sortBy(userSorts, 'name') }),
  handler: ({ query }) => listUsers(query),
});
