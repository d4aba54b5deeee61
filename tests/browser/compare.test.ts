import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { concise, placeWords } from '#engine';
import { readStoredCollection } from '../../scripts/compare/collection.ts';
import { readNewRecord, referable } from '../../scripts/compare/newRecord.ts';
import { type PlacedMeasurement, placeRecord } from '../../scripts/compare/place.ts';
import { places } from '../../scripts/places.ts';
import { predict } from '../../scripts/predict/prediction.ts';
import { violationsEverywhere } from './axe.ts';
import { servedDemonstration } from './demonstrationSite.ts';
import { openBrowser, watchedPage } from './site.ts';

let browser: Browser;
let site: Awaited<ReturnType<typeof servedDemonstration>>;
beforeAll(async () => { [browser, site] = await Promise.all([openBrowser(), servedDemonstration('/bands/')]); });
afterAll(async () => { await browser?.close(); await site?.close(); });

/** Text without what differs between page and terminal: spaces of all kinds, raised and lowered figures, signs of letters. */
const bare = (text: string): string => text.normalize('NFKC').replaceAll('Δ', 'Delta').replaceAll('β', 'beta').replaceAll('−', '-').replaceAll(/\s/g, '');

/** What the command says of the record that the page offers. */
async function commandOn(page: Page): Promise<PlacedMeasurement> {
  const link = page.locator('[data-place=record] a');
  await expect.poll(() => link.count()).toBe(1);
  const name = (await link.getAttribute('download'))!;
  const file = join(inject('runFolder'), name);
  writeFileSync(file, (await page.locator('[data-place=record] pre').textContent())!);
  const stored = readStoredCollection(site.database);
  const read = readNewRecord(file, name, referable(places.content, stored), stored.policy);
  if (!read.ok) throw new Error(JSON.stringify(read.faults));
  return placeRecord(read.record, stored).measurements[0]!;
}

/** The page's reading and place against the command's, digit by digit. */
async function sameDigits(page: Page, { reading, placement }: PlacedMeasurement): Promise<void> {
  const shown = bare((await page.locator('[data-place=reading]').textContent())!);
  expect(shown).toContain(bare(reading.reason));
  for (const { value, u, uTotal, limits } of reading.parameters) {
    if (value === null) continue;
    if (limits === null) expect(shown).toContain(bare(concise(value, uTotal)));
    if (u !== null) expect(shown).toContain(bare(concise(value, u)));
  }
  for (const caution of reading.cautions) expect(shown).toContain(caution.code);
  const placed = bare((await page.locator('[data-place=placement]').textContent())!);
  const name = ({ complex }: { readonly complex: { readonly formula: string; readonly isomer: string } }): string => (complex.isomer === 'none' || complex.formula.startsWith(complex.isomer) ? '' : `${complex.isomer}-`) + complex.formula;
  for (const place of placement.places) expect(placed).toContain(bare(placeWords(place, placement.result, name).sentence));
  for (const { predicted, u } of placement.predictions) if (predicted !== null) expect(placed).toContain(bare(concise(predicted, u)));
  for (const { z } of placement.predictions) if (z !== null) expect(placed).toContain(bare(`${z > 0 ? '+' : ''}${(Math.abs(Number(z.toFixed(1))) === 0 ? 0 : z).toFixed(1)}`.replace('+0.0', '0.0')));
  for (const caution of placement.cautions) expect(placed).toContain(caution.code);
  for (const { result } of placement.earlier) expect(placed).toContain(`${result.complex.id}/${result.measurement}`);
}

const label = (page: Page, text: string) => page.getByLabel(text, { exact: true });

