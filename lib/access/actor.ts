import { cookies, headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import { type NextRequest } from 'next/server';
import { cache } from 'react';

import { localPath } from '@/lib/access/local-path';
import { roleMay, type Action, type Actor } from '@/lib/access/permissions';
import { actorOfSession, sessionCookieName } from '@/lib/access/session';
import { actorOfToken } from '@/lib/access/tokens';
import { forbidden } from '@/lib/errors';

/** Header in which proxy.ts notes the path of a page, for the way back after signing in. */
export const pathHeader = 'x-heddle-path';

/**
 * Who sends this request: the owner of its bearer token, or else of its session cookie. Null for nobody.
 * A request with an Authorization header is judged by that header alone, so that a wrong token never falls back on a cookie.
 */
export async function actorFromRequest(request: NextRequest): Promise<Actor | null> {
  const authorization = request.headers.get('authorization');
  if (authorization !== null) {
    const secret = /^Bearer +(\S+) *$/i.exec(authorization)?.[1];
    return secret ? actorOfToken(secret) : null;
  }
  const value = request.cookies.get(sessionCookieName())?.value;
  return value ? actorOfSession(value) : null;
}

/** The signed-in person of a page or an action, or null. Looked up once in each request, never kept longer. */
export const optionalActor = cache(async (): Promise<Actor | null> => {
  const value = (await cookies()).get(sessionCookieName())?.value;
  return value ? actorOfSession(value) : null;
});

/** The signed-in person of a page; sends everybody else to /sign-in and back to this page afterwards. */
export async function actorForPage(): Promise<Actor> {
  const actor = await optionalActor();
  if (actor) return actor;
  const here = localPath((await headers()).get(pathHeader));
  redirect(`/sign-in?next=${encodeURIComponent(here)}`);
}

/** The signed-in person of a page that only some roles have; for the others it does not exist. */
export async function actorForPageOf(action: Action): Promise<Actor> {
  const actor = await actorForPage();
  if (!roleMay(actor.role, action)) notFound();
  return actor;
}

/** Stops with 403 when the person's role does not allow the action at all. Grants on a portfolio are checked where the row is loaded. */
export function requireRole(actor: Actor, action: Action): void {
  if (!roleMay(actor.role, action)) throw forbidden('Your role does not allow this.');
}
