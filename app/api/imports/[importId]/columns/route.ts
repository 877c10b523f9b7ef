import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { loadImport } from '@/lib/imports/lists';
import { describeColumns } from '@/lib/imports/table-columns';

export const dynamic = 'force-dynamic';

/** Of a table: its heads, what they are taken for, and its first rows. */
export const GET = route({
  action: 'import.decide',
  params: z.object({ importId: id }),
  load: loadImport,
  handler: ({ row }) => describeColumns(row),
});
