import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ServedSite, openBrowser, servedSite, watchedPage } from './site.ts';

let browser: Browser;
let site: ServedSite;
beforeAll(async () => { [browser, site] = await Promise.all([openBrowser(), servedSite('/bands/')]); });
afterAll(async () => { await browser?.close(); await site?.close(); });

test('typing Cr(NH3)6 finds the complex, counts it and writes the query into the address', async () => {
  const { page, trouble } = await watchedPage(browser, site);
  await page.goto(site.address);
  await page.getByRole('searchbox').fill('Cr(NH3)6');
  await expect.poll(() => page.getByRole('status').textContent()).toBe('1 complex found, 1 measurement.');
  expect(await page.locator('table.results tbody tr').count()).toBe(1);
  expect(new URL(page.url()).searchParams.get('q')).toBe('Cr(NH3)6');
  await page.locator('table.results tbody a').click();
  await page.waitForURL('**/complexes/cr-am6/#aq-295');
  await page.goBack();
  await expect.poll(() => page.getByRole('status').textContent()).toBe('1 complex found, 1 measurement.');
  expect(trouble).toEqual([]);
  await page.context().close();
});

test('an address with a query opens with its result, and clearing it brings the whole list back', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}?q=nickel`);
  await expect.poll(() => page.locator('table.results tbody tr').count()).toBe(2);
  await page.getByRole('searchbox').fill('');
  await expect.poll(() => page.getByRole('status').textContent()).toBe('8 complexes of 4 ions, 9 measurements.');
  expect(await page.locator('table.results tbody').count()).toBe(4);
  expect(new URL(page.url()).search).toBe('');
  await page.context().close();
});

test('nothing found says so in words and offers a way on', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}?q=${encodeURIComponent('<b>xyzzy</b>')}`);
  await expect.poll(() => page.getByRole('status').textContent()).toContain('Nothing found for “<b>xyzzy</b>”');
  expect(await page.locator('table.results').isVisible()).toBe(false);
  await page.context().close();
});

test('a list that cannot be loaded leaves the whole list standing and says so', async () => {
  const { page } = await watchedPage(browser, site);
  await page.route('**/search.json', (route) => route.abort());
  await page.goto(`${site.address}?q=nickel`);
  await expect.poll(() => page.getByRole('status').textContent()).toContain('could not be loaded');
  expect(await page.locator('table.results tbody a.formula').count()).toBe(9);
  await page.context().close();
});

test('without JavaScript every row, value, figure and download is there, and no dead search box', async () => {
  const { page, trouble } = await watchedPage(browser, site, { javaScriptEnabled: false });
  await page.goto(site.address);
  expect(await page.locator('table.results tbody a.formula').count()).toBe(9);
  expect(await page.locator('svg.strip[role=img]').count()).toBe(9);
  expect(await page.locator('#search').isVisible()).toBe(false);
  await page.goto(`${site.address}complexes/cr-am6/`);
  expect(await page.locator('svg.drawing[role=img]').count()).toBeGreaterThan(2);
  await page.goto(`${site.address}data/`);
  expect(await page.locator('a[download]').count()).toBe(3);
  expect(trouble).toEqual([]);
  await page.context().close();
});
