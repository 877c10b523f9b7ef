import { encode } from 'next-auth/jwt';
import { afterAll, describe, expect, it } from 'vitest';

import { GET, POST } from '@/app/api/auth/[...nextauth]/route';
import { GET as getMe } from '@/app/api/me/route';
import { changePassword } from '@/lib/access/accounts';
import { actorFromRequest } from '@/lib/access/actor';
import { actorOfClaims, sessionCookieName } from '@/lib/access/session';
import { authenticate } from '@/lib/access/sign-in';
import { changeUser } from '@/lib/access/users';
import { closeDatabase } from '@/lib/db/connection';
import { AuditEvent } from '@/models/audit-event';
import { User } from '@/models/user';
import { call, createUser, makeRequest, testPassword, unique } from '../factories';

afterAll(closeDatabase);

const params = (...nextauth: string[]) => ({ params: Promise.resolve({ nextauth }) });
const cookiesOf = (response: Response) => response.headers.getSetCookie();
const asCookieHeader = (setCookies: string[]) => setCookies.map((cookie) => cookie.split(';')[0]).join('; ');

/** Signs in as a script does: csrf token first, then the credentials callback. */
async function signIn(email: string, password: string, { headers = {}, fields = {}, csrf = true }: { headers?: Record<string, string>; fields?: Record<string, string>; csrf?: boolean } = {}) {
  const tokenAnswer = await GET(await makeRequest('/api/auth/csrf'), params('csrf'));
  const { csrfToken } = (await tokenAnswer.json()) as { csrfToken: string };
  const all = { cookie: asCookieHeader(cookiesOf(tokenAnswer)), 'content-type': 'application/x-www-form-urlencoded', ...headers };
  const body = new URLSearchParams({ email, password, ...(csrf ? { csrfToken } : {}), ...fields }).toString();
  return POST(await makeRequest('/api/auth/callback/credentials', { method: 'POST', headers: all, body }), params('callback', 'credentials'));
}

const sessionOf = (response: Response) => cookiesOf(response).find((cookie) => cookie.startsWith(`${sessionCookieName()}=`));

describe('signing in through the credentials callback', () => {
  it('refuses without a csrf token', async () => {
    const user = await createUser('reader');
    const response = await signIn(user.email, testPassword, { csrf: false });
    expect(response.headers.get('location')).toContain('csrf=true');
    expect(sessionOf(response)).toBeUndefined();
  });

  it('gives one and the same answer to a wrong password, an unknown account and a disabled account', async () => {
    const user = await createUser('reader');
    const disabled = await createUser('reader', { disabledAt: new Date() });
    const answers = [await signIn(user.email, 'a wrong password', { fields: { json: 'true' } }), await signIn(`${unique()}@test.example`, testPassword, { fields: { json: 'true' } }), await signIn(disabled.email, testPassword, { fields: { json: 'true' } })];
    for (const answer of answers) {
      expect(answer.status).toBe(401);
      expect(sessionOf(answer)).toBeUndefined();
    }
    const bodies = await Promise.all(answers.map((answer) => answer.text()));
    expect(new Set(bodies).size).toBe(1);
  });

  it('sets a cookie that scripts in a page cannot read and that opens the API', async () => {
    const user = await createUser('librarian');
    const response = await signIn(user.email.toUpperCase(), testPassword);
    expect(response.status).toBe(302);
    const cookie = sessionOf(response);
    expect(cookie).toMatch(/; HttpOnly/);
    expect(cookie).toMatch(/; SameSite=Lax/);
    const me = await call(getMe, '/api/me', { headers: { cookie: cookie!.split(';')[0] } });
    expect(me.status).toBe(200);
    expect(me.body).toMatchObject({ id: String(user.id), email: user.email, role: 'librarian', via: 'session' });
  });

  it('sends nobody to another site afterwards', async () => {
    const user = await createUser('reader');
    for (const callbackUrl of ['https://elsewhere.example/', '//elsewhere.example/', '/\\elsewhere.example']) {
      expect((await signIn(user.email, testPassword, { fields: { callbackUrl } })).headers.get('location')).toBe('/portfolios');
    }
    expect((await signIn(user.email, testPassword, { fields: { callbackUrl: '/account?x=1' } })).headers.get('location')).toBe('/account?x=1');
  });

  it('stops after ten tries for an account, even with the right password, and says when to go on', async () => {
    const user = await createUser('reader');
    for (let index = 0; index < 10; index += 1) expect((await signIn(user.email, 'a wrong password', { fields: { json: 'true' } })).status).toBe(401);
    const stopped = await signIn(user.email, testPassword, { fields: { json: 'true' } });
    expect(stopped.status).toBe(429);
    const seconds = Number(stopped.headers.get('retry-after'));
    expect(seconds).toBeGreaterThan(800);
    expect(seconds).toBeLessThanOrEqual(900);
    expect(await stopped.text()).toContain('Try again in 15 minutes');
    const inBrowser = await signIn(user.email, testPassword, { headers: { accept: 'text/html' } });
    expect(inBrowser.headers.get('location')).toMatch(/^\/sign-in\?error=too-many&wait=\d+$/);
  });

  it('counts tries at the same moment, each once', async () => {
    const user = await createUser('reader');
    const outcomes = await Promise.allSettled(Array.from({ length: 16 }, () => authenticate(user.email, 'a wrong password', new Headers())));
    expect(outcomes.filter((outcome) => outcome.status === 'rejected')).toHaveLength(6);
  });

  it('forgets failed tries after a success', async () => {
    const user = await createUser('reader');
    for (let round = 0; round < 2; round += 1) {
      for (let index = 0; index < 9; index += 1) expect(await authenticate(user.email, 'a wrong password', new Headers())).toBeNull();
      expect(await authenticate(user.email, testPassword, new Headers())).toMatchObject({ userId: user.id });
    }
  });

  it('writes sign-ins and refusals into the audit log, without what was typed', async () => {
    const user = await createUser('reader');
    await authenticate(user.email, 'a mistyped secret', new Headers());
    await authenticate(user.email, testPassword, new Headers());
    const refused = await AuditEvent.findOne({ where: { action: 'session.refused', subjectId: String(user.id) } });
    expect(refused?.details).toEqual({ reason: 'wrong password' });
    expect(await AuditEvent.count({ where: { action: 'session.started', userId: user.id } })).toBe(1);
    expect(JSON.stringify(await AuditEvent.findAll({ order: [['id', 'DESC']], limit: 5 }))).not.toContain('mistyped');
  });
});

