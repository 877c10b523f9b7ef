import { expect, it, vi } from 'vitest';

vi.hoisted(() => Object.assign(process.env, { DATABASE_URL: 'mariadb://nobody@127.0.0.1:1/none', HEDDLE_SECRET: 'x'.repeat(32) }));

import { NextRequest } from 'next/server';

import { config, proxy } from '@/proxy';

const policyOf = (headers: Headers) => Object.fromEntries(headers.get('content-security-policy')!.split('; ').map((part) => [part.split(' ')[0], part.split(' ').slice(1)]));

it('gives every page a policy with a nonce of its own that runs no other script', () => {
  const nonces = new Set<string>();
  for (let index = 0; index < 20; index += 1) {
    const response = proxy(new NextRequest('http://localhost:3000/portfolios?x=1'));
    const policy = policyOf(response.headers);
    const nonce = policy['script-src'].find((source) => source.startsWith("'nonce-"))!;
    expect(nonce).toMatch(/^'nonce-[\w+/]{22}=='$/);
    nonces.add(nonce);
    expect(policy['script-src']).not.toContain("'unsafe-inline'");
    expect(policy['script-src']).not.toContain("'unsafe-eval'");
    expect(policy).toMatchObject({ 'default-src': ["'self'"], 'object-src': ["'none'"], 'frame-ancestors': ["'none'"], 'base-uri': ["'self'"], 'form-action': ["'self'"] });
    expect(response.headers.get('x-middleware-request-x-nonce')).toBe(nonce.slice(7, -1));
  }
  expect(nonces.size).toBe(20);
});

it('tells pages where they are, for the way back after signing in, whatever the client claims', () => {
  const response = proxy(new NextRequest('http://localhost:3000/account?x=1', { headers: { 'x-heddle-path': '/elsewhere', 'x-nonce': 'mine' } }));
  expect(response.headers.get('x-middleware-request-x-heddle-path')).toBe('/account?x=1');
  expect(response.headers.get('x-middleware-request-x-nonce')).not.toBe('mine');
});

it('stays out of the way of uploads and static files', () => {
  const covers = (path: string) => config.matcher.some((matcher) => new RegExp(`^${matcher}$`).test(path));
  for (const path of ['/', '/sign-in', '/portfolios/7/map', '/apiary', '/account']) expect(covers(path), path).toBe(true);
  for (const path of ['/api/portfolios/7/imports', '/_next/static/chunks/a.js', '/fonts/a.woff2', '/icon.svg']) expect(covers(path), path).toBe(false);
});
