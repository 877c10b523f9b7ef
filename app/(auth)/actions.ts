'use server';

import { redirect } from 'next/navigation';
import { z } from 'zod';

import { requestPasswordReset, resetPassword } from '@/lib/access/accounts';
import { action } from '@/lib/access/action';
import { optionalActor } from '@/lib/access/actor';
import { recordAudit } from '@/lib/access/audit';
import { emailField, personNameField } from '@/lib/access/email';
import { createFirstAdministrator } from '@/lib/access/first-run';
import { acceptInvitation } from '@/lib/access/invitations';
import { localPath } from '@/lib/access/local-path';
import { endSession, startSession } from '@/lib/access/session-cookie';
import { authenticate, signInRefusal } from '@/lib/access/sign-in';
import { invalid } from '@/lib/errors';

const passwordField = z.string('Give a password.').min(1, 'Give a password.');
const secretField = z.string().max(200);

/** The new password twice, since nobody can see what they typed. */
const newPassword = { password: passwordField, repeated: z.string().default('') };
const same = (fields: { password: string; repeated: string }) => fields.password === fields.repeated;
const sameError = { path: ['repeated'], message: 'The two passwords differ.' };

export const signIn = action(null, z.object({ email: z.string().min(1, 'Give your e-mail address.'), password: passwordField, next: z.string().optional() }), async ({ input, headers }) => {
  const claims = await authenticate(input.email, input.password, headers);
  if (!claims) throw invalid(signInRefusal);
  await startSession(claims);
  redirect(localPath(input.next));
});

export const signOut = action(null, z.object({}), async ({ headers }) => {
  const actor = await optionalActor();
  if (actor) await recordAudit(actor, { headers }, { action: 'session.ended' });
  await endSession();
  redirect('/sign-in');
});

export const askForReset = action(null, z.object({ email: emailField }), async ({ input, headers }) => {
  await requestPasswordReset(input.email, headers);
  return { done: 'If there is an account with this address, a mail with a link is on its way. The link works for two hours.' };
});

export const setNewPassword = action(null, z.object({ secret: secretField, ...newPassword }).refine(same, sameError), async ({ input, headers }) => {
  await startSession(await resetPassword(input.secret, input.password, headers));
  redirect('/portfolios');
});

export const accept = action(null, z.object({ secret: secretField, name: personNameField, ...newPassword }).refine(same, sameError), async ({ input, headers }) => {
  await startSession(await acceptInvitation(input.secret, input, headers));
  redirect('/portfolios');
});

export const setUp = action(null, z.object({ email: emailField, name: personNameField, ...newPassword }).refine(same, sameError), async ({ input, headers }) => {
  await startSession(await createFirstAdministrator(input, headers));
  redirect('/portfolios');
});
