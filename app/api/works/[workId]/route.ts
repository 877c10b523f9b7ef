import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { loadWork } from '@/lib/catalogue/reading/visibility';
import { readWork } from '@/lib/catalogue/reading/work-detail';

export const dynamic = 'force-dynamic';

export const GET = route({ action: 'work.view', params: z.object({ workId: id }), load: loadWork, handler: ({ actor, row }) => readWork(actor, row) });
