import { AxeBuilder } from '@axe-core/playwright';
import { type Browser, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { launch, serviceUrl, signIn, watchFaults } from '@/tests/e2e/service';
import { type Role } from '@/lib/access/permissions';

let browser: Browser;
beforeAll(async () => {
  browser = await launch();
});
afterAll(() => browser.close());

const views = [390, 1440].flatMap((width) => (['light', 'dark'] as const).map((scheme) => ({ width, scheme })));

/** axe's findings on a page, in few words each. */
async function findings(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']).analyze();
  return violations.map((violation) => `${violation.id}: ${violation.nodes.map((node) => node.target.join(' ')).slice(0, 3).join(' | ')}`);
}

async function settle(page: Page): Promise<void> {
  await page.locator('h1').first().waitFor({ timeout: 60_000 });
  await page.waitForLoadState('networkidle');
}

/** Nothing sticks out to the side, so nobody scrolls in two directions. */
const overflow = (page: Page) => page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);

/** Addresses of the demonstration that each role may open. */
async function addresses(page: Page, role: Role): Promise<string[]> {
  const json = async <Answer>(path: string) => (await (await page.request.get(`${serviceUrl}${path}`)).json()) as Answer;
  const portfolios = await json<{ items: { id: string; name: string }[] }>('/api/portfolios');
  const portfolio = portfolios.items.find((item) => /Faculty|Freshwater/.test(item.name)) ?? portfolios.items[0];
  const base = `/portfolios/${portfolio.id}`;
  const analyses = await json<{ items: { id: string }[] }>(`/api${base}/analyses`);
  const imports = await json<{ items: { id: string; counts: { review: number } }[] }>(`/api${base}/imports`);
  const works = await json<{ items: { id: string }[] }>(`/api${base}/works?sort=-citationsHere`);
  const reviewed = imports.items.find((item) => item.counts.review > 0) ?? imports.items[0];
  const shared = ['/portfolios', base, `${base}/imports`, `${base}/imports/${reviewed.id}`, `${base}/works`, `/works/${works.items[0].id}`, `${base}/rankings`, `${base}/clusters`, `${base}/map`, `${base}/analyses`, `${base}/analyses/${analyses.items[0].id}`, '/methods', '/account'];
  if (role === 'librarian') return [...shared, `${base}/imports/matches`, `${base}/rankings?evidence=inDegree:${works.items[0].id}`];
  if (role === 'evaluator') return [`${base}/analyses/new`, `${base}/rankings?sort=-inDegree`, `${base}/map?view=table`];
  return ['/admin', '/admin/units', '/admin/mail', '/admin/audit'];
}

describe.each(views)('pages at $width px, $scheme', ({ width, scheme }) => {
  it.each(['librarian', 'evaluator', 'administrator'] as const)('of the %s have no finding of axe, no fault and nothing that sticks out', async (role) => {
    const context = await browser.newContext({ viewport: { width, height: 900 }, colorScheme: scheme, reducedMotion: 'reduce' });
    const page = await signIn(context, role);
    const faults = watchFaults(page);
    const found: Record<string, string[]> = {};
    for (const address of await addresses(page, role)) {
      const answer = await page.goto(`${serviceUrl}${address}`);
      expect({ address, status: answer?.status() }).toEqual({ address, status: 200 });
      await settle(page);
      const wrong = [...(await findings(page)), ...faults.splice(0)];
      const out = await overflow(page);
      if (out > 0) wrong.push(`sticks out by ${out} px`);
      if (wrong.length > 0) found[address] = wrong;
    }
    expect(found).toEqual({});
    await context.close();
  });

  it('without an account have no finding either', async () => {
    const context = await browser.newContext({ viewport: { width, height: 900 }, colorScheme: scheme, reducedMotion: 'reduce' });
    const page = await context.newPage();
    const found: Record<string, string[]> = {};
    for (const address of ['/sign-in', '/forgot-password', '/reset-password/none', '/invitation/none']) {
      await page.goto(`${serviceUrl}${address}`);
      await settle(page);
      const wrong = await findings(page);
      if (wrong.length > 0) found[address] = wrong;
    }
    expect(found).toEqual({});
    await context.close();
  });
});
