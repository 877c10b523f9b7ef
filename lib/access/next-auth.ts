import { randomUUID } from 'node:crypto';

import NextAuth, { type NextAuthOptions } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { type NextRequest } from 'next/server';

import { localPath } from '@/lib/access/local-path';
import { actorOfClaims, cookiesAreSecure, sessionSeconds, type SessionClaims } from '@/lib/access/session';
import { authenticate } from '@/lib/access/sign-in';
import { problemResponse } from '@/lib/api/problem';
import { environment } from '@/lib/environment';
import { ExpectedError, tooLarge } from '@/lib/errors';
import { log } from '@/lib/log';

const bodyLimit = 16 * 1024;

function options(request: NextRequest, fail: (error: unknown) => void): NextAuthOptions {
  return {
    secret: environment().HEDDLE_SECRET,
    useSecureCookies: cookiesAreSecure(),
    session: { strategy: 'jwt', maxAge: sessionSeconds },
    pages: { signIn: '/sign-in', signOut: '/sign-in', error: '/sign-in' },
    providers: [
      CredentialsProvider({
        id: 'credentials',
        name: 'E-mail and password',
        credentials: { email: { label: 'E-mail', type: 'email' }, password: { label: 'Password', type: 'password' } },
        async authorize(credentials) {
          try {
            const claims = await authenticate(String(credentials?.email ?? ''), String(credentials?.password ?? ''), request.headers);
            return claims && { id: String(claims.userId), ...claims };
          } catch (error) {
            // next-auth would put the message of a thrown error into an address; it is answered below instead.
            fail(error);
            return null;
          }
        },
      }),
    ],
    callbacks: {
      async jwt({ token, user }) {
        if (user) {
          const { userId, sessionVersion } = user as unknown as SessionClaims;
          return { userId, sessionVersion };
        }
        // Asked for the session later on: the row decides, and nothing that the client sends along may change the claims.
        const { userId, sessionVersion } = token as unknown as SessionClaims;
        const actor = await actorOfClaims({ userId, sessionVersion });
        if (!actor) throw new Error('The session has ended.');
        return { userId, sessionVersion, name: actor.name, email: actor.email, role: actor.role };
      },
      session({ session, token }) {
        return { expires: session.expires, user: { id: String(token.userId), name: token.name, email: token.email, role: token.role } };
      },
      redirect({ url, baseUrl }) {
        const path = url.startsWith(`${baseUrl}/`) ? url.slice(baseUrl.length) : url;
        return baseUrl + localPath(path);
      },
    },
    logger: {
      error(code, metadata) {
        // An ended session is an ordinary event; everything else that next-auth calls an error is one.
        const detail = metadata instanceof Error ? metadata.message : 'error' in metadata && metadata.error instanceof Error ? metadata.error.message : undefined;
        if (code === 'JWT_SESSION_ERROR') log().debug({ code, detail }, 'session ended');
        else log().error({ code, detail }, 'next-auth');
      },
      warn: (code) => log().debug({ code }, 'next-auth'),
      debug: () => undefined,
    },
  };
}

/** Makes addresses of this service relative, so that whoever came under another of its names stays there. */
function keepHost(response: Response): Response {
  const location = response.headers.get('location');
  if (location !== null && URL.canParse(location)) {
    const address = new URL(location);
    if (address.origin === new URL(environment().HEDDLE_URL).origin) response.headers.set('location', `${address.pathname}${address.search}`);
  }
  return response;
}

/** next-auth's handler, with our limits on tries: 429 with Retry-After for scripts, a way back to the sign-in page for browsers. */
export async function handleNextAuth(request: NextRequest, context: { params: Promise<{ nextauth: string[] }> }): Promise<Response> {
  const requestId = randomUUID();
  if (Number(request.headers.get('content-length') ?? 0) > bodyLimit) return problemResponse(tooLarge('A sign-in fits into 16 kilobytes.'), requestId);
  const failure: { error?: unknown } = {};
  let response: Response;
  try {
    response = (await NextAuth(request as never, context as never, options(request, (error) => (failure.error = error)))) as Response;
  } catch (error) {
    failure.error = error;
    response = new Response(null);
  }
  if (failure.error === undefined) return keepHost(response);
  const expected = failure.error instanceof ExpectedError ? failure.error : null;
  if (!expected) log().error({ requestId, error: failure.error instanceof Error ? { message: failure.error.message, stack: failure.error.stack } : failure.error }, 'unexpected error at sign-in');
  if (expected?.status === 429 && request.headers.get('accept')?.includes('text/html')) {
    return new Response(null, { status: 303, headers: { Location: `/sign-in?error=too-many&wait=${expected.headers['Retry-After']}` } });
  }
  return problemResponse(failure.error, requestId);
}
