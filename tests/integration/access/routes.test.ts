import { afterAll, describe, expect, it } from 'vitest';

import { GET as getAudit } from '@/app/api/audit/route';
import { GET as getHealth } from '@/app/api/health/route';
import { DELETE as deleteInvitation } from '@/app/api/invitations/[id]/route';
import { GET as getInvitations, POST as postInvitation } from '@/app/api/invitations/route';
import { GET as getMails } from '@/app/api/mails/route';
import { GET as getMe } from '@/app/api/me/route';
import { GET as getPeople } from '@/app/api/people/route';
import { DELETE as deleteToken } from '@/app/api/tokens/[id]/route';
import { GET as getTokens, POST as postToken } from '@/app/api/tokens/route';
import { DELETE as deleteUnit, PATCH as patchUnit } from '@/app/api/units/[id]/route';
import { GET as getUnits, POST as postUnit } from '@/app/api/units/route';
import { GET as getUser, PATCH as patchUser } from '@/app/api/users/[id]/route';
import { GET as getUsers } from '@/app/api/users/route';
import { roles } from '@/lib/access/permissions';
import { closeDatabase, database } from '@/lib/db/connection';
import { ApiToken } from '@/models/api-token';
import { AuditEvent } from '@/models/audit-event';
import { Job } from '@/models/job';
import { type User } from '@/models/user';
import { bearerToken, call, createPortfolio, createUnit, createUser, sessionCookie, unique } from '../factories';

afterAll(closeDatabase);

describe('who may come in', () => {
  it('answers 401 to strangers on every route', async () => {
    const everything = [getMe, getTokens, postToken, deleteToken, getUsers, getUser, patchUser, getPeople, getInvitations, postInvitation, deleteInvitation, getUnits, postUnit, patchUnit, deleteUnit, getMails, getAudit];
    for (const handler of everything) {
      const { status, body, headers } = await call(handler, '/api/anything', { params: { id: '1' } });
      expect(status).toBe(401);
      expect(headers.get('content-type')).toBe('application/problem+json');
      expect(body).toMatchObject({ status: 401, requestId: headers.get('x-request-id') });
    }
  });

  it('answers 403 on administration routes to everybody but administrators', async () => {
    for (const role of roles.filter((role) => role !== 'administrator')) {
      const as = await createUser(role);
      const json = { email: 'x@test.example', name: 'X', role: 'administrator' };
      for (const [handler, options] of [
        [getUsers, {}], [getUser, {}], [patchUser, { method: 'PATCH', json: { role: 'administrator' } }], [getInvitations, {}], [postInvitation, { method: 'POST', json }], [deleteInvitation, { method: 'DELETE' }],
        [postUnit, { method: 'POST', json: { name: 'X' } }], [patchUnit, { method: 'PATCH', json: {} }], [deleteUnit, { method: 'DELETE' }], [getMails, {}], [getAudit, {}],
      ] as const) {
        expect((await call(handler, '/api/anything', { ...options, as, params: { id: String(as.id) } })).status).toBe(403);
      }
      await as.reload();
      expect(as.role).toBe(role);
    }
  });

  it('tells who is signed in and what their role allows', async () => {
    const as = await createUser('reader');
    const { body } = await call(getMe, '/api/me', { as });
    expect(body).toMatchObject({ id: String(as.id), name: as.name, role: 'reader', via: 'session' });
    expect(body.actions).toContain('portfolio.view');
    expect(body.actions).not.toContain('user.manage');
  });
});

describe('a request with a cookie that changes something', () => {
  const post = async (as: User, headers: Record<string, string>) => (await call(postToken, '/api/tokens', { method: 'POST', as, json: { name: 'x' }, headers })).status;

  it('is refused when it comes from another site', async () => {
    const as = await createUser('reader');
    for (const origin of ['https://elsewhere.example', 'null', 'http://localhost.elsewhere.example:3000', 'http://localhost:3001', 'https://localhost:3000']) expect(await post(as, { origin })).toBe(403);
    expect(await ApiToken.count({ where: { userId: as.id } })).toBe(0);
  });

  it('passes from its own pages under any name that the service is reached by', async () => {
    const as = await createUser('reader');
    expect(await post(as, {})).toBe(201);
    expect(await post(as, { host: '127.0.0.1:3000', origin: 'http://127.0.0.1:3000' })).toBe(201);
  });

  it('is judged by Sec-Fetch-Site, then Referer, where there is no Origin, and refused without any of them', async () => {
    const as = await createUser('reader');
    const cookie = await sessionCookie(as);
    const bare = async (headers: Record<string, string>) => (await call(postToken, '/api/tokens', { method: 'POST', json: { name: 'x' }, headers: { cookie, ...headers } })).status;
    expect(await bare({})).toBe(403);
    expect(await bare({ 'sec-fetch-site': 'same-origin' })).toBe(201);
    expect(await bare({ 'sec-fetch-site': 'same-site', referer: 'http://localhost:3000/account' })).toBe(403);
    expect(await bare({ referer: 'http://localhost:3000/account' })).toBe(201);
    expect(await bare({ referer: 'https://elsewhere.example/http://localhost:3000/' })).toBe(403);
  });

  it('needs no Origin with a token', async () => {
    const token = await bearerToken(await createUser('administrator'));
    expect((await call(postUnit, '/api/units', { method: 'POST', token, json: { name: unique('unit') } })).status).toBe(201);
  });
});

