import { mkdirSync, mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { join, resolve } from 'node:path';
import { type Browser, type BrowserContextOptions, type Page, chromium } from 'playwright-core';
import { writeExports } from '../../scripts/export/writeExports.ts';
import { buildPages } from '../../scripts/publish/pages.ts';
import { createSiteServer } from '../../scripts/publish/staticServer.ts';
import { findChromium } from '../../scripts/test/chromium.ts';
import { writeSampleDatabase } from '../site/sampleDatabase.ts';

/** The sample collection built and served, as a visitor finds it. */
export interface ServedSite {
  /** "http://127.0.0.1:PORT/bands/" */
  readonly address: string;
  readonly folder: string;
  readonly close: () => Promise<void>;
}

/** Builds the sample under a base path and serves it. Each build has a folder of its own inside the project, because the page builder shares one outside it. */
export async function servedSite(base: string, options: Parameters<typeof writeSampleDatabase>[1] = {}): Promise<ServedSite> {
  mkdirSync(resolve('.cache'), { recursive: true });
  const work = mkdtempSync(resolve('.cache', 'browser-'));
  const folder = join(work, 'dist');
  const database = writeSampleDatabase(join(work, 'collection.sqlite'), options);
  await buildPages(database, { origin: 'https://example.org', base }, folder);
  writeExports(database, join(folder, 'data'));
  const server = createSiteServer(folder, base);
  await new Promise<void>((done) => { server.listen(0, '127.0.0.1', done); });
  return {
    address: `http://127.0.0.1:${(server.address() as AddressInfo).port}${base}`, folder,
    close: async () => {
      await new Promise((done) => { server.close(done); server.closeAllConnections(); });
      rmSync(work, { recursive: true, force: true });
    },
  };
}

export async function openBrowser(): Promise<Browser> {
  const executablePath = findChromium();
  if (executablePath === null) throw new Error('no Chromium found: install it (apt-get install chromium) or set CHROME_PATH');
  return chromium.launch({
    executablePath,
    args: ['--headless', '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'],
  });
}

/** A page that collects what should not happen: console lines, errors, dialogues and requests to other hosts. */
export async function watchedPage(browser: Browser, site: ServedSite, options: BrowserContextOptions = {}): Promise<{ readonly page: Page; readonly trouble: string[] }> {
  const page = await (await browser.newContext(options)).newPage();
  const trouble: string[] = [];
  const host = new URL(site.address).host;
  page.on('console', (message) => trouble.push(`console: ${message.text()}`));
  page.on('pageerror', (error) => trouble.push(`error: ${error.message}`));
  page.on('dialog', (dialog) => { trouble.push(`dialogue: ${dialog.message()}`); void dialog.dismiss(); });
  page.on('request', (request) => {
    const { protocol, host: asked } = new URL(request.url());
    if (protocol.startsWith('http') && asked !== host) trouble.push(`request: ${request.url()}`);
  });
  return { page, trouble };
}

/** Every HTML file of the site with its address from the base path, in order. */
export function builtPages(site: ServedSite): readonly { readonly path: string; readonly html: string }[] {
  return readdirSync(site.folder, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.html')).sort()
    .map((name) => ({ path: name.replace(/index\.html$/, ''), html: readFileSync(join(site.folder, name), 'utf8') }));
}

/** One page of each kind. */
export const PAGE_KINDS = ['', 'complexes/cr-am6/', 'complexes/cr-aq6/', 'complexes/ti-aq6/', 'ions/', 'ions/cr-iii/', 'ligands/', 'ligands/ammine/', 'series/', 'series/factors/', 'series/predictions/', 'series/orders/', 'series/correlation/', 'methods/', 'review/', 'cautions/', 'cautions/perchlorate/', 'changes/', 'compare/', 'predict/', 'data/', '404.html'] as const;
