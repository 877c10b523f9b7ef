import { z } from 'zod';

import { route } from '@/lib/api/route';
import { paging } from '@/lib/api/schemas';
import { listMails } from '@/lib/services/mail';

export const GET = route({
  action: 'mail.view',
  query: z.object({ page: paging.page, pageSize: paging.pageSize }),
  handler: ({ query }) => listMails(query),
});