describe('tokens', () => {
  it('are made with a secret that is shown once, used, listed without it and revoked', async () => {
    const as = await createUser('librarian');
    for (const json of [{}, { name: '  ' }, { name: 'x', expiresInDays: 0 }, { name: 7 }]) expect((await call(postToken, '/api/tokens', { method: 'POST', as, json })).status).toBe(422);
    const made = await call(postToken, '/api/tokens', { method: 'POST', as, json: { name: 'Nightly export', expiresInDays: 30 } });
    expect(made.status).toBe(201);
    expect(made.body.secret).toMatch(/^hdl_[\w-]{43}$/);
    expect((await call(getMe, '/api/me', { token: made.body.secret })).body).toMatchObject({ id: String(as.id), via: 'token' });
    const list = await call(getTokens, '/api/tokens', { as });
    expect(list.body).toMatchObject({ total: 1, page: 1, items: [{ name: 'Nightly export', hint: made.body.secret.slice(-4), lastUsedAt: expect.any(String) }] });
    expect(JSON.stringify(list.body)).not.toContain(made.body.secret);
    const stranger = await createUser('administrator');
    expect((await call(deleteToken, '/api/tokens/1', { method: 'DELETE', as: stranger, params: { id: made.body.id } })).status).toBe(404);
    expect((await call(deleteToken, '/api/tokens/1', { method: 'DELETE', as, params: { id: made.body.id } })).status).toBe(204);
    expect((await call(getMe, '/api/me', { token: made.body.secret })).status).toBe(401);
    expect(await AuditEvent.count({ where: { userId: as.id, action: ['token.created', 'token.revoked'] } })).toBe(2);
  });

  it('do not open anything once expired, revoked or with their owner disabled, nor when they are made up', async () => {
    const user = await createUser('reader');
    const good = await bearerToken(user);
    expect((await call(getMe, '/api/me', { token: good })).status).toBe(200);
    for (const token of [await bearerToken(user, { expiresAt: new Date(Date.now() - 1000) }), await bearerToken(user, { revokedAt: new Date() }), 'hdl_made-up', '']) expect((await call(getMe, '/api/me', { token })).status).toBe(401);
    await user.update({ disabledAt: new Date() });
    expect((await call(getMe, '/api/me', { token: good })).status).toBe(401);
  });

  it('are judged alone: a wrong one does not fall back on the cookie', async () => {
    expect((await call(getMe, '/api/me', { as: await createUser('reader'), token: 'hdl_wrong' })).status).toBe(401);
  });

  it('note their use at most once a minute', async () => {
    const token = await bearerToken(await createUser('reader'));
    const row = async () => (await ApiToken.findOne({ where: { hint: token.slice(-4) }, order: [['id', 'DESC']] }))!;
    await call(getMe, '/api/me', { token });
    const first = (await row()).lastUsedAt;
    await call(getMe, '/api/me', { token });
    expect((await row()).lastUsedAt).toEqual(first);
    await ApiToken.update({ lastUsedAt: new Date(Date.now() - 61_000) }, { where: { id: (await row()).id } });
    await call(getMe, '/api/me', { token });
    expect((await row()).lastUsedAt!.getTime()).toBeGreaterThanOrEqual(first!.getTime());
  });

  it('cannot make further tokens', async () => {
    const token = await bearerToken(await createUser('reader'));
    expect((await call(postToken, '/api/tokens', { method: 'POST', token, json: { name: 'x' } })).status).toBe(403);
  });
});

