import { AxeBuilder } from '@axe-core/playwright';
import { type Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, it } from 'vitest';

import { launch, serviceUrl, signIn, watchFaults } from '@/tests/e2e/service';

let browser: Browser;
beforeAll(async () => {
  browser = await launch();
});
afterAll(() => browser.close());

it.each([390, 1440])('a table whose columns are taken wrongly is put right by a person, at %i px', async (width) => {
  const context = await browser.newContext({ viewport: { width, height: 900 }, reducedMotion: 'reduce' });
  const page = await signIn(context, 'librarian');
  const faults = watchFaults(page);
  const stamp = `${width}${Date.now().toString(36)}`;
  const made = await page.request.post(`${serviceUrl}/api/portfolios`, { data: { name: `Tables ${stamp}` }, headers: { origin: serviceUrl } });
  const { id } = (await made.json()) as { id: string };
  await page.goto(`${serviceUrl}/portfolios/${id}/imports`);
  const buffer = Buffer.from(`Title;Who wrote it ${stamp};Year;Shelf\nReed beds of the ${stamp} shore;Brennan, Tove | Achterberg, Mats;2001;B 12\n`);
  await page.getByLabel('Files to import').setInputFiles([{ name: `${stamp}.csv`, mimeType: 'text/csv', buffer }]);
  await page.getByRole('link', { name: `${stamp}.csv` }).first().click();
  await page.getByText('nothing is catalogued until you accept').waitFor();
  expect(await page.getByText('Brennan').count()).toBe(0);

  await page.getByRole('button', { name: 'Columns' }).click();
  const dialog = page.getByRole('dialog', { name: 'What the columns hold' });
  const column = dialog.getByLabel(`Who wrote it ${stamp}`);
  await column.waitFor();
  await dialog.getByText('Brennan, Tove | Achterberg, Mats').waitFor();
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map((violation) => `${violation.id}: ${violation.nodes.map((node) => node.target.join(' ')).join(' | ')}`)).toEqual([]);
  await column.selectOption({ label: 'authors' });
  await dialog.getByRole('button', { name: 'Read with these columns' }).click();
  await dialog.waitFor({ state: 'detached' });
  await page.getByText('Brennan').first().waitFor();
  expect(faults).toEqual([]);
  await context.close();
});
