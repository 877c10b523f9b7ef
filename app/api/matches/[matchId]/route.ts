import { z } from 'zod';

import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';
import { decideMatch, loadMatch, presentMatch, reopenMatch } from '@/lib/matches/matches';

export const dynamic = 'force-dynamic';

const params = z.object({ matchId: id });

export const GET = route({ action: 'portfolio.view', params, load: loadMatch, handler: ({ actor, row }) => presentMatch(actor, row.id) });

export const POST = route({
  action: 'match.decide',
  params,
  body: z.object({ decision: z.enum(['same', 'different', 'later']) }),
  load: loadMatch,
  async handler({ actor, row, body }) {
    await decideMatch(actor, row, body.decision);
    return presentMatch(actor, row.id);
  },
  audit: ({ row, body }) => ({ action: 'match.decided', subjectType: 'match', subjectId: String(row.id), details: { decision: body.decision } }),
});

export const DELETE = route({
  action: 'match.decide',
  params,
  load: loadMatch,
  async handler({ actor, row }) {
    await reopenMatch(row);
    return presentMatch(actor, row.id);
  },
  audit: ({ row }) => ({ action: 'match.reopened', subjectType: 'match', subjectId: String(row.id) }),
});