describe('users', () => {
  it('are listed by page, search and order, without anything secret', async () => {
    const as = await createUser('administrator');
    const word = unique('per%son');
    for (const name of ['C', 'A', 'B']) await createUser('author', { name: `${word} ${name}` });
    expect((await call(getUsers, '/api/users?sort=passwordHash', { as })).status).toBe(422);
    const { body } = await call(getUsers, `/api/users?q=${encodeURIComponent(word)}&sort=-name&pageSize=2`, { as });
    expect(body).toMatchObject({ total: 3, page: 1, pageSize: 2 });
    expect(body.items.map((item: { name: string }) => item.name)).toEqual([`${word} C`, `${word} B`]);
    expect(Object.keys(body.items[0]).sort()).toEqual(['createdAt', 'demonstration', 'disabled', 'email', 'id', 'lastSignInAt', 'name', 'role']);
    expect((await call(getUsers, '/api/users?q=%25%25%25', { as })).body.total).toBe(0);
  });

  it('are changed by administrators, with each change in the audit log', async () => {
    const as = await createUser('administrator');
    const user = await createUser('reader');
    const patch = (json: unknown, id = String(user.id)) => call(patchUser, `/api/users/${id}`, { method: 'PATCH', as, json, params: { id } });
    for (const json of [{ role: 'king' }, { name: '' }, { passwordHash: 'x' }, { disabled: 'yes' }]) expect((await patch(json)).status).toBe(422);
    expect((await patch({ role: 'author' }, '999999999')).status).toBe(404);
    expect((await patch({ role: 'author' }, '1 OR 1=1')).status).toBe(422);
    expect((await patch({ role: 'librarian', name: 'New Name', disabled: true })).body).toMatchObject({ role: 'librarian', name: 'New Name', disabled: true });
    expect((await call(getUser, '/api/users/1', { as, params: { id: String(user.id) } })).body.role).toBe('librarian');
    const events = await AuditEvent.findAll({ where: { subjectType: 'user', subjectId: String(user.id) }, order: [['id', 'ASC']] });
    expect(events.map((event) => event.action)).toEqual(['user.role-changed', 'user.disabled', 'user.renamed']);
    expect(events[0]).toMatchObject({ userId: as.id, details: { from: 'reader', to: 'librarian' } });
  });

  it('cannot disable themselves', async () => {
    const as = await createUser('administrator');
    expect((await call(patchUser, '/api/users/1', { method: 'PATCH', as, json: { disabled: true }, params: { id: String(as.id) } })).status).toBe(409);
  });

  it('are found by those who give portfolios away, disabled ones left out', async () => {
    const word = unique('find');
    const found = await createUser('reader', { name: `${word} found` });
    await createUser('reader', { name: `${word} gone`, disabledAt: new Date() });
    expect((await call(getPeople, `/api/people?q=${word}`, { as: await createUser('evaluator') })).status).toBe(403);
    const { body } = await call(getPeople, `/api/people?q=${word.toUpperCase()}`, { as: await createUser('librarian') });
    expect(body).toEqual({ items: [{ id: String(found.id), name: found.name, email: found.email, role: 'reader' }], total: 1, page: 1, pageSize: 50 });
  });
});

describe('invitations and mail', () => {
  it('are made, seen with their link under mail, and taken back', async () => {
    const as = await createUser('administrator');
    expect((await call(postInvitation, '/api/invitations', { method: 'POST', as, json: { email: 'nobody', name: 'X', role: 'reader' } })).body.errors).toHaveProperty('email');
    const email = `${unique()}@test.example`;
    const made = await call(postInvitation, '/api/invitations', { method: 'POST', as, json: { email: ` ${email.toUpperCase()}`, name: 'Nela Sorn', role: 'reader' } });
    expect(made.status).toBe(201);
    expect(made.body).toMatchObject({ email, state: 'open', role: 'reader' });
    expect(JSON.stringify(made.body)).not.toMatch(/token|secret/i);
    const { body: mails } = await call(getMails, '/api/mails?pageSize=5', { as });
    expect(mails.items[0]).toMatchObject({ recipient: email, state: 'kept', subject: 'Your invitation to Heddle', body: expect.stringMatching(/http:\/\/localhost:3000\/invitation\/[\w-]{43}\n/) });
    expect((await call(getInvitations, '/api/invitations?state=open', { as })).body.items[0].id).toBe(made.body.id);
    expect((await call(deleteInvitation, '/api/invitations/1', { method: 'DELETE', as, params: { id: made.body.id } })).status).toBe(204);
    expect((await call(getInvitations, '/api/invitations', { as })).body.items[0]).toMatchObject({ id: made.body.id, state: 'revoked' });
  });
});

