import { z } from 'zod';

import { listAnalyses, presentAnalysis } from '@/lib/analyses/reading/analyses';
import { newAnalysis } from '@/lib/analyses/reading/parameters';
import { analysesQuery } from '@/lib/analyses/reading/queries';
import { requestAnalysis } from '@/lib/analyses/run';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { type AnalysisView } from '@/lib/api/types';
import { loadPortfolio } from '@/lib/portfolios/load';

export const dynamic = 'force-dynamic';

const params = z.object({ portfolioId: id });

export const GET = route({ action: 'portfolio.view', params, query: analysesQuery, load: loadPortfolio, handler: ({ row, query }) => listAnalyses(row.id, query) });

export const POST = route({
  action: 'analysis.run',
  params,
  body: newAnalysis,
  load: loadPortfolio,
  status: 202,
  handler: async ({ actor, row, body }) => presentAnalysis(await requestAnalysis(actor, row.id, body.parameters)),
  audit: ({ row, body }, result) => ({ action: 'analysis.requested', subjectType: 'analysis', subjectId: (result as AnalysisView).id, details: { portfolioId: row.id, parameters: body.parameters } }),
});
