import { existsSync, mkdirSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseHTML } from 'linkedom';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { refit } from '../../scripts/database/refit.ts';
import { writePublication } from '../../scripts/export/writePublication.ts';
import { buildPages } from '../../scripts/publish/pages.ts';
import { freeze } from '../../scripts/release/freeze.ts';
import { readXml } from '../schemas/readXml.ts';
import { schemaOrgProblems } from '../schemas/schemaOrg.ts';
import { sampleContent, sampleFile } from '../scripts/commands/sampleContent.ts';
import { type ServedSite, builtPages, openBrowser, serve, watchedPage } from './site.ts';

const address = 'https://bands.example/group/';
const base = '/group/';
let browser: Browser;
let site: ServedSite;

/**
 * Three releases of one collection: in the second a reading changed, in the third one record was taken away, one renamed, and one
 * measurement got another id; since then a number changed again.
 */
beforeAll(async () => {
  const content = sampleContent();
  const put = (name: string, text: string): void => {
    mkdirSync(join(content, name, '..'), { recursive: true });
    writeFileSync(join(content, name), text);
  };
  const frozen = (release: string, date: string, cause: string): void => {
    expect(freeze({ content, cache: null, release, date, who: 'T. Lind', cause, codeVersion: null })).toMatchObject({ kind: 'frozen' });
  };
  const typed = (position: string, id: string): string => sampleFile('complexes/cr-am6.yaml').replace('21550(60)', position).replace('aq-295', id);
  frozen('1.0', '2026-02-01', 'The first.');
  put('complexes/cr-am6.yaml', typed('21700(60)', 'aq-295'));
  frozen('1.1', '2026-03-01', 'A misreading.');
  put('complexes/cr-am6.yaml', typed('21700(60)', 'aq-298'));
  rmSync(join(content, 'complexes/co2-cl4.yaml'));
  renameSync(join(content, 'complexes/co3-am6.yaml'), join(content, 'complexes/co3-am6-new.yaml'));
  put('releases/gone.yaml', `gone:
  - { address: complexes/co2-cl4/, reason: "The <b>sample</b> was another.", successor: complexes/cr-am6/ }
  - { address: ions/co-ii/, reason: "No complex is left." }
  - { address: complexes/co3-am6/, now: complexes/co3-am6-new/ }
  - { address: "complexes/cr-am6/#aq-295", now: "complexes/cr-am6/#aq-298" }
`);
  frozen('1.2', '2026-04-01', 'Cleared up.');
  put('complexes/cr-am6.yaml', typed('21800(60)', 'aq-298'));

  const folder = join(inject('runFolder'), 'published');
  const database = join(folder, 'collection.sqlite');
  mkdirSync(folder);
  const done = refit({ content, database, cache: null });
  if (!done.ok) throw new Error(JSON.stringify(done.faults));
  await buildPages(database, { origin: 'https://bands.example', base }, join(folder, 'dist'));
  writePublication(database, content, join(folder, 'dist'));
  rmSync(content, { recursive: true });
  [browser, site] = await Promise.all([openBrowser(), serve(folder, base)]);
});
afterAll(async () => {
  await browser?.close();
  await site?.close();
});

const html = (path: string): string => readFileSync(join(site.folder, path), 'utf8');
const documentOf = (path: string) => parseHTML(html(`${path}index.html`)).document;
const xml = (path: string) => readXml(html(path));
const textOf = (path: string): string => documentOf(path).querySelector('main')!.textContent.replace(/\s+/g, ' ');
const cellsOf = (table: Element): string[][] => [...table.querySelectorAll('tbody tr')].map((row) => [...row.children].map((cell) => cell.textContent));

