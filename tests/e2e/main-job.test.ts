import { type Browser, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { makeFiles, type MadeFile } from '@/tests/e2e/files';
import { emailOf, launch, serviceUrl, signIn, watchFaults } from '@/tests/e2e/service';

let browser: Browser;
beforeAll(async () => {
  browser = await launch();
});
afterAll(() => browser.close());

/** Lets files fall on the page as a hand would: the browser makes them and fires the events of dragging. */
async function dropFiles(page: Page, files: readonly MadeFile[]): Promise<void> {
  const transfer = await page.evaluateHandle((made) => {
    const carried = new DataTransfer();
    for (const { name, mimeType, text } of made) carried.items.add(new File([text], name, { type: mimeType }));
    return carried;
  }, files.map(({ name, mimeType, buffer }) => ({ name, mimeType, text: buffer.toString('utf8') })));
  const zone = page.locator('div', { has: page.getByLabel('Files to import') }).last();
  for (const type of ['dragenter', 'dragover']) await zone.dispatchEvent(type, { dataTransfer: transfer });
  await page.getByText('Let go to upload').waitFor();
  await zone.dispatchEvent('drop', { dataTransfer: transfer });
}

describe('the main job in a browser', () => {
  it('goes from dropped files to ranking, work and map, with two people', async () => {
    const stamp = `web${Date.now().toString(36)}`;
    const name = `Lowland waters ${stamp}`;
    const librarianContext = await browser.newContext({ viewport: { width: 1440, height: 900 } });
    const page = await signIn(librarianContext, 'librarian');
    const faults = watchFaults(page);

    // A portfolio, given to the evaluator at once.
    await page.getByRole('button', { name: 'New portfolio' }).click();
    await page.getByLabel('Name', { exact: true }).fill(name);
    await page.getByLabel('Find somebody by name or e-mail').fill(emailOf('evaluator'));
    await page.getByRole('list', { name: 'People found' }).getByRole('button').first().click();
    await page.getByRole('button', { name: 'Make portfolio' }).click();
    await page.getByRole('heading', { level: 1, name }).waitFor();
    const portfolioUrl = page.url().split('?')[0];

    // Files in four formats; reading goes on while the page is loaded anew.
    await page.goto(`${portfolioUrl}/imports`);
    const files = makeFiles(stamp);
    await dropFiles(page, files.slice(0, 2));
    for (const file of files.slice(0, 2)) await page.getByRole('link', { name: file.name }).first().waitFor();
    await page.getByLabel('Files to import').setInputFiles(files.slice(2));
    for (const file of files) await page.getByRole('link', { name: file.name }).first().waitFor();
    await page.reload();
    for (const file of files) {
      await page.goto(`${portfolioUrl}/imports`);
      await page.getByRole('link', { name: file.name }).first().click();
      await page.getByRole('heading', { level: 1, name: file.name }).waitFor();
      // The summary stands before anything is catalogued.
      await page.getByText('nothing is catalogued until you accept').waitFor();
      await page.getByRole('button', { name: /^Accept \d+ now$/ }).click();
      await page.getByRole('button', { name: 'Undo import' }).waitFor({ timeout: 60_000 });
    }
    // The last one is undone again; it can be accepted once more.
    await page.getByRole('button', { name: 'Undo import' }).click();
    await page.getByRole('button', { name: /^Accept \d+ now$/ }).waitFor({ timeout: 60_000 });
    await page.goto(`${portfolioUrl}/works`);
    await page.getByRole('row').nth(5).waitFor();
    await librarianContext.close();

    // The evaluator runs an analysis and reads it.
    const evaluatorContext = await browser.newContext({ viewport: { width: 1440, height: 900 } });
    const evaluator = await signIn(evaluatorContext, 'evaluator');
    faults.push(...watchFaults(evaluator));
    await evaluator.goto(`${portfolioUrl}/analyses/new`);
    await evaluator.getByLabel('Least citations of a cited-only work').fill('2');
    await evaluator.getByLabel('Resamples for rank intervals').fill('50');
    await evaluator.getByRole('button', { name: 'Start the analysis' }).click();
    await evaluator.locator('a[href*="rankings?analysis="]').first().waitFor({ timeout: 90_000 });
    await evaluator.goto(`${portfolioUrl}/rankings`);
    await evaluator.getByRole('heading', { level: 1 }).waitFor();
    const rows = evaluator.locator('tbody tr');
    await rows.nth(3).waitFor();
    const sorter = evaluator.getByRole('columnheader', { name: /Citations here/ });
    await sorter.getByRole('button').or(sorter.getByRole('link')).first().click();
    await evaluator.waitForURL(/sort=-?inDegree/);
    // A figure opens its evidence: file and line of the references behind it.
    await evaluator.getByRole('link', { name: /^Citations here: \d+\. Open the evidence/ }).first().click();
    await evaluator.getByText(new RegExp(`${stamp}\\.txt`)).first().waitFor();

    await evaluator.getByRole('link', { name: new RegExp(`in the ${stamp} basin`) }).first().click();
    await evaluator.waitForURL(/\/works\/\d+/);
    await evaluator.getByRole('heading', { level: 1, name: new RegExp(stamp) }).waitFor();

    await evaluator.goto(`${portfolioUrl}/map?basis=citation`);
    await evaluator.locator('canvas').first().waitFor({ timeout: 60_000 });
    await evaluator.getByRole('heading', { name: 'Map of works' }).waitFor();
    expect(faults).toEqual([]);
    await evaluatorContext.close();
  });

  it('shows a reader what was given and nothing to change it with', async () => {
    const context = await browser.newContext();
    const page = await signIn(context, 'reader');
    await page.getByRole('link', { name: /Faculty of Water and Land/ }).first().click();
    await page.getByRole('heading', { level: 1, name: /Faculty of Water and Land/ }).waitFor();
    const portfolioUrl = page.url().split('?')[0];
    await page.goto(`${portfolioUrl}/imports`);
    await page.getByRole('heading', { level: 1 }).waitFor();
    expect(await page.getByRole('button', { name: 'Choose files' }).count()).toBe(0);
    const other = await page.goto(`${serviceUrl}/admin`);
    expect(other?.status()).toBe(404);
    await context.close();
  });
});