describe('units', () => {
  it('are made, moved and removed, never into a circle and never from under what rests on them', async () => {
    const as = await createUser('administrator');
    const post = (json: unknown) => call(postUnit, '/api/units', { method: 'POST', as, json });
    const patch = (id: string, json: unknown) => call(patchUnit, `/api/units/${id}`, { method: 'PATCH', as, json, params: { id } });
    const remove = (id: string) => call(deleteUnit, `/api/units/${id}`, { method: 'DELETE', as, params: { id } });
    expect((await post({ name: ' ' })).status).toBe(422);
    expect((await post({ name: 'X', parentId: '999999999' })).status).toBe(422);
    const { body: faculty } = await post({ name: unique('faculty'), kind: 'faculty' });
    const { body: department } = await post({ name: unique('department'), parentId: faculty.id });
    expect(department).toEqual({ id: department.id, parentId: faculty.id, name: department.name, kind: 'department' });
    expect((await patch(faculty.id, { parentId: department.id })).status).toBe(422);
    expect((await patch(faculty.id, { parentId: faculty.id })).status).toBe(422);
    expect((await patch('999999999', { name: 'X' })).status).toBe(404);
    expect((await patch(department.id, { name: 'Peat and Soil' })).body).toMatchObject({ name: 'Peat and Soil', parentId: faculty.id });
    expect((await remove(faculty.id)).status).toBe(409);
    const portfolio = await createPortfolio({ unitId: Number(department.id) });
    expect((await remove(department.id)).status).toBe(409);
    await portfolio.update({ deletedAt: new Date() });
    expect((await remove(department.id)).status).toBe(204);
    expect((await remove(faculty.id)).status).toBe(204);
    expect((await remove(faculty.id)).status).toBe(404);
  });

  it('are never moved into a circle by two moves at the same moment', async () => {
    const as = await createUser('administrator');
    const [one, two] = [String((await createUnit()).id), String((await createUnit()).id)];
    const move = (id: string, parentId: string) => call(patchUnit, `/api/units/${id}`, { method: 'PATCH', as, json: { parentId }, params: { id } });
    const statuses = (await Promise.all([move(one, two), move(two, one)])).map((answer) => answer.status);
    expect(statuses.sort()).toEqual([200, 422]);
  });

  it('are seen by everybody', async () => {
    const unit = await createUnit({ name: `0000 ${unique()}` });
    const { body } = await call(getUnits, '/api/units?pageSize=200', { as: await createUser('reader') });
    expect(body.items).toContainEqual({ id: String(unit.id), parentId: null, name: unit.name, kind: 'department' });
  });
});

describe('the audit log', () => {
  it('is listed newest first and searched by the beginning of the action and by person', async () => {
    const as = await createUser('administrator');
    await call(postUnit, '/api/units', { method: 'POST', as, json: { name: unique('unit') } });
    const { body } = await call(getAudit, `/api/audit?q=unit.&userId=${as.id}`, { as });
    expect(body).toMatchObject({ total: 1, items: [{ action: 'unit.created', person: { id: String(as.id), name: as.name }, subjectType: 'unit' }] });
    expect((await call(getAudit, `/api/audit?q=%25&userId=${as.id}`, { as })).body.total).toBe(0);
  });
});

describe('health', () => {
  const ask = async () => {
    const response = await getHealth();
    return { status: response.status, body: (await response.json()) as Record<string, unknown> };
  };

  it('is open to all and degraded unless a worker was seen within 30 seconds', async () => {
    const name = unique('worker');
    await database().query('DELETE FROM workers');
    const job = await Job.create({ kind: 'test', payload: {}, runAfter: new Date(Date.now() + 86_400_000) });
    expect(await ask()).toMatchObject({ status: 503, body: { status: 'degraded', database: 'ok', worker: 'missing' } });
    await database().query("INSERT INTO workers (name, startedAt, seenAt) VALUES (?, NOW(3), NOW(3) - INTERVAL 31 SECOND)", { replacements: [name] });
    expect((await ask()).status).toBe(503);
    await database().query('UPDATE workers SET seenAt = NOW(3) - INTERVAL 10 SECOND WHERE name = ?', { replacements: [name] });
    const { status, body } = await ask();
    expect(status).toBe(200);
    expect(body).toMatchObject({ status: 'ok', database: 'ok', worker: 'ok', queue: { queued: expect.any(Number), running: expect.any(Number) } });
    expect((body.queue as { queued: number }).queued).toBeGreaterThan(0);
    await job.destroy();
    await database().query('DELETE FROM workers WHERE name = ?', { replacements: [name] });
  });
});
