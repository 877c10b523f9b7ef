import { cookies } from 'next/headers';

import { makeSessionToken, sessionCookieName, sessionCookieOptions, sessionSeconds, type SessionClaims } from '@/lib/access/session';

/** Signs the browser in; for server actions. The cookie is the one that next-auth's own handler would set. */
export async function startSession(claims: SessionClaims): Promise<void> {
  (await cookies()).set(sessionCookieName(), await makeSessionToken(claims), { ...sessionCookieOptions(), maxAge: sessionSeconds });
}

/** Signs the browser out; for server actions. */
export async function endSession(): Promise<void> {
  (await cookies()).set(sessionCookieName(), '', { ...sessionCookieOptions(), maxAge: 0 });
}
