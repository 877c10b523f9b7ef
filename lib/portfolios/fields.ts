import { z } from 'zod';

import { grantLevels } from '@/lib/access/permissions';
import { id, yearOrNull } from '@/lib/api/schemas';

const name = z.string().trim().min(1, 'Give the portfolio a name.').max(200, 'A name may have 200 characters.');
const description = z.string().trim().max(2000, 'A description may have 2,000 characters.');

const inOrder = (fields: { periodFrom?: number | null; periodTo?: number | null }) =>
  fields.periodFrom === undefined || fields.periodFrom === null || fields.periodTo === undefined || fields.periodTo === null || fields.periodFrom <= fields.periodTo;
const order = { path: ['periodTo'], message: 'The period ends before it begins.' };

/** A person by id or by e-mail, and what they are given. */
export const grantFields = z
  .object({ userId: id.optional(), email: z.email('This is not an e-mail address.').max(254).optional(), level: z.enum(grantLevels) })
  .strict()
  .refine((grant) => (grant.userId === undefined) !== (grant.email === undefined), { message: 'Name a person by userId or by email.' });
export type GrantFields = z.output<typeof grantFields>;

const grants = z.array(grantFields).max(500, 'At most 500 people can be named at once.');

export const newPortfolio = z
  .object({ name, description: description.default(''), unitId: id.nullish(), periodFrom: yearOrNull.optional(), periodTo: yearOrNull.optional(), grants: grants.default([]) })
  .strict()
  .refine(inOrder, order);
export type NewPortfolio = z.output<typeof newPortfolio>;

export const portfolioChanges = z
  .object({ name: name.optional(), description: description.optional(), unitId: id.nullish(), periodFrom: yearOrNull.optional(), periodTo: yearOrNull.optional() })
  .strict()
  .refine(inOrder, order);
export type PortfolioChanges = z.output<typeof portfolioChanges>;

/** The whole list of people; who is not on it loses the portfolio. */
export const grantList = z.object({ grants }).strict();

export const workIds = z.object({ workIds: z.array(id).min(1, 'Name at least one work.').max(1000, 'At most 1,000 works at once.') }).strict();
