import { decode, encode } from 'next-auth/jwt';

import { type Actor } from '@/lib/access/permissions';
import { environment } from '@/lib/environment';
import { User } from '@/models/user';

/** Seconds until a session ends by itself. */
export const sessionSeconds = 7 * 24 * 60 * 60;

/** What a session's token carries: who, and which of the person's session versions; raising the version ends all sessions made before. */
export interface SessionClaims {
  userId: number;
  sessionVersion: number;
}

export function cookiesAreSecure(): boolean {
  return environment().HEDDLE_URL.startsWith('https:');
}

/** The name that next-auth gives its cookie; its handler and our own pages make the same sessions. */
export function sessionCookieName(): string {
  return `${cookiesAreSecure() ? '__Secure-' : ''}next-auth.session-token`;
}

export function sessionCookieOptions() {
  return { httpOnly: true, sameSite: 'lax' as const, path: '/', secure: cookiesAreSecure() };
}

/** The signed and encrypted cookie value of a new session. */
export async function makeSessionToken(claims: SessionClaims): Promise<string> {
  return encode({ token: { ...claims }, secret: environment().HEDDLE_SECRET, maxAge: sessionSeconds });
}

/** The claims of a cookie value, or null when it is not ours, was changed or has expired. */
export async function readSessionToken(value: string): Promise<SessionClaims | null> {
  let claims: Awaited<ReturnType<typeof decode>>;
  try {
    claims = await decode({ token: value, secret: environment().HEDDLE_SECRET });
  } catch {
    // Anybody may send any cookie: one that does not decrypt means "not signed in", not an error.
    return null;
  }
  if (typeof claims?.userId !== 'number' || typeof claims.sessionVersion !== 'number') return null;
  return { userId: claims.userId, sessionVersion: claims.sessionVersion };
}

/** The person behind a session as the users table has them now: null once disabled, or once the session's version has passed. */
export async function actorOfClaims(claims: SessionClaims): Promise<Actor | null> {
  const user = await User.findByPk(claims.userId, { attributes: ['id', 'name', 'email', 'role', 'sessionVersion', 'disabledAt'] });
  if (!user || user.disabledAt || user.sessionVersion !== claims.sessionVersion) return null;
  return { userId: user.id, name: user.name, email: user.email, role: user.role, via: 'session' };
}

/** The person behind a session cookie, or null. */
export async function actorOfSession(value: string): Promise<Actor | null> {
  const claims = await readSessionToken(value);
  return claims && actorOfClaims(claims);
}
