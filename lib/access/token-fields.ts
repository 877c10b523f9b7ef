import { z } from 'zod';

export const tokenFields = z.object({
  name: z.string('Give the token a name.').trim().min(1, 'Give the token a name.').max(120, 'Use at most 120 characters.'),
  /** null or left out: until it is revoked. */
  expiresInDays: z.number().int().min(1, 'At least one day.').max(3650, 'At most ten years.').nullable().default(null),
});
