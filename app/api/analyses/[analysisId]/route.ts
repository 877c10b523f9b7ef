import { z } from 'zod';

import { loadAnalysis, presentAnalysis } from '@/lib/analyses/reading/analyses';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

export const GET = route({ action: 'portfolio.view', params: z.object({ analysisId: id }), load: loadAnalysis, handler: ({ row }) => presentAnalysis(row) });
