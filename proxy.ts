import { type NextRequest, NextResponse } from 'next/server';

import { environment } from '@/lib/environment';

/** lib/access/actor reads it too, and reaches the database, which this file must not. */
const pathHeader = 'x-heddle-path';

function contentSecurityPolicy(nonce: string): string {
  // React's development build evaluates strings to rebuild stack traces; the production build never does.
  const development = environment().NODE_ENV === 'development' ? " 'unsafe-eval'" : '';
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'self'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

/** Gives every page a content security policy with a nonce of its own; Next reads it from the request and marks its scripts with it. */
export function proxy(request: NextRequest): NextResponse {
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString('base64');
  const policy = contentSecurityPolicy(nonce);
  const headers = new Headers(request.headers);
  headers.set('x-nonce', nonce);
  headers.set('Content-Security-Policy', policy);
  headers.set(pathHeader, request.nextUrl.pathname + request.nextUrl.search);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('Content-Security-Policy', policy);
  return response;
}

export const config = {
  // API bodies (uploads of gigabytes) must not be buffered on their way through here; static files need no policy.
  matcher: ['/((?!api/|_next/static|_next/image|fonts/|icon|favicon.ico).*)'],
};
