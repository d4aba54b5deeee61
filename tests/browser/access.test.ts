import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { violationsEverywhere, violationsOf } from './axe.ts';
import { shiftsOf, watchShifts } from './shifts.ts';
import { PAGE_KINDS, type ServedSite, openBrowser, servedSite, watchedPage } from './site.ts';

let browser: Browser;
let site: ServedSite;
beforeAll(async () => { [browser, site] = await Promise.all([openBrowser(), servedSite('/bands/')]); });
afterAll(async () => { await browser?.close(); await site?.close(); });

test('axe finds nothing on any kind of page, by day, by night and at 320 pixels', async () => {
  const { page } = await watchedPage(browser, site);
  const found: string[] = [];
  for (const path of PAGE_KINDS) {
    await page.goto(site.address + path);
    found.push(...(await violationsEverywhere(page)).map((one) => `${path} ${one}`));
  }
  expect(found).toEqual([]);
  await page.context().close();
});

test('the check by axe can fail', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(site.address);
  await page.evaluate(() => { document.querySelector('main')!.append(document.createElement('img')); });
  expect((await violationsOf(page)).join()).toContain('image-alt: <img>');
  await page.context().close();
});

test('what axe misses: every drawing has a role, a name and, where large, a description; every table head a scope', async () => {
  const { page } = await watchedPage(browser, site);
  for (const path of PAGE_KINDS) {
    await page.goto(site.address + path);
    const faults = await page.evaluate(() => [
      ...[...document.querySelectorAll('svg:not([aria-hidden])')].filter((svg) => svg.getAttribute('role') !== 'img' || !document.getElementById(svg.getAttribute('aria-labelledby') ?? '')?.textContent).map((svg) => `svg without a name: ${svg.outerHTML.slice(0, 100)}`),
      ...[...document.querySelectorAll('svg.drawing:not([aria-hidden])')].filter((svg) => !document.getElementById(svg.getAttribute('aria-describedby') ?? '')?.textContent).map((svg) => `drawing without a description: ${svg.outerHTML.slice(0, 100)}`),
      ...[...document.querySelectorAll('th')].filter((head) => !head.hasAttribute('scope')).map((head) => `th without scope: ${head.outerHTML.slice(0, 100)}`),
      ...[...document.querySelectorAll('table')].filter((table) => !table.querySelector('th')).map(() => 'table without a head'),
      ...[...document.querySelectorAll('figure')].filter((figure) => !figure.querySelector('figcaption')?.textContent?.trim()).map(() => 'figure without a caption'),
    ]);
    expect(faults, path).toEqual([]);
  }
  await page.context().close();
});

test('at 320 pixels no page scrolls sideways and nothing moves when scripts come; wide tables and figures scroll within themselves', async () => {
  const { page } = await watchedPage(browser, site, { viewport: { width: 320, height: 640 } });
  await watchShifts(page);
  for (const path of PAGE_KINDS) {
    await page.goto(site.address + path);
    expect(await page.evaluate(() => document.documentElement.scrollWidth), path).toBeLessThanOrEqual(320);
    expect(await shiftsOf(page), path).toEqual([]);
  }
  await page.context().close();
});

test('by keyboard the first stop is the way past the head, it is seen, and it leads to the content', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}ions/cr-iii/`);
  await page.keyboard.press('Tab');
  const skip = page.locator('a.skip');
  expect(await skip.evaluate((element) => element === document.activeElement)).toBe(true);
  expect((await skip.boundingBox())!.x).toBeGreaterThanOrEqual(0);
  await page.keyboard.press('Enter');
  expect(await page.evaluate(() => document.activeElement?.id)).toBe('content');
  await page.context().close();
});

test('formulas are said in words where the eye sees figures', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}complexes/cr-am6/`);
  expect(await page.getByRole('heading', { level: 1 }).ariaSnapshot()).toContain('Cr, N H 3 six times, charge three plus');
  await page.context().close();
});

test('a complex with one measurement prints on two pages at most', async () => {
  const { page } = await watchedPage(browser, site);
  for (const id of ['cr-am6', 'cr-cl2-en2', 'ti-aq6', 'co-cl4', 'ni-am6']) {
    await page.goto(`${site.address}complexes/${id}/`);
    const printed = (await page.pdf({ format: 'A4', preferCSSPageSize: true })).toString('latin1');
    const sheets = printed.match(/\/Type \/Page\b(?!s)/g)?.length ?? 0;
    expect(sheets, id).toBeGreaterThan(0);
    expect(sheets, id).toBeLessThanOrEqual(2);
  }
  await page.context().close();
});

test('a complex with more measurements takes at most one sheet more for each', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}complexes/cr-aq6/`);
  expect(await page.locator('main > section').count()).toBe(2);
  const printed = (await page.pdf({ format: 'A4', preferCSSPageSize: true })).toString('latin1');
  expect(printed.match(/\/Type \/Page\b(?!s)/g)!.length).toBeLessThanOrEqual(3);
  await page.context().close();
});

test('the hazard caution stands above the data on screen and on paper', async () => {
  const { page } = await watchedPage(browser, site);
  for (const media of ['screen', 'print'] as const) {
    await page.emulateMedia({ media });
    await page.goto(`${site.address}complexes/cr-am6/`);
    const caution = (await page.locator('.caution').boundingBox())!;
    const first = (await page.locator('table').first().boundingBox())!;
    expect(caution.height).toBeGreaterThan(10);
    expect(caution.y).toBeLessThan(first.y);
  }
  await page.context().close();
});