describe('bands that are typed', () => {
  test('a new complex is read and placed as the command reads and places the record that the page offers', async () => {
    const { page, trouble } = await watchedPage(browser, site);
    await page.goto(`${site.address}compare/?new`);
    await label(page, 'Ion').fill('Cr(III)');
    await label(page, 'Isomer').selectOption('cis');
    for (const [band, position, term] of [[1, '20300(80) cm-1', '4T2g'], [2, '367.6(15) nm', '4T1g(F)']] as const) {
      await label(page, `Band ${band}: position`).fill(position);
      await label(page, `Band ${band}: term`).fill(term);
    }
    await label(page, 'Ligand 1: which').selectOption('ammine');
    await label(page, 'Ligand 1: how many').fill('4');
    await page.getByRole('button', { name: 'add a ligand' }).click();
    await label(page, 'Ligand 2: which').selectOption('aqua');
    await label(page, 'Ligand 2: how many').fill('2');
    await label(page, 'Medium').fill('water');
    await label(page, 'Temperature').fill('295 K');
    await label(page, 'Scanned').fill('300 - 1100 nm');
    await expect.poll(() => page.locator('[data-place=placement]').textContent()).toContain('comparable complexes');
    expect(await label(page, 'Formula').getAttribute('placeholder')).toBe('[Cr(H2O)2(NH3)4]3+');
    await sameDigits(page, await commandOn(page));
    // The address holds it all: opened anew, the same answer stands there.
    const answer = async (): Promise<string> => bare((await page.locator('#typed > [data-place]').allTextContents()).join(' '));
    const before = await answer();
    await page.goto(page.url());
    await expect.poll(answer).toBe(before);
    expect(trouble).toEqual([]);
    await page.context().close();
  });

  test('bands read otherwise: the form opens with a record’s bands, a changed term refits at once beside the published reading', async () => {
    const { page, trouble } = await watchedPage(browser, site);
    await page.goto(`${site.address}compare/?otherwise=cr-am6/aq-295`);
    const reading = page.locator('[data-place=reading]');
    await expect.poll(() => reading.textContent()).toContain('Published reading of cr-am6/aq-295');
    expect(await label(page, 'Band 3: position').inputValue()).toBe('22140(100) cm-1');
    await expect.poll(() => page.locator('[data-place=record] a').count()).toBe(1);
    await sameDigits(page, await commandOn(page));
    const rows = reading.locator('table').first().locator('tbody tr');
    for (const row of await rows.all()) {
      const cells = await row.locator('td').allTextContents();
      expect(cells[0]).toBe(cells.at(-1));
    }
    const published = await rows.first().locator('td').last().textContent();
    await label(page, 'Band 3: term').fill('4T1g(F)');
    await label(page, 'Band 4: term').fill('4T1g(P)');
    await expect.poll(() => rows.first().locator('td').first().textContent()).not.toBe(published);
    expect(await rows.first().locator('td').last().textContent()).toBe(published);
    await expect.poll(() => new URL(page.url()).searchParams.getAll('band').length).toBe(4);
    await sameDigits(page, await commandOn(page));
    expect(trouble).toEqual([]);
    await page.context().close();
  });

  test('a bad entry is explained beside its field and mended in place; the reading waits', async () => {
    const { page } = await watchedPage(browser, site);
    await page.goto(`${site.address}compare/?otherwise=cr-am6/aq-295`);
    const position = label(page, 'Band 3: position');
    await expect.poll(() => position.inputValue()).toBe('22140(100) cm-1');
    await position.fill('22,140 cm-1');
    await expect.poll(() => page.locator('#bands-2-position-fault').textContent()).toContain('write 22140 cm-1');
    expect(await position.getAttribute('aria-invalid')).toBe('true');
    expect(await position.getAttribute('aria-describedby')).toBe('bands-2-position-fault');
    expect(await page.locator('[data-place=reading] table').count()).toBe(0);
    await position.fill('22140 cm-1');
    await expect.poll(() => page.locator('.fault').count()).toBe(0);
    expect(await page.locator('[data-place=reading] table').count()).toBeGreaterThan(0);
    await page.getByRole('button', { name: 'Take away band 1' }).click();
    expect(await label(page, 'Band 1: position').inputValue()).toBe('14379(10) cm-1');
    await page.context().close();
  });

  test('a keystroke is answered with little delay', async () => {
    const { page } = await watchedPage(browser, site);
    await page.goto(`${site.address}compare/?ion=Cr(III)&ligand=ammine|6&band=13740(10) cm-1|line|2Eg&band=22140(100) cm-1||4T2g&band=28950(90) cm-1||4T1g(F)`);
    await expect.poll(() => page.locator('[data-place=reading] table').count()).toBeGreaterThan(0);
    const times = await label(page, 'Band 3: position').evaluate((input) => Array.from({ length: 30 }, (_, step) => {
      (input as HTMLInputElement).value = `${28950 + step}(90) cm-1`;
      const start = performance.now();
      input.dispatchEvent(new Event('input', { bubbles: true }));
      return performance.now() - start;
    }));
    const median = times.toSorted((a, b) => a - b)[15]!;
    console.info(`keystroke to refreshed reading, three bands: median ${median.toFixed(1)} ms of 30`);
    // What is tested is that each keystroke was answered: the last one stands on the page.
    await expect.poll(() => page.locator('[data-place=reading]').textContent()).toContain('28\u2009979');
    await page.context().close();
  });
});

