import { subscribe } from 'node:diagnostics_channel';
import { type IncomingMessage } from 'node:http';

import { environment } from '@/lib/environment';

const socketHeader = 'x-heddle-socket-address';
const holder = globalThis as unknown as { heddleSocketAddresses?: true };

/**
 * Notes the socket's own address on every request that the server gets, over anything that the client sent under that name.
 * Next hands no socket to route handlers, and leaves X-Forwarded-For as it came, which anybody can write. Called once, at the server's start.
 */
export function noteSocketAddresses(): void {
  if (holder.heddleSocketAddresses) return;
  holder.heddleSocketAddresses = true;
  subscribe('http.server.request.start', (message) => {
    const { request } = message as { request: IncomingMessage };
    request.headers[socketHeader] = request.socket.remoteAddress ?? '';
  });
}

/** The client's address for limits and the audit log: the last entry of X-Forwarded-For behind a trusted proxy, else the socket's. Null where neither is known. */
export function clientAddress(headers: Headers): string | null {
  const forwarded = environment().HEDDLE_TRUST_PROXY === '1' ? headers.get('x-forwarded-for')?.split(',').at(-1) : undefined;
  const address = (forwarded ?? headers.get(socketHeader) ?? '').trim().replace(/^::ffff:(?=\d+\.)/, '');
  return /^[0-9a-fA-F.:%\w]{2,60}$/.test(address) ? address : null;
}
