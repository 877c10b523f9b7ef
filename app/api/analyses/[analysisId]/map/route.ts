import { z } from 'zod';

import { assertFinished, loadAnalysis } from '@/lib/analyses/reading/analyses';
import { readMapBytes } from '@/lib/analyses/reading/map';
import { mapQuery } from '@/lib/analyses/reading/queries';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

/** The map as it was stored. A finished analysis never changes, so that a browser that has it need not be sent it again. */
export const GET = route({
  action: 'portfolio.view',
  params: z.object({ analysisId: id }),
  query: mapQuery,
  load: loadAnalysis,
  async handler({ row, query, request }) {
    assertFinished(row);
    const headers = { ETag: `"${row.id}-${query.basis}-${row.resultFingerprint ?? ''}"`, 'Cache-Control': 'private, no-cache', Vary: 'Cookie, Authorization' };
    if (request.headers.get('if-none-match') === headers.ETag) return new Response(null, { status: 304, headers });
    return new Response(new Uint8Array(await readMapBytes(row.id, query.basis)), { headers: { ...headers, 'Content-Type': 'application/json' } });
  },
});
