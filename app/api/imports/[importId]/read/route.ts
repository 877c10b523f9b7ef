import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { columnKinds } from '@/lib/bibliography/readers/delimited-columns';
import { formats } from '@/lib/bibliography/record';
import { readImportAgain } from '@/lib/imports/decide';
import { loadImport, presentImports } from '@/lib/imports/lists';

export const dynamic = 'force-dynamic';

/** Reads the stored file again, in another format or encoding, or with the columns of a table named. */
export const POST = route({
  action: 'import.decide',
  params: z.object({ importId: id }),
  body: z.object({ format: z.enum(formats).nullish(), encoding: z.enum(['utf-8', 'utf-16le', 'utf-16be', 'windows-1252']).nullish(), columns: z.array(z.enum(columnKinds).nullable()).min(2).max(1_000).nullish() }).strict(),
  load: loadImport,
  status: 202,
  async handler({ actor, row, body }) {
    await readImportAgain(actor, row, body);
    return (await presentImports([await row.reload()]))[0];
  },
  audit: ({ row, body }) => ({ action: 'import.read-again', subjectType: 'import', subjectId: String(row.id), details: body }),
});
