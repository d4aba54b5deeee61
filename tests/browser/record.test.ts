import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ServedSite, openBrowser, servedSite, watchedPage } from './site.ts';

let browser: Browser;
let site: ServedSite;
beforeAll(async () => { [browser, site] = await Promise.all([openBrowser(), servedSite('/bands/')]); });
afterAll(async () => { await browser?.close(); await site?.close(); });

test('the sentence goes to the clipboard as plain text, and the page says so', async () => {
  const { page, trouble } = await watchedPage(browser, site, { permissions: ['clipboard-read', 'clipboard-write'] });
  await page.goto(`${site.address}complexes/cr-am6/`);
  await page.getByRole('button', { name: 'Copy as plain text' }).click();
  await expect.poll(() => page.locator('blockquote .copy [aria-live]').textContent()).toBe('Copied.');
  expect(await page.evaluate(() => navigator.clipboard.readText())).toBe('The bands at 21 560 cm⁻¹ (4T2g) give Δ = 21 560(160) cm⁻¹ and B = 652(31) cm⁻¹.');
  expect(trouble).toEqual([]);
  await page.context().close();
});

test('without JavaScript the sentence stands and no dead button', async () => {
  const { page } = await watchedPage(browser, site, { javaScriptEnabled: false });
  await page.goto(`${site.address}complexes/cr-am6/`);
  expect(await page.locator('blockquote.sentence').textContent()).toContain('give Δ = 21');
  expect(await page.getByRole('button').count()).toBe(0);
  await page.context().close();
});

test('a caution leads to the records that carry it and back', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}complexes/cr-cl2-en2/`);
  await page.getByRole('link', { name: 'TWO_ELECTRON_BAND' }).click();
  expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe('TWO_ELECTRON_BAND');
  await page.locator('main table a').click();
  await page.waitForURL('**/complexes/cr-cl2-en2/#aq-295');
  await page.context().close();
});

test('the review is found from the foot of any page, and each line leads to its measurement', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}ligands/`);
  await page.getByRole('link', { name: 'Review' }).click();
  expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe('Review');
  await page.locator('main table a').first().click();
  await page.waitForURL('**/complexes/cr-cl2-en2/#aq-295');
  await page.context().close();
});

test('every bar, bracket and triangle of a complex page is drawn without style attributes and inside its figure', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}complexes/cr-am6/`);
  const outside = await page.evaluate(() => [...document.querySelectorAll('#aq-295-readings svg *, svg.residual *')].filter((element) => {
    const box = element.getBoundingClientRect();
    const frame = element.closest('svg')!.getBoundingClientRect();
    return box.width + box.height > 0 && (box.left < frame.left - 1 || box.right > frame.right + 1 || box.top < frame.top - 1 || box.bottom > frame.bottom + 1);
  }).map((element) => element.outerHTML.slice(0, 90)));
  expect(outside).toEqual([]);
  expect(await page.locator('svg.residual').count()).toBe(3);
  await page.context().close();
});
