import { z } from 'zod';

import { loadJob, presentJob } from '@/lib/analyses/reading/jobs';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

export const dynamic = 'force-dynamic';

export const GET = route({ action: 'portfolio.view', params: z.object({ jobId: id }), load: loadJob, handler: async ({ row }) => presentJob(row) });
