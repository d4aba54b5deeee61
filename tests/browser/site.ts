import { mkdirSync, mkdtempSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { type Browser, type BrowserContextOptions, type Page, chromium } from 'playwright-core';
import { inject } from 'vitest';
import { writePublication } from '../../scripts/export/writePublication.ts';
import { buildPages } from '../../scripts/publish/pages.ts';
import { createSiteServer } from '../../scripts/publish/staticServer.ts';
import { findChromium } from '../../scripts/test/chromium.ts';
import { sharedFolder } from '../run/shared.ts';
import { SAMPLES, sampleRecordText, writeSampleDatabase } from '../site/sampleDatabase.ts';

/** The sample collection built and served, as a visitor finds it. */
export interface ServedSite {
  /** "http://127.0.0.1:PORT/bands/" */
  readonly address: string;
  readonly folder: string;
  readonly close: () => Promise<void>;
}

/** The sample built under a base path, once a run, and served. */
export async function servedSite(base: string): Promise<ServedSite> {
  const folder = await sharedFolder(`sample-${base.replaceAll('/', '') || 'root'}`, (made) => buildSite(made, base, {}));
  return serve(folder, base);
}

/** A sample of one test's own: other text in it, or no complexes. */
export async function servedSample(base: string, options: NonNullable<Parameters<typeof writeSampleDatabase>[1]>): Promise<ServedSite> {
  const folder = mkdtempSync(join(inject('runFolder'), 'own-'));
  await buildSite(folder, base, options);
  return serve(folder, base);
}

async function buildSite(folder: string, base: string, options: NonNullable<Parameters<typeof writeSampleDatabase>[1]>): Promise<void> {
  const database = writeSampleDatabase(join(folder, 'collection.sqlite'), options);
  await buildPages(database, { origin: 'https://example.org', base }, join(folder, 'dist'));
  const content = join(folder, 'content');
  mkdirSync(join(content, 'complexes'), { recursive: true });
  for (const { id } of SAMPLES) writeFileSync(join(content, 'complexes', `${id}.yaml`), sampleRecordText(id));
  writePublication(database, content, join(folder, 'dist'));
}

/** Serves `folder`/dist under the base path. */
export async function serve(folder: string, base: string): Promise<ServedSite> {
  const dist = join(folder, 'dist');
  const server = createSiteServer(dist, base);
  await new Promise<void>((done) => { server.listen(0, '127.0.0.1', done); });
  return {
    address: `http://127.0.0.1:${(server.address() as AddressInfo).port}${base}`, folder: dist,
    close: async () => {
      await new Promise((done) => { server.close(done); server.closeAllConnections(); });
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
export const PAGE_KINDS = ['', 'complexes/cr-am6/', 'complexes/cr-aq6/', 'complexes/ti-aq6/', 'ions/', 'ions/cr-iii/', 'ligands/', 'ligands/ammine/', 'series/', 'series/factors/', 'series/predictions/', 'series/orders/', 'series/correlation/', 'methods/', 'review/', 'cautions/', 'cautions/perchlorate/', 'changes/', 'compare/', 'predict/', 'data/', 'data/dictionary/', '404.html'] as const;