describe('measurements that are picked', () => {
  test('two to six are set side by side, from search to table, and the address brings them back', async () => {
    const { page, trouble } = await watchedPage(browser, site);
    await page.goto(`${site.address}compare/`);
    for (const query of ['Cr(NH3)6', '[Cr(en)3]3+', 'Ti(H2O)6']) {
      await page.getByRole('searchbox').fill(query);
      await page.locator('[data-place=offers] button').first().click();
    }
    await expect.poll(() => page.locator('[data-place=chips] li').count()).toBe(3);
    const tables = page.locator('[data-place=answer] table');
    expect(await tables.nth(1).locator('tbody tr').count()).toBe(3);
    expect(await tables.nth(1).textContent()).toMatch(/not distinguishable|differs/);
    expect(await tables.nth(2).textContent()).toContain('not tested');
    expect(await page.locator('[data-place=answer] svg.drawing').count()).toBe(2);
    const url = page.url();
    await page.getByRole('button', { name: /^Take away/ }).first().click();
    await expect.poll(() => page.locator('[data-place=chips] li').count()).toBe(2);
    await page.goBack();
    await expect.poll(() => page.locator('[data-place=chips] li').count()).toBe(3);
    expect(page.url()).toBe(url);
    expect(trouble).toEqual([]);
    await page.context().close();
  });

  test('an address that names what is not there says so and shows the rest', async () => {
    const { page } = await watchedPage(browser, site);
    await page.goto(`${site.address}compare/?with=cr-am6&with=no-such/thing`);
    await expect.poll(() => page.locator('#picked [role=status]').textContent()).toBe('Not in the collection: no-such/thing.');
    expect(await page.locator('[data-place=chips] li').count()).toBe(1);
    await page.context().close();
  });
});

test('predict: typed numbers, arrow keys, address and table agree with the engine', async () => {
  const { page, trouble } = await watchedPage(browser, site);
  await page.goto(`${site.address}predict/?ion=Co(II)&Delta=9200&B=850`);
  const shown = async (): Promise<string> => bare((await page.locator('#answer').textContent())!);
  const expected = (delta: number): readonly string[] => predict({ electrons: 7, geometry: 'octahedral', multiplicity: null, delta, racahB: 850, racahC: 4.5 * 850 }).transitions.map(({ position }) => String(Math.round(position)));
  await expect.poll(shown).toContain('Assumed:C/B4.5');
  for (const position of expected(9200)) expect(await shown()).toContain(position);
  await page.getByLabel('Δ / cm−1').focus();
  await page.keyboard.press('ArrowUp');
  await page.keyboard.press('Shift+ArrowDown');
  expect(new URL(page.url()).searchParams.get('Delta')).toBe('8300');
  for (const position of expected(8300)) expect(await shown()).toContain(position);
  await page.getByLabel('Ion', { exact: true }).fill('Co2');
  await expect.poll(() => page.locator('#ion-fault').textContent()).toContain('Co(II)');
  expect(trouble).toEqual([]);
  await page.context().close();
});

test('axe finds nothing on the filled pages, by day, by night and at 320 pixels, and none scrolls sideways', async () => {
  const { page } = await watchedPage(browser, site);
  for (const path of ['compare/?with=cr-am6&with=cr-en3&with=ti-aq6', 'compare/?otherwise=co2-am6/powder-room', 'compare/?new&ion=Cr3&band=24,500 cm-1', 'predict/?ion=Fe(II)&Delta=33000&B=420&spin=low', '?q=21500 cm-1&geometry=octahedral&sort=-Delta']) {
    await page.goto(site.address + path);
    await expect.poll(() => page.locator('main [role=status]:visible').first().textContent()).not.toMatch(/^(Loading.*)?$/);
    await page.waitForTimeout(400);
    for (const closed of await page.locator('details:not([open])').elementHandles()) await closed.evaluate((details) => { (details as HTMLDetailsElement).open = true; });
    await page.waitForTimeout(200);
    expect(await violationsEverywhere(page), path).toEqual([]);
    await page.setViewportSize({ width: 320, height: 800 });
    expect(await page.evaluate(() => document.documentElement.scrollWidth), path).toBeLessThanOrEqual(320);
    await page.setViewportSize({ width: 1280, height: 800 });
  }
  await page.context().close();
});
