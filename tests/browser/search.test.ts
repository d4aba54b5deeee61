import { readFileSync } from 'node:fs';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ServedSite, openBrowser, servedSite, watchedPage } from './site.ts';

let browser: Browser;
let site: ServedSite;
beforeAll(async () => { [browser, site] = await Promise.all([openBrowser(), servedSite('/bands/')]); });
afterAll(async () => { await browser?.close(); await site?.close(); });

const WHOLE = '8 complexes of 4 ions, 9 measurements.';

test('typing Cr(NH3)6 finds the complex, counts it, says why and writes the query into the address', async () => {
  const { page, trouble } = await watchedPage(browser, site);
  await page.goto(site.address);
  await page.getByRole('searchbox').fill('Cr(NH3)6');
  await expect.poll(() => page.getByRole('status').textContent()).toBe('1 complex found, 1 measurement.');
  expect(await page.locator('table.results tbody tr').count()).toBe(1);
  expect(await page.locator('table.results .why').textContent()).toBe('formula');
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
  await expect.poll(() => page.getByRole('status').textContent()).toBe(WHOLE);
  expect(await page.locator('table.results tbody').count()).toBe(4);
  expect(new URL(page.url()).search).toBe('');
  await page.context().close();
});

test('nothing found says so in words and offers a way on', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}?q=${encodeURIComponent('<b>xyzzy</b>')}`);
  await expect.poll(() => page.getByRole('status').textContent()).toContain('Nothing found for “<b>xyzzy</b>”');
  await expect.poll(() => page.locator('table.results').isVisible()).toBe(false);
  await page.getByRole('searchbox').fill('hexaaminechromium');
  await expect.poll(() => page.getByRole('status').textContent()).toContain('The nearest:');
  expect(await page.locator('table.results tbody tr').count()).toBeGreaterThan(0);
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

test('filters, sorting and query stand in the address; back and forward walk through them', async () => {
  const { page, trouble } = await watchedPage(browser, site);
  await page.goto(site.address);
  const rows = () => page.locator('table.results tbody a.formula').count();
  await page.getByText('Filters', { exact: true }).click();
  await page.getByRole('checkbox', { name: /^Cr\(III\)/ }).check();
  await expect.poll(rows).toBe(5);
  await page.getByRole('button', { name: 'Δ' }).click();
  await expect.poll(() => page.locator('th[data-sort=Delta]').getAttribute('aria-sort')).toBe('ascending');
  await page.getByRole('searchbox').fill('ammine');
  await expect.poll(rows).toBe(1);
  expect(new URL(page.url()).search).toBe('?q=ammine&sort=Delta&ion=Cr%28III%29');
  await page.goBack();
  await expect.poll(rows).toBe(5);
  expect(await page.getByRole('searchbox').inputValue()).toBe('');
  await page.goBack();
  await expect.poll(() => page.locator('th[aria-sort]').count()).toBe(0);
  await page.goBack();
  await expect.poll(() => page.getByRole('status').textContent()).toBe(WHOLE);
  expect(await page.getByRole('checkbox', { name: /^Cr\(III\)/ }).isChecked()).toBe(false);
  await page.goForward();
  await page.goForward();
  await page.goForward();
  await expect.poll(rows).toBe(1);
  expect(await page.locator('[aria-label="Filters in force"] button').count()).toBe(1);
  expect(trouble).toEqual([]);
  await page.context().close();
});

test('columns are chosen, in the address too; terms observed are a filter with their superscripts', async () => {
  const { page, trouble } = await watchedPage(browser, site);
  await page.goto(site.address);
  const shown = (): Promise<readonly string[]> => page.locator('table.results thead th:visible').evaluateAll((heads) => heads.map((head) => (head.textContent ?? '').trim().split(/\s/)[0]!));
  const whole = await shown();
  await page.getByText('Columns', { exact: true }).click();
  await page.getByRole('checkbox', { name: 'conditions' }).uncheck();
  await page.getByRole('checkbox', { name: 'β' }).uncheck();
  expect(new URL(page.url()).search).toBe('?without=conditions&without=beta');
  const fewer = whole.filter((_, place) => place !== 2 && place !== 5);
  await expect.poll(shown).toEqual(fewer);
  expect(await page.locator('table.results tbody tr:not(.section)').first().locator(':scope > :visible').count()).toBe(5);
  // Rows that the page itself draws leave them out as well.
  await page.getByText('Filters', { exact: true }).click();
  const term = page.locator('label').filter({ has: page.locator('input[name=term][value="4T2g"]') });
  expect(await term.locator('sup').textContent()).toBe('4');
  await term.locator('input').check();
  await expect.poll(() => page.locator('table.results tbody a.formula').count()).toBe(5);
  expect(await page.locator('table.results tbody tr').first().locator(':scope > :visible').count()).toBe(5);
  await page.goto(page.url());
  await expect.poll(() => page.locator('table.results tbody a.formula').count()).toBe(5);
  expect(await shown()).toEqual(fewer);
  await page.goBack();
  await page.goBack();
  expect(trouble).toEqual([]);
  await page.context().close();
});

test('a column sorts by value up and down with what is withheld last, and a third press brings the order of the book', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(site.address);
  const column = (nth: number) => page.locator(`table.results tbody tr td:nth-of-type(${nth})`).allTextContents();
  const value = (text: string): number => text === 'withheld' ? Number.NaN : Number(text.replace(/\(.*/, '').replaceAll(/\s/g, ''));
  const head = page.locator('th[data-sort=B] button');
  for (const sign of [1, -1]) {
    await head.click();
    await expect.poll(() => page.locator('th[data-sort=B]').getAttribute('aria-sort')).toBe(sign > 0 ? 'ascending' : 'descending');
    await expect.poll(async () => (await column(4)).length).toBe(9);
    const values = (await column(4)).map(value);
    const known = values.filter((one) => !Number.isNaN(one));
    expect(known).toEqual(known.toSorted((a, b) => sign * (a - b)));
    expect(values.slice(known.length).every(Number.isNaN)).toBe(true);
    expect(known.length).toBeLessThan(9);
  }
  await head.click();
  await expect.poll(() => page.locator('table.results tbody').count()).toBe(4);
  await page.context().close();
});

test('by keyboard alone: search, filter, sort, the rows shown saved as CSV and JSON, and two complexes compared', async () => {
  const { page, trouble } = await watchedPage(browser, site, { acceptDownloads: true });
  await page.goto(site.address);
  const focused = () => page.evaluate(() => (document.activeElement?.textContent ?? '') + (document.activeElement?.getAttribute('value') ?? ''));
  const tabTo = async (wanted: RegExp): Promise<void> => {
    for (let step = 0; step < 80; step += 1) {
      await page.keyboard.press('Tab');
      if (wanted.test(await focused())) return;
    }
    throw new Error(`no stop at ${wanted}`);
  };
  while (await page.evaluate(() => document.activeElement?.id) !== 'query') await page.keyboard.press('Tab');
  await page.keyboard.type('octahedral');
  await expect.poll(() => page.getByRole('status').textContent()).toBe('7 complexes found, 8 measurements.');
  await tabTo(/^Filters$/);
  await page.keyboard.press('Enter');
  await tabTo(/^Ni\(II\)$/);
  await page.keyboard.press('Space');
  await expect.poll(() => page.getByRole('status').textContent()).toBe('2 complexes found, 2 measurements.');
  await tabTo(/^Δ/);
  await page.keyboard.press('Enter');
  await page.keyboard.press('Enter');
  await expect.poll(() => page.locator('th[data-sort=Delta]').getAttribute('aria-sort')).toBe('descending');
  for (const kind of ['CSV', 'JSON']) {
    await tabTo(new RegExp(`^${kind}$`));
    const [file] = await Promise.all([page.waitForEvent('download'), page.keyboard.press('Enter')]);
    const text = readFileSync(await file.path(), 'utf8');
    expect(file.suggestedFilename()).toBe(`results.${kind.toLowerCase()}`);
    expect(text).toContain('ni-aq6');
    expect(text).toContain('ni-am6');
    expect(text).not.toContain('cr-am6');
    if (kind === 'JSON') expect((JSON.parse(text) as { results: unknown[] }).results).toHaveLength(2);
  }
  await page.goto(site.address);
  await tabTo(/^Compare$/);
  await page.keyboard.press('Enter');
  await page.waitForURL('**/compare/');
  for (const [query, picked] of [['Ni(NH3)6', 1], ['Ni(H2O)6', 2]] as const) {
    while (await page.evaluate(() => document.activeElement?.id) !== 'pick') await page.keyboard.press('Tab');
    await page.keyboard.type(query);
    await expect.poll(() => page.locator('[data-place=offers] button').count()).toBeGreaterThan(0);
    await page.keyboard.press('Tab');
    await page.keyboard.press('Enter');
    await expect.poll(() => page.getByRole('status').first().textContent()).toBe(`${picked} picked.`);
  }
  await expect.poll(() => page.locator('[data-place=answer] table').count()).toBeGreaterThan(0);
  expect(trouble).toEqual([]);
  await page.context().close();
});

test('the page that says no such page has a search box that leads into the collection', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}404.html`);
  await page.getByRole('searchbox').fill('Cr(NH3)6');
  await page.keyboard.press('Enter');
  await page.waitForURL('**/bands/?q=Cr(NH3)6');
  await expect.poll(() => page.getByRole('status').textContent()).toBe('1 complex found, 1 measurement.');
  await page.context().close();
});

test('without JavaScript every row, value, figure and download is there, and no dead search box or button', async () => {
  const { page, trouble } = await watchedPage(browser, site, { javaScriptEnabled: false });
  await page.goto(site.address);
  expect(await page.locator('table.results tbody a.formula').count()).toBe(9);
  expect(await page.locator('svg.strip[role=img]').count()).toBe(9);
  expect(await page.locator('input:visible, button:visible').count()).toBe(0);
  await page.goto(`${site.address}complexes/cr-am6/`);
  expect(await page.locator('svg.drawing[role=img]').count()).toBeGreaterThan(2);
  await page.goto(`${site.address}data/`);
  expect(await page.locator('a[download]').count()).toBeGreaterThanOrEqual(3);
  for (const path of ['compare/', 'predict/']) {
    await page.goto(site.address + path);
    expect(await page.locator('noscript').count()).toBe(1);
    expect(await page.locator('input:visible, button:visible, select:visible').count()).toBe(0);
  }
  expect(trouble).toEqual([]);
  await page.context().close();
});
