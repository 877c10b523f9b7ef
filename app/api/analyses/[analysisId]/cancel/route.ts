import { z } from 'zod';

import { loadAnalysis, presentAnalysis } from '@/lib/analyses/reading/analyses';
import { cancelAnalysis } from '@/lib/analyses/run';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

export const POST = route({
  action: 'analysis.run',
  params: z.object({ analysisId: id }),
  load: loadAnalysis,
  status: 202,
  async handler({ row }) {
    await cancelAnalysis(row);
    return presentAnalysis(await row.reload());
  },
  audit: ({ row }) => ({ action: 'analysis.cancelled', subjectType: 'analysis', subjectId: String(row.id) }),
});
