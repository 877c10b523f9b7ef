import { randomUUID } from 'node:crypto';

import { type NextApiRequest, type NextApiResponse } from 'next';
import NextAuth, { type NextAuthOptions } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { type NextRequest } from 'next/server';

import { localPath } from '@/lib/access/local-path';
import { actorOfClaims, cookiesAreSecure, sessionSeconds, type SessionClaims } from '@/lib/access/session';
import { authenticate } from '@/lib/access/sign-in';
import { problemResponse } from '@/lib/api/problem';
import { environment } from '@/lib/environment';
import { ExpectedError, invalid, tooLarge } from '@/lib/errors';
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

/** The body's fields as next-auth wants them: from a form, or from JSON. */
async function readFields(request: NextRequest): Promise<Record<string, unknown>> {
  if (request.method !== 'POST') return {};
  const text = await request.text();
  if (text.length > bodyLimit) throw tooLarge('A sign-in fits into 16 kilobytes.');
  if (!/json/i.test(request.headers.get('content-type') ?? '')) return Object.fromEntries(new URLSearchParams(text));
  try {
    const fields: unknown = text === '' ? {} : JSON.parse(text);
    return typeof fields === 'object' && fields !== null ? (fields as Record<string, unknown>) : {};
  } catch {
    throw invalid('The body is not valid JSON.');
  }
}

/** Collects what next-auth writes, in the manner of an older kind of route, into a Response. */
class CollectedResponse {
  private code = 200;
  private body: string | null = null;
  private readonly kept = new Map<string, string | string[]>();

  status(code: number) {
    this.code = code;
    return this;
  }

  getHeader(name: string) {
    return this.kept.get(name);
  }

  setHeader(name: string, value: string | string[]) {
    // Addresses of this service become relative, so that whoever came under another of its names stays there.
    const own = new URL(environment().HEDDLE_URL).origin;
    if (name === 'Location' && typeof value === 'string' && value.startsWith(`${own}/`)) value = value.slice(own.length);
    this.kept.set(name, value);
    return this;
  }

  json(value: unknown) {
    this.setHeader('Content-Type', 'application/json');
    this.body = JSON.stringify(value);
  }

  send(value: unknown) {
    if (typeof value === 'string') this.body = value;
    else if (value !== undefined && value !== null) this.json(value);
  }

  end() {
    this.body = null;
  }

  toResponse(): Response {
    const headers = new Headers({ 'Cache-Control': 'no-store' });
    for (const [name, value] of this.kept) for (const one of [value].flat()) headers.append(name, one);
    return new Response(this.body, { status: this.code, headers });
  }
}

/**
 * next-auth's handler, with our limits on tries: 429 with Retry-After for scripts, a way back to the sign-in page for browsers.
 * It is given the request by hand rather than left to take it from the framework's scope, so that bodies are bounded before they
 * are read and tests call it like any other route.
 */
export async function handleNextAuth(request: NextRequest, context: { params: Promise<{ nextauth?: string[] }> }): Promise<Response> {
  const requestId = randomUUID();
  try {
    if (Number(request.headers.get('content-length') ?? 0) > bodyLimit) throw tooLarge('A sign-in fits into 16 kilobytes.');
    const { nextauth } = await context.params;
    const response = new CollectedResponse();
    const failure: { error?: unknown } = {};
    const incoming = {
      method: request.method,
      headers: Object.fromEntries(request.headers),
      cookies: Object.fromEntries(request.cookies.getAll().map(({ name, value }) => [name, value])),
      query: { ...Object.fromEntries(request.nextUrl.searchParams), nextauth },
      body: await readFields(request),
    };
    await NextAuth(incoming as unknown as NextApiRequest, response as unknown as NextApiResponse, options(request, (error) => (failure.error = error)));
    if (failure.error !== undefined) throw failure.error;
    return response.toResponse();
  } catch (error) {
    const expected = error instanceof ExpectedError ? error : null;
    if (!expected) log().error({ requestId, error: error instanceof Error ? { message: error.message, stack: error.stack } : error }, 'unexpected error at sign-in');
    if (expected?.status === 429 && request.headers.get('accept')?.includes('text/html')) {
      return new Response(null, { status: 303, headers: { Location: `/sign-in?error=too-many&wait=${expected.headers['Retry-After']}` } });
    }
    return problemResponse(error, requestId);
  }
}