describe('a session', () => {
  const whoIs = async (cookie: string) => actorFromRequest(await makeRequest('/api/me', { headers: { cookie } }));

  it('ends everywhere when the password changes, and goes on in the browser that changed it', async () => {
    const user = await createUser('reader');
    const cookie = asCookieHeader([sessionOf(await signIn(user.email, testPassword))!]);
    const actor = await whoIs(cookie);
    expect(actor).toMatchObject({ userId: user.id });
    const claims = await changePassword(actor!, { current: testPassword, password: 'eight blue kettles' }, new Headers());
    expect(await whoIs(cookie)).toBeNull();
    expect(await actorOfClaims(claims)).toMatchObject({ userId: user.id });
    expect(await authenticate(user.email, testPassword, new Headers())).toBeNull();
  });

  it('ends when the account is disabled, and stays ended when it is enabled again', async () => {
    const user = await createUser('reader');
    const administrator = await createUser('administrator');
    const actor = { userId: administrator.id, name: '', email: '', role: 'administrator', via: 'session' } as const;
    const cookie = asCookieHeader([sessionOf(await signIn(user.email, testPassword))!]);
    await changeUser(actor, user.id, { disabled: true }, new Headers());
    expect(await whoIs(cookie)).toBeNull();
    await changeUser(actor, user.id, { disabled: false }, new Headers());
    expect(await whoIs(cookie)).toBeNull();
    expect(await authenticate(user.email, testPassword, new Headers())).not.toBeNull();
  });

  it('follows a change of role at once', async () => {
    const user = await createUser('reader');
    const cookie = asCookieHeader([sessionOf(await signIn(user.email, testPassword))!]);
    await User.update({ role: 'librarian' }, { where: { id: user.id } });
    expect(await whoIs(cookie)).toMatchObject({ role: 'librarian' });
  });

  it('cannot be made up or changed', async () => {
    const user = await createUser('reader');
    const cookie = asCookieHeader([sessionOf(await signIn(user.email, testPassword))!]);
    expect(await whoIs(`${cookie.slice(0, -3)}abc`)).toBeNull();
    expect(await whoIs(`${sessionCookieName()}=nonsense`)).toBeNull();
    expect(await whoIs(`${sessionCookieName()}=${await encode({ token: { userId: user.id, sessionVersion: 0 }, secret: 'another secret of more than 32 letters' })}`)).toBeNull();
  });

  it('is told by next-auth with name and role only, and is empty once it has ended', async () => {
    const user = await createUser('evaluator');
    const cookie = asCookieHeader([sessionOf(await signIn(user.email, testPassword))!]);
    const ask = async () => {
      const answer = await GET(await makeRequest('/api/auth/session', { headers: { cookie } }), params('session'));
      return (await answer.json()) as Record<string, unknown>;
    };
    expect((await ask()).user).toEqual({ id: String(user.id), name: user.name, email: user.email, role: 'evaluator' });
    await User.update({ disabledAt: new Date() }, { where: { id: user.id } });
    expect(await ask()).toEqual({});
  });
});