describe('the history of a record', () => {
  test('names release, date, who, what changed and why, newest first', () => {
    const table = [...documentOf('complexes/cr-am6/').querySelectorAll('table')].find((one) => one.textContent.includes('History of this record'))!;
    const rows = cellsOf(table).map(([release, date, who, , cause, why]) => [release, date, who, cause, why]);
    expect(rows[0]).toEqual(['not frozen yet', 'no date yet', 'nobody yet', 'readings', 'not released']);
    expect(rows.filter(([release]) => release === '1.1').every((row) => row.slice(1).join() === '2026-03-01,T. Lind,readings,A misreading.')).toBe(true);
    expect(rows.at(-1)).toEqual(['1.0', '2026-02-01', 'T. Lind', 'record', 'The first.']);
    expect(cellsOf(table).find(([release, , , what]) => release === '1.1' && what!.includes('Δ'))![3]).toMatch(/Δ went from 21.5\d\d\(\d+\) to 21.7\d\d\(\d+\).cm⁻¹ \(readings\)\.$/);
  });

  test('keeps the numbers of every release readable', () => {
    const table = [...documentOf('complexes/cr-am6/').querySelectorAll('details table')].find((one) => one.textContent.includes('each release froze'))!;
    expect(cellsOf(table).map(([release, measurement, delta]) => [release, measurement, /^21.[578]\d\d\(\d+\)$/.test(delta!)])).toEqual([['1.2', 'aq-298', true], ['1.1', 'aq-295', true], ['1.0', 'aq-295', true]]);
  });

  test('of a measurement that was renamed leads from the old place to the new one', () => {
    const place = documentOf('complexes/cr-am6/').getElementById('aq-295')!;
    expect([place.textContent, place.querySelector('a')!.getAttribute('href')]).toEqual(['aq-295 has a new address: see aq-298.', `${base}complexes/cr-am6/#aq-298`]);
  });
});

describe('addresses that are gone', () => {
  test('say in the look of the site why, and what took the place', () => {
    expect(textOf('complexes/co2-cl4/')).toContain('The <b>sample</b> was another.Its place is taken by complexes/cr-am6/.');
    expect(documentOf('complexes/co2-cl4/').querySelectorAll('main b, meta[http-equiv="refresh"]').length).toBe(0);
    expect(documentOf('complexes/co2-cl4/').querySelector('nav[aria-label="Sections"]')).not.toBeNull();
    expect(documentOf('complexes/co2-cl4/').querySelector('link[rel="successor-version"]')!.getAttribute('href')).toBe(`${address}complexes/cr-am6/`);
    expect(textOf('ions/co-ii/')).toContain('No complex is left.');
  });

  test('lead to the new name without a script, and to a reader who stops them by a link', async () => {
    const { page, trouble } = await watchedPage(browser, site, { javaScriptEnabled: false });
    await page.goto(`${site.address}complexes/co3-am6/`);
    await page.waitForURL('**/complexes/co3-am6-new/');
    expect(trouble).toEqual([]);
    await page.context().close();
    expect(documentOf('complexes/co3-am6/').querySelector('main a[href$="/complexes/co3-am6-new/"]')).not.toBeNull();
    expect(html('complexes/co3-am6/index.html')).not.toMatch(/<script(?![^>]* src=)/);
  });

  test('stand on the changes page, and robots pass them over', () => {
    expect(textOf('changes/')).toContain('complexes/co2-cl4/');
    for (const path of ['complexes/co2-cl4/', 'complexes/co3-am6/', 'ions/co-ii/']) expect(documentOf(path).querySelector('meta[name="robots"]')!.getAttribute('content')).toBe('noindex');
  });
});

