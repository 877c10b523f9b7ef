import { z } from 'zod';

import { unitChanges } from '@/lib/access/unit-fields';
import { changeUnit, deleteUnit } from '@/lib/access/units';
import { route } from '@/lib/api/route';
import { id } from '@/lib/api/schemas';

const params = z.object({ id });

export const PATCH = route({
  action: 'unit.manage',
  params,
  body: unitChanges,
  handler: ({ actor, params, body, request }) => changeUnit(actor, params.id, body, request.headers),
});

export const DELETE = route({
  action: 'unit.manage',
  params,
  handler: ({ actor, params, request }) => deleteUnit(actor, params.id, request.headers),
});
