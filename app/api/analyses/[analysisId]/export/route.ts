import { z } from 'zod';

import { assertFinished, loadAnalysis } from '@/lib/analyses/reading/analyses';
import { exportAnalysis } from '@/lib/analyses/reading/export';
import { exportQuery } from '@/lib/analyses/reading/queries';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'export.make',
  params: z.object({ analysisId: id }),
  query: exportQuery,
  load: loadAnalysis,
  handler({ row, query }) {
    assertFinished(row);
    return exportAnalysis(row, query);
  },
  audit: ({ row, query }) => ({ action: 'analysis.exported', subjectType: 'analysis', subjectId: String(row.id), details: { format: query.format } }),
});
