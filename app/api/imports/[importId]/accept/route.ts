import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { acceptImport } from '@/lib/imports/decide';
import { loadImport, presentImports } from '@/lib/imports/lists';

export const dynamic = 'force-dynamic';

export const POST = route({
  action: 'import.decide',
  params: z.object({ importId: id }),
  load: loadImport,
  status: 202,
  async handler({ actor, row }) {
    await acceptImport(actor, row);
    return (await presentImports([await row.reload()]))[0];
  },
  audit: ({ row }) => ({ action: 'import.accepted', subjectType: 'import', subjectId: String(row.id) }),
});
