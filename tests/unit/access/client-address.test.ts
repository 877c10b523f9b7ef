import { createServer, type IncomingHttpHeaders } from 'node:http';
import { type AddressInfo } from 'node:net';

import { expect, it, vi } from 'vitest';

vi.hoisted(() => Object.assign(process.env, { DATABASE_URL: 'mariadb://nobody@127.0.0.1:1/none', HEDDLE_SECRET: 'x'.repeat(32), HEDDLE_TRUST_PROXY: '0' }));

import { clientAddress, noteSocketAddresses } from '@/lib/access/client-address';

it('is the socket\'s own, whatever the client writes into its headers', async () => {
  noteSocketAddresses();
  let seen: IncomingHttpHeaders = {};
  const server = createServer((request, response) => {
    seen = request.headers;
    response.end();
  }).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  await fetch(`http://127.0.0.1:${(server.address() as AddressInfo).port}/`, { headers: { 'x-forwarded-for': '203.0.113.9', 'x-heddle-socket-address': '203.0.113.9' } });
  server.close();
  expect(clientAddress(new Headers(seen as Record<string, string>))).toBe('127.0.0.1');
});

it('is nothing rather than a claim where the socket is not known', () => {
  expect(clientAddress(new Headers({ 'x-forwarded-for': '203.0.113.9' }))).toBeNull();
  expect(clientAddress(new Headers({ 'x-heddle-socket-address': '::ffff:192.0.2.4' }))).toBe('192.0.2.4');
  expect(clientAddress(new Headers({ 'x-heddle-socket-address': '<script>' }))).toBeNull();
});
