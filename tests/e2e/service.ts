import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

import { type Role } from '@/lib/access/permissions';

/** The running service that scripts/test.mjs started, seeded with the demonstration. */
export const serviceUrl = process.env.HEDDLE_E2E_URL ?? '';
if (!/^http:\/\/(127\.0\.0\.1|localhost)[:/]/.test(serviceUrl)) throw new Error('HEDDLE_E2E_URL must name the test service on this machine; run `npm test -- e2e`.');

export const password = 'linen-and-indigo';
const accountNames: Record<Role, string> = { administrator: 'admin', librarian: 'librarian', evaluator: 'evaluator', author: 'author', reader: 'reader' };
export const emailOf = (role: Role): string => `${accountNames[role]}@tarnholm.example`;

export function launch(): Promise<Browser> {
  return chromium.launch({
    executablePath: process.env.HEDDLE_CHROMIUM ?? '/usr/bin/chromium',
    // WebGL in software: the machine that runs the tests need not have a graphics card. Pages themselves are painted without it, much faster.
    args: ['--no-sandbox', '--use-angle=swiftshader', '--enable-unsafe-swiftshader', '--disable-gpu-compositing', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'],
  });
}

export async function signIn(context: BrowserContext, role: Role): Promise<Page> {
  const page = await context.newPage();
  page.setDefaultTimeout(30_000);
  await page.goto(`${serviceUrl}/sign-in`);
  await page.getByLabel('E-mail').fill(emailOf(role));
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL('**/portfolios');
  return page;
}

/** Faults that the browser reports while a page is used: exceptions, refused resources, violations of the content policy. */
export function watchFaults(page: Page): string[] {
  const faults: string[] = [];
  page.on('pageerror', (error) => faults.push(`exception: ${error.message}`));
  page.on('console', (message) => {
    if (message.type() === 'error' && !/status of (?:401|403|404|409|422)/.test(message.text())) faults.push(message.text());
  });
  return faults;
}

/** A session for scripts: next-auth's own credentials callback, as any HTTP client can call it. */
export async function signInByHttp(role: Role): Promise<string> {
  const jar = new Map<string, string>();
  const keep = (response: Response) => {
    for (const cookie of response.headers.getSetCookie()) {
      const [pair] = cookie.split(';');
      jar.set(pair.slice(0, pair.indexOf('=')), pair.slice(pair.indexOf('=') + 1));
    }
  };
  const cookies = () => [...jar].map(([name, value]) => `${name}=${value}`).join('; ');
  const first = await fetch(`${serviceUrl}/api/auth/csrf`);
  keep(first);
  const { csrfToken } = (await first.json()) as { csrfToken: string };
  const answer = await fetch(`${serviceUrl}/api/auth/callback/credentials`, {
    method: 'POST',
    redirect: 'manual',
    headers: { 'Content-Type': 'application/x-www-form-urlencoded', Cookie: cookies(), Origin: serviceUrl },
    body: new URLSearchParams({ csrfToken, email: emailOf(role), password, callbackUrl: serviceUrl, json: 'true' }),
  });
  keep(answer);
  return cookies();
}

/** A token as a person makes one on the account page. */
export async function makeToken(role: Role, name: string): Promise<string> {
  const answer = await fetch(`${serviceUrl}/api/tokens`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', Cookie: await signInByHttp(role), Origin: serviceUrl },
    body: JSON.stringify({ name }),
  });
  if (!answer.ok) throw new Error(`No token: ${answer.status} ${await answer.text()}`);
  const made = (await answer.json()) as { secret?: string; token?: string };
  return (made.secret ?? made.token) as string;
}
