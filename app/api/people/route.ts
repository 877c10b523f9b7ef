import { z } from 'zod';

import { findPeople } from '@/lib/access/users';
import { route } from '@/lib/api/route';
import { paging } from '@/lib/api/schemas';

export const GET = route({
  action: 'people.find',
  query: z.object(paging),
  handler: ({ query }) => findPeople(query),
});
