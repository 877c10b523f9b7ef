import { z } from 'zod';

import { assertFinished, loadAnalysis } from '@/lib/analyses/reading/analyses';
import { requestVerification } from '@/lib/analyses/run';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

export const POST = route({
  action: 'analysis.run',
  params: z.object({ analysisId: id }),
  load: loadAnalysis,
  status: 202,
  async handler({ actor, row }) {
    assertFinished(row);
    return { jobId: String(await requestVerification(actor, row)) };
  },
  audit: ({ row }) => ({ action: 'analysis.verification-requested', subjectType: 'analysis', subjectId: String(row.id) }),
});
