import { afterAll, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';

vi.mock('next/headers', async () => (await import('../request-scope')).nextHeaders);

import { action } from '@/lib/access/action';
import { actorForPage, optionalActor } from '@/lib/access/actor';
import { untouchedForm } from '@/lib/access/form-state';
import { sessionCookieName } from '@/lib/access/session';
import { startSession } from '@/lib/access/session-cookie';
import { closeDatabase } from '@/lib/db/connection';
import { conflict, invalid } from '@/lib/errors';
import { createUser, sessionCookie } from '../factories';
import { withinRequest } from '../request-scope';

afterAll(closeDatabase);

const form = (fields: Record<string, string>) => {
  const data = new FormData();
  for (const [name, value] of Object.entries(fields)) data.set(name, value);
  return data;
};

const schema = z.object({ name: z.string().min(3, 'Use three letters or more.') });
const greet = action('user.manage', schema, async ({ actor, input }) => ({ done: `${actor.role} greets ${input.name}` }));

describe('the guard of server actions', () => {
  it('sends strangers to the sign-in page and back again, before it looks at anything', async () => {
    const attempt = withinRequest({ 'x-heddle-path': '/admin?page=2' }, () => greet(untouchedForm, form({ name: 'x' })));
    await expect(attempt).rejects.toMatchObject({ digest: expect.stringContaining(';/sign-in?next=%2Fadmin%3Fpage%3D2;') });
  });

  it('sends nobody to another site afterwards', async () => {
    const attempt = withinRequest({ 'x-heddle-path': '//elsewhere.example/' }, () => actorForPage());
    await expect(attempt).rejects.toMatchObject({ digest: expect.stringContaining(';/sign-in?next=%2Fportfolios;') });
  });

  it('refuses roles that may not, whatever they send', async () => {
    const { result } = await withinRequest({ cookie: await sessionCookie(await createUser('librarian')) }, () => greet(untouchedForm, form({ name: 'Nela' })));
    expect(result).toMatchObject({ error: 'Your role does not allow this.', done: null });
  });

  it('marks the fields that are wrong and keeps what was typed, except secrets', async () => {
    const cookie = await sessionCookie(await createUser('administrator'));
    const { result } = await withinRequest({ cookie }, () => greet(untouchedForm, form({ name: 'x', note: 'kept', password: 'secret', current: 'secret', $ACTION_ID: '1' })));
    expect(result).toEqual({ error: expect.any(String), errors: { name: 'Use three letters or more.' }, values: { name: 'x', note: 'kept' }, done: null, data: {} });
  });

  it('passes on expected errors in words, and says nothing of the inside of others', async () => {
    const failing = (error: Error) => action(null, z.object({}), () => Promise.reject(error));
    const run = async (error: Error) => (await withinRequest({}, () => failing(error)(untouchedForm, form({})))).result;
    expect((await run(conflict('It is taken.'))).error).toBe('It is taken.');
    expect(await run(invalid('No.', { name: 'Wrong.' }))).toMatchObject({ error: 'No.', errors: { name: 'Wrong.' } });
    const bland = (await run(new Error('ER_DUP_ENTRY users_email'))).error;
    expect(bland).toContain('went wrong');
    expect(bland).not.toContain('users_email');
  });

  it('does what it is for', async () => {
    const { result } = await withinRequest({ cookie: await sessionCookie(await createUser('administrator')) }, () => greet(untouchedForm, form({ name: 'Nela' })));
    expect(result).toEqual({ ...untouchedForm, done: 'administrator greets Nela' });
  });
});

it('starts sessions whose cookie is out of reach of scripts and opens pages', async () => {
  const user = await createUser('author');
  const { result, set } = await withinRequest({}, async () => {
    await startSession({ userId: user.id, sessionVersion: 0 });
    return optionalActor();
  });
  expect(result).toMatchObject({ userId: user.id, role: 'author' });
  expect(set.get(sessionCookieName())?.options).toMatchObject({ httpOnly: true, sameSite: 'lax', path: '/', secure: false });
});
