import { randomBytes } from 'node:crypto';

import { NextRequest } from 'next/server';

import { hashPassword } from '@/lib/access/passwords';
import { type GrantLevel, type Role } from '@/lib/access/permissions';
import { hashSecret, makeSecret } from '@/lib/access/secrets';
import { makeSessionToken, sessionCookieName } from '@/lib/access/session';
import { environment } from '@/lib/environment';
import { ApiToken } from '@/models/api-token';
import { Portfolio } from '@/models/portfolio';
import { PortfolioGrant } from '@/models/portfolio-grant';
import { Unit } from '@/models/unit';
import { User } from '@/models/user';

/** Tests write and delete; they do so in a database of their own only. */
function refuseForeignDatabase(): void {
  const { DATABASE_URL, HEDDLE_TEST } = environment();
  const name = new URL(DATABASE_URL).pathname.slice(1);
  if (!/test|heddle_access/.test(name) && HEDDLE_TEST !== '1') throw new Error(`The database "${name}" is not a test database; nothing was touched.`);
}

refuseForeignDatabase();

/** A short text that no other call gives, so that tests share a database without meeting. */
export function unique(word = 'test'): string {
  return `${word}-${randomBytes(6).toString('hex')}`;
}

export const testPassword = 'seven grey herons';
let testPasswordHash: Promise<string> | undefined;

/** A person with the password `testPassword`. */
export async function createUser(role: Role, fields: Partial<{ name: string; email: string; passwordHash: string | null; disabledAt: Date | null; demonstration: boolean }> = {}): Promise<User> {
  testPasswordHash ??= hashPassword(testPassword);
  return User.create({ email: `${unique(role)}@test.example`, name: unique(role), role, passwordHash: await testPasswordHash, ...fields });
}

export async function createUnit(fields: Partial<{ name: string; kind: string; parentId: number | null }> = {}): Promise<Unit> {
  return Unit.create({ name: unique('unit'), ...fields });
}

export async function createPortfolio(fields: Partial<{ name: string; description: string; unitId: number | null; periodFrom: number | null; periodTo: number | null; createdById: number | null; deletedAt: Date | null }> = {}): Promise<Portfolio> {
  return Portfolio.create({ name: unique('portfolio'), ...fields });
}

export async function grant(portfolio: Portfolio, user: User, level: GrantLevel): Promise<void> {
  await PortfolioGrant.upsert({ portfolioId: portfolio.id, userId: user.id, level });
}

/** The Cookie header of a browser in which this person is signed in. */
export async function sessionCookie(user: User): Promise<string> {
  return `${sessionCookieName()}=${await makeSessionToken({ userId: user.id, sessionVersion: user.sessionVersion })}`;
}

/** The secret of a new token of this person. */
export async function bearerToken(user: User, fields: Partial<{ expiresAt: Date | null; revokedAt: Date | null }> = {}): Promise<string> {
  const secret = `hdl_${makeSecret()}`;
  await ApiToken.create({ userId: user.id, name: unique('token'), tokenHash: hashSecret(secret), hint: secret.slice(-4), ...fields });
  return secret;
}

interface RequestOptions {
  method?: string;
  /** Signed in through the browser as this person; unsafe methods come from the service's own pages unless `headers` say otherwise. */
  as?: User | null;
  token?: string;
  /** Sent as JSON. */
  json?: unknown;
  body?: BodyInit;
  headers?: Record<string, string>;
}

/** A request as a route handler gets it. */
export async function makeRequest(path: string, { method = 'GET', as = null, token, json, body, headers = {} }: RequestOptions = {}): Promise<NextRequest> {
  const base = environment().HEDDLE_URL;
  const all = new Headers({ host: new URL(base).host });
  if (as) all.set('cookie', await sessionCookie(as));
  if (as && method !== 'GET') all.set('origin', base);
  if (token !== undefined) all.set('authorization', `Bearer ${token}`);
  if (json !== undefined) all.set('content-type', 'application/json');
  for (const [name, value] of Object.entries(headers)) all.set(name, value);
  return new NextRequest(new URL(path, base), { method, headers: all, body: json === undefined ? body : JSON.stringify(json) });
}

type RouteHandler = (request: NextRequest, context: { params: Promise<Record<string, string | string[] | undefined>> }) => Promise<Response>;

export interface Answer {
  status: number;
  headers: Headers;
  /** The parsed JSON body, or null without one. */
  // A test looks into answers of every shape; each expectation names what it wants.
  // eslint-disable-next-line @typescript-eslint/no-explicit-any
  body: any;
}

/** Calls a route handler with the path's parameters, and reads its answer. */
export async function call(handler: RouteHandler, path: string, options: RequestOptions & { params?: Record<string, string> } = {}): Promise<Answer> {
  const { params = {}, ...rest } = options;
  const response = await handler(await makeRequest(path, rest), { params: Promise.resolve(params) });
  const text = await response.text();
  return { status: response.status, headers: response.headers, body: text === '' ? null : /json/.test(response.headers.get('content-type') ?? '') ? JSON.parse(text) : text };
}