describe('files for machines', () => {
  test('the sitemap lists every page but those that are gone', () => {
    const listed = xml('sitemap.xml').children.map((url) => url.children[0]!.text);
    const gone = ['complexes/co2-cl4/', 'complexes/co3-am6/', 'ions/co-ii/'];
    expect([...listed].sort()).toEqual(builtPages(site).map(({ path }) => path).filter((path) => path !== '404.html' && !gone.includes(path)).map((path) => address + path).sort());
    expect(new Set(xml('sitemap.xml').children.map((url) => url.children[1]!.text))).toEqual(new Set(['2026-04-01']));
  });

  test('every entry of the feed leads to its place on the changes page', () => {
    const ids = xml('changes.xml').children.filter(({ name }) => name === 'entry').map((entry) => entry.children.find(({ name }) => name === 'id')!.text);
    expect(ids).toEqual(['1.2', '1.1', '1.0'].map((release) => `${address}changes/#release-${release}`));
    for (const id of ids) expect(documentOf('changes/').getElementById(id.split('#')[1]!), id).not.toBeNull();
    for (const { path, html: page } of builtPages(site)) expect(parseHTML(page).document.querySelector('link[rel="alternate"]')!.getAttribute('href'), path).toBe(`${base}changes.xml`);
  });

  test('typed links of a page are those that the link set gives for it', () => {
    const { linkset } = JSON.parse(html('data/linkset.json')) as { linkset: { anchor: string }[] };
    expect(linkset.map(({ anchor }) => anchor)).toEqual(['data/', 'complexes/co3-am6-new/', 'complexes/cr-am6/'].map((path) => address + path));
    for (const { anchor, ...relations } of linkset as ({ anchor: string } & Record<string, { href: string; type?: string }[]>)[]) {
      const given = Object.entries(relations as Record<string, { href: string; type?: string }[]>).flatMap(([rel, targets]) => targets.map(({ href, type }) => [rel, href, type ?? null].join(' ')));
      const inHead = [...documentOf(anchor.slice(address.length)).querySelectorAll('head > link')].filter((link) => !['icon', 'alternate', 'stylesheet', 'linkset', 'modulepreload'].includes(link.getAttribute('rel')!))
        .map((link) => [link.getAttribute('rel'), link.getAttribute('href'), link.getAttribute('type') ?? ''].join(' '));
      expect(inHead.sort(), anchor).toEqual(given.sort());
      for (const { href } of Object.values(relations as Record<string, { href: string }[]>).flat().filter((target) => target.href.startsWith(address))) {
        const path = href.slice(address.length);
        expect(existsSync(join(site.folder, path, path.endsWith('/') ? 'index.html' : '')), href).toBe(true);
      }
    }
  });

  test('JSON-LD stands in the heads of the front page, the data page and every record, and nowhere else', () => {
    const blocks = builtPages(site).flatMap(({ path, html: page }) => [...parseHTML(page).document.querySelectorAll('script[type="application/ld+json"]')].map((script) => ({ path, text: script.textContent })));
    for (const { path, text } of blocks) expect(text, path).not.toContain('<');
    const read = blocks.map(({ path, text }) => ({ path, value: JSON.parse(text) as { '@type': string } }));
    expect(schemaOrgProblems(read.map(({ value }) => value))).toEqual([]);
    const found = read.map(({ path, value }) => [path, value['@type']]);
    expect(found).toEqual([['complexes/co3-am6-new/', 'Dataset'], ['complexes/cr-am6/', 'Dataset'], ['data/', 'Dataset'], ['', 'DataCatalog']]);
  });

  test('a complex has at most the eight files that are listed for it, each with a link on its page', () => {
    const files = readdirSync(join(site.folder, 'complexes/cr-am6')).sort();
    expect(files).toEqual(['bands.csv', 'cite.bib', 'cite.ris', 'index.html', 'levels.svg', 'record.json', 'record.yaml', 'strip.svg']);
    for (const file of files.filter((name) => name !== 'index.html')) expect(documentOf('complexes/cr-am6/').querySelector(`main a[href^="${base}complexes/cr-am6/${file}"]`), file).not.toBeNull();
  });

  test('one licence id stands on the pages and in every file', () => {
    const { licence } = JSON.parse(html('data/collection.json')).about as { licence: string };
    expect(licence).toBe('CC0-1.0');
    for (const { path, html: page } of builtPages(site)) {
      const document = parseHTML(page).document;
      expect(document.querySelector('.colophon')!.textContent, path).toContain(`Content: ${licence}.`);
      for (const link of document.querySelectorAll('[rel~="license"]')) expect(link.getAttribute('href'), path).toBe(`https://spdx.org/licenses/${licence}.html`);
    }
    const named: Readonly<Record<string, RegExp>> = {
      'datapackage.json': /"licenses": \[\s*\{\s*"name": "([^"]+)"/, 'CITATION.cff': /^license: "([^"]+)"/m, 'datacite.json': /"rightsIdentifier": "([^"]+)"/, 'datacite.xml': /rightsIdentifier="([^"]+)"/,
      'ro-crate-metadata.json': /"license": \{\s*"@id": "https:\/\/spdx\.org\/licenses\/([^"]+)\.html"/, 'cite.ris': /^C1 {2}- (.+)\r$/m,
    };
    for (const [file, pattern] of Object.entries(named)) expect([file, pattern.exec(html(`data/${file}`))?.[1]]).toEqual([file, licence]);
  });

  test('no DOI is invented, and pages and files say that none is assigned', () => {
    for (const file of ['data/index.html', 'complexes/cr-am6/index.html', 'data/cite.txt', 'data/cite.bib', 'data/cite.ris', 'data/CITATION.cff', 'data/datapackage.json', 'data/ro-crate-metadata.json']) {
      expect(html(file), file).toMatch(/not yet assigned/);
      expect(html(file), file).not.toMatch(/\b10\.\d{4,9}\//);
    }
  });
});

test('hazard cautions stand above the data in print, as on the screen', async () => {
  const { page } = await watchedPage(browser, site);
  await page.goto(`${site.address}complexes/cr-am6/`);
  const { caution } = JSON.parse(html('complexes/cr-am6/record.json')) as { caution: { subject: string; text: string }[] };
  const hazards = caution.filter(({ subject }) => subject === 'hazard');
  expect(hazards.length).toBeGreaterThan(0);
  for (const media of ['screen', 'print'] as const) {
    await page.emulateMedia({ media });
    for (const { text } of hazards) {
      const name = page.getByText(/^.*?\./.exec(text)![0], { exact: true });
      expect(await name.isVisible(), media).toBe(true);
      const [above, below] = [await name.boundingBox(), await page.getByRole('heading', { name: 'What was read' }).first().boundingBox()];
      expect(above!.y).toBeLessThan(below!.y);
    }
    expect(await page.getByText('No caution here does not mean no hazard.').isVisible(), media).toBe(true);
  }
  await page.context().close();
});

describe('how to cite', () => {
  test.each([['the set', 'data/', 'data/'], ['one record', 'complexes/cr-am6/', 'complexes/cr-am6/']])('%s: text, BibTeX and RIS at one click, and the files without a script', async (_, path, folder) => {
    const { page, trouble } = await watchedPage(browser, site, { permissions: ['clipboard-read', 'clipboard-write'] });
    await page.goto(site.address + path);
    const text = await page.locator('#cite ~ p').first().textContent();
    for (const [name, wanted] of [['Copy the text', text!], ['Copy BibTeX', html(`${folder}cite.bib`)], ['Copy RIS', html(`${folder}cite.ris`)]] as const) {
      await page.getByRole('main').getByRole('button', { name }).click();
      await expect.poll(() => page.evaluate(() => navigator.clipboard.readText())).toBe(wanted.replaceAll('\r\n', '\n'));
    }
    await page.getByRole('contentinfo').getByRole('button', { name: 'copy' }).click();
    await expect.poll(() => page.evaluate(() => navigator.clipboard.readText())).toBe(html('data/cite.txt').trim());
    expect(text).toContain('release 1.2 with later changes, 2026-04-01');
    expect(trouble).toEqual([]);
    await page.context().close();
    for (const file of ['cite.bib', 'cite.ris']) expect(documentOf(path).querySelector(`main a[href="${base}${folder}${file}"]`), file).not.toBeNull();
  });
});
