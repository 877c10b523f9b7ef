import { z } from 'zod';

import { assertFinished, loadAnalysis } from '@/lib/analyses/reading/analyses';
import { analysisWorksQuery } from '@/lib/analyses/reading/queries';
import { listAnalysisWorks } from '@/lib/analyses/reading/works';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'portfolio.view',
  params: z.object({ analysisId: id }),
  query: analysisWorksQuery,
  load: loadAnalysis,
  handler({ row, query }) {
    assertFinished(row);
    return listAnalysisWorks(row.id, query);
  },
});
