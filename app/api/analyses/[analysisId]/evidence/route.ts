import { z } from 'zod';

import { assertFinished, loadAnalysis } from '@/lib/analyses/reading/analyses';
import { readEvidence } from '@/lib/analyses/reading/evidence';
import { evidenceQuery } from '@/lib/analyses/reading/queries';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'portfolio.view',
  params: z.object({ analysisId: id }),
  query: evidenceQuery,
  load: loadAnalysis,
  handler({ actor, row, query }) {
    assertFinished(row);
    return readEvidence(actor, row, query);
  },
});
