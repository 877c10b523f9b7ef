import { z } from 'zod';

import { unitKinds } from '@/lib/access/unit-kinds';
import { id } from '@/lib/api/schemas';

export const unitNameField = z.string('Give the unit a name.').trim().min(1, 'Give the unit a name.').max(200, 'Use at most 200 characters.');
export const unitKindField = z.enum(unitKinds, `must be one of ${unitKinds.join(', ')}`);

export const unitFields = z.object({ name: unitNameField, kind: unitKindField.default('department'), parentId: id.nullable().default(null) });
export const unitChanges = z.strictObject({ name: unitNameField.optional(), kind: unitKindField.optional(), parentId: id.nullable().optional() });
