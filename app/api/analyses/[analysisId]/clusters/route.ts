import { z } from 'zod';

import { assertFinished, loadAnalysis } from '@/lib/analyses/reading/analyses';
import { listClusters } from '@/lib/analyses/reading/clusters';
import { clustersQuery } from '@/lib/analyses/reading/queries';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

export const GET = route({
  action: 'portfolio.view',
  params: z.object({ analysisId: id }),
  query: clustersQuery,
  load: loadAnalysis,
  handler({ row, query }) {
    assertFinished(row);
    return listClusters(row.id, query);
  },
});
