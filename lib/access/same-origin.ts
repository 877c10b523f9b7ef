import { type NextRequest } from 'next/server';

import { environment } from '@/lib/environment';
import { forbidden } from '@/lib/errors';

function originOf(address: string | null): string | null {
  return address !== null && URL.canParse(address) ? new URL(address).origin : null;
}

/**
 * Refuses an unsafe request that carries a cookie and comes from a page of another site. Decided by the Origin header; where a browser
 * sends none, by Sec-Fetch-Site, then by Referer. With none of the three it is refused too: scripts use tokens.
 */
export function assertSameOrigin(request: NextRequest): void {
  const host = request.headers.get('host');
  const own = new Set([originOf(environment().HEDDLE_URL), host === null ? null : originOf(`${request.nextUrl.protocol}//${host}`)]);
  own.delete(null);
  const origin = request.headers.get('origin');
  if (origin !== null) {
    // "null", the origin of sandboxed pages, parses as no address and is refused.
    const sent = originOf(origin);
    if (sent !== null && own.has(sent)) return;
  } else if (request.headers.get('sec-fetch-site') !== null) {
    if (request.headers.get('sec-fetch-site') === 'same-origin') return;
  } else {
    const referer = originOf(request.headers.get('referer'));
    if (referer !== null && own.has(referer)) return;
  }
  throw forbidden('This request came from another site, so nothing was done. Scripts send a token instead of a cookie.');
}
