import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { builtPages, openBrowser, servedSample, watchedPage } from './site.ts';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(async () => { await browser?.close(); });

test('hostile text in every field is shown as text and runs nothing', async () => {
  const hostile = '"><img src=x onerror=alert(1)><script>alert(2)</script>';
  const site = await servedSample('/', { hostile });
  try {
    const { page, trouble } = await watchedPage(browser, site);
    for (const { path } of builtPages(site)) await page.goto(site.address + path);
    await page.goto(site.address);
    expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe(hostile);
    await page.getByRole('searchbox').fill('Cr');
    await expect.poll(() => page.getByRole('status').textContent()).toContain('found');
    expect(await page.locator('img[src="x"]').count()).toBe(0);
    expect(trouble).toEqual([]);
    await page.context().close();
  } finally {
    await site.close();
  }
});

test('a collection without records is a friendly site with the next step', async () => {
  const site = await servedSample('/bands/', { complexes: false });
  try {
    const { page, trouble } = await watchedPage(browser, site);
    for (const { path } of builtPages(site)) await page.goto(site.address + path);
    await page.goto(site.address);
    expect(await page.locator('main').textContent()).toContain('The collection holds no records yet.');
    expect(await page.locator('main').textContent()).toContain('npm run check');
    expect(trouble).toEqual([]);
    await page.context().close();
  } finally {
    await site.close();
  }
});
