'use server';

import { revalidatePath } from 'next/cache';
import { z } from 'zod';

import { changeName, changePassword } from '@/lib/access/accounts';
import { action } from '@/lib/access/action';
import { personNameField } from '@/lib/access/email';
import { startSession } from '@/lib/access/session-cookie';
import { tokenFields } from '@/lib/access/token-fields';
import { createToken, revokeToken } from '@/lib/access/tokens';
import { id } from '@/lib/api/schemas';

export const saveName = action('account.use', z.object({ name: personNameField }), async ({ actor, input, headers }) => {
  await changeName(actor, input.name, headers);
  // The header shows it on every page.
  revalidatePath('/', 'layout');
  return { done: 'Your name was changed.' };
});

const passwords = z
  .object({ current: z.string().min(1, 'Give your present password.'), password: z.string().min(1, 'Give a new password.'), repeated: z.string().default('') })
  .refine((fields) => fields.password === fields.repeated, { path: ['repeated'], message: 'The two passwords differ.' });

export const savePassword = action('account.use', passwords, async ({ actor, input, headers }) => {
  await startSession(await changePassword(actor, input, headers));
  return { done: 'Your password was changed. Everywhere else you are signed out.' };
});

const tokenForm = z.object({
  name: tokenFields.shape.name,
  expiresInDays: z.enum(['30', '90', '365', 'never']).transform((value) => (value === 'never' ? null : Number(value))),
});

export const makeToken = action('account.use', tokenForm, async ({ actor, input, headers }) => {
  const token = await createToken(actor, input, headers);
  revalidatePath('/account');
  return { done: `The token "${token.name}" was made. Copy it now: it is not shown again.`, data: { secret: token.secret } };
});

export const dropToken = action('account.use', z.object({ id }), async ({ actor, input, headers }) => {
  await revokeToken(actor, input.id, headers);
  revalidatePath('/account');
  return { done: 'The token was revoked.' };
});
