import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { HtmlValidate } from 'html-validate';
import { parseHTML } from 'linkedom';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { pageScriptBytes, partScriptBytes } from './pageScripts.ts';
import { shiftsOf, watchShifts } from './shifts.ts';
import { PAGE_KINDS, type ServedSite, builtPages, openBrowser, servedSite, watchedPage } from './site.ts';

const CSP = "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self' data:; font-src 'self'; connect-src 'self'; base-uri 'none'; form-action 'none'";

const validator = new HtmlValidate({
  extends: ['html-validate:recommended'],
  rules: {
    // Answers come while one types: there is nothing to submit.
    'wcag/h32': 'off',
    // A text field is one without saying so.
    'no-implicit-input-type': 'off',
    // Anchors of releases hold their points: release-1.1.0.
    'valid-id': ['error', { relaxed: true }],
  },
});

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(async () => { await browser?.close(); });

describe.each(['/', '/bands/'])('the site under %s', (base) => {
  let site: ServedSite;
  beforeAll(async () => { site = await servedSite(base); });
  afterAll(async () => { await site?.close(); });

  test('no link and no anchor leads nowhere', () => {
    const pages = new Map(builtPages(site).map(({ path, html }) => [path, parseHTML(html).document]));
    const dead: string[] = [];
    let followed = 0;
    for (const [path, document] of pages) {
      for (const element of document.querySelectorAll('[href], [src]')) {
        const target = element.getAttribute('href') ?? element.getAttribute('src')!;
        if (/^(https?|mailto|data):/.test(target)) continue;
        followed += 1;
        const { pathname, hash } = new URL(target, `http://x${base}${path}`);
        const within = pathname.startsWith(base) ? decodeURIComponent(pathname.slice(base.length)) : null;
        const file = within === null ? null : join(site.folder, within, within === '' || within.endsWith('/') ? 'index.html' : '');
        if (file === null || !existsSync(file)) dead.push(`${path} -> ${target}`);
        else if (hash !== '' && pages.get(within!)?.getElementById(decodeURIComponent(hash.slice(1))) == null) dead.push(`${path} -> ${target} (anchor)`);
      }
    }
    expect(dead).toEqual([]);
    expect(followed).toBeGreaterThan(300);
  });

  test('every page opens without a console line, an error, a request to another host, or a part that moves', async () => {
    const { page, trouble } = await watchedPage(browser, site);
    await watchShifts(page);
    // What hangs on the base path shows on one page of each kind.
    for (const path of base === '/' ? builtPages(site).map((one) => one.path) : PAGE_KINDS) {
      await page.goto(site.address + path);
      expect(trouble, path).toEqual([]);
      expect(await shiftsOf(page), path).toEqual([]);
    }
    await page.context().close();
  });

  test('the strict policy stands first after the character set, and nothing is written inline', () => {
    for (const { path, html } of builtPages(site)) {
      const { document } = parseHTML(html);
      const [charset, policy] = [...document.querySelectorAll('head > *')];
      expect(charset!.getAttribute('charset'), path).toBe('utf-8');
      expect(policy!.getAttribute('content'), path).toBe(CSP);
      expect([...document.querySelectorAll('script')].filter((script) => !script.getAttribute('src') && script.getAttribute('type') !== 'application/ld+json').length, path).toBe(0);
      expect(document.querySelectorAll('style, [style]').length, path).toBe(0);
      expect(html, path).not.toMatch(/ on[a-z]+="/);
    }
  });

  test('a page of each kind that the other checks look at exists', () => {
    expect(builtPages(site).map(({ path }) => path)).toEqual(expect.arrayContaining([...PAGE_KINDS]));
  });

  test('pages stay light', () => {
    for (const { path, html } of builtPages(site)) {
      expect(gzipSync(html).length, path).toBeLessThan(60_000);
      expect(pageScriptBytes(site, html), path).toBeLessThan(40_000);
    }
    // Parts of the compare page are fetched when they are asked for: the form, then all that reads bands, then all that places them.
    const [picked, form] = [partScriptBytes(site, 'startPicked'), partScriptBytes(site, 'startTyped')];
    const reading = partScriptBytes(site, 'startTyped', 'reckon') - form;
    const placing = partScriptBytes(site, 'startTyped', 'reckon', 'placing') - form - reading;
    console.info(`scripts, compressed: collection ${pageScriptBytes(site, builtPages(site).find(({ path }) => path === '')!.html)}, predict ${pageScriptBytes(site, builtPages(site).find(({ path }) => path === 'predict/')!.html)}, compare ${picked}, form for bands ${form}, to read them ${reading}, to place them ${placing}`);
    for (const part of [picked, form, reading, placing]) {
      expect(part).toBeGreaterThan(10_000);
      expect(part).toBeLessThan(40_000);
    }
  });

  test('a page of each kind is valid HTML', async () => {
    const pages = new Map(builtPages(site).map(({ path, html }) => [path, html]));
    const faults: string[] = [];
    for (const path of base === '/' ? PAGE_KINDS : ['' as const]) {
      const { results } = await validator.validateString(pages.get(path)!, path);
      faults.push(...results.flatMap(({ messages }) => messages.map(({ ruleId, message, line, column }) => `${path} ${line}:${column} ${ruleId}: ${message}`)));
    }
    expect(faults).toEqual([]);
    expect((await validator.validateString('<!DOCTYPE html><html lang="en"><head><title>x</title></head><body><p><div>x</div></p></body></html>', 'x')).valid).toBe(false);
  });

  test('every page has one heading of the first order, and every id once', () => {
    for (const { path, html } of builtPages(site)) {
      const { document } = parseHTML(html);
      expect(document.querySelectorAll('h1').length, path).toBe(1);
      const ids = [...document.querySelectorAll('[id]')].map((element) => element.id);
      expect(ids.filter((id, index) => ids.indexOf(id) !== index), path).toEqual([]);
    }
  });

  test('figures are files that stand by themselves', () => {
    const folder = join(site.folder, 'figures');
    const names = readdirSync(folder);
    expect(names.filter((name) => name.endsWith('.svg')).length).toBeGreaterThan(10);
    for (const name of names.filter((one) => one.endsWith('.svg'))) {
      const text = readFileSync(join(folder, name), 'utf8');
      expect(text, name).toMatch(/^<\?xml version="1\.0" encoding="UTF-8"\?>\n<svg xmlns="http:\/\/www\.w3\.org\/2000\/svg" /);
      expect(text, name).toContain('#1b1a18');
      // Programs that draw figures know no variables: colours stand in the file. What a page shows as a picture follows the reader's theme.
      if (!/-(?:background|plate)\.svg$/.test(name)) expect(text, name).not.toContain('var(');
      expect(text, name).toMatch(/<title id="[^"]+">[^<]+<\/title>/);
    }
    for (const name of names.filter((one) => one.endsWith('.csv'))) expect(statSync(join(folder, name)).size, name).toBeGreaterThan(50);
  });
});
