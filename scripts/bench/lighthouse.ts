import { mkdirSync } from 'node:fs';
import { createServer } from 'node:net';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import lighthouse from 'lighthouse';
import { chromium } from 'playwright-core';
import { addressOf } from '../publish/address.ts';
import { createSiteServer } from '../publish/staticServer.ts';
import { findChromium } from '../test/chromium.ts';
import { runWatched } from './process.ts';
import type { Measured } from './stopwatch.ts';

/** One page of each of five kinds of the demonstration. */
const pages = [['collection', ''], ['complex', 'complexes/cr-am6/'], ['ion', 'ions/cr-iii/'], ['series', 'series/'], ['compare', 'compare/']] as const;
const categories = ['performance', 'accessibility', 'best-practices', 'seo'] as const;

/** Scores of Lighthouse, 0 to 100, of five pages of the built collection, as a phone with a slow line sees them; nothing where there is no Chromium. */
export async function measureLighthouse(folder: string, groupUrl: string, say: (lines: readonly Measured[]) => void): Promise<void> {
  const executablePath = findChromium();
  if (executablePath === null) return;
  const site = join(folder, 'site');
  mkdirSync(site, { recursive: true });
  await runWatched([join('scripts', 'require-node.mjs'), join('scripts', 'build.ts'), '--database', join(folder, 'collection.sqlite'), '--out', site, '--json'], {});
  const { base } = addressOf(groupUrl);
  const server = createSiteServer(site, base);
  await new Promise<void>((done) => { server.listen(0, '127.0.0.1', done); });
  const port = await freePort();
  const browser = await chromium.launch({ executablePath, args: [`--remote-debugging-port=${port}`, '--headless', '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'] });
  try {
    for (const [kind, path] of pages) {
      const result = await lighthouse(`http://127.0.0.1:${(server.address() as AddressInfo).port}${base}${path}`, { port, onlyCategories: [...categories], output: 'json', logLevel: 'error' });
      if (result === undefined) throw new Error(`Lighthouse gave no result for ${path}`);
      say(categories.map((name) => ({ name: `${kind}, ${name}`, value: 100 * (result.lhr.categories[name]?.score ?? 0), unit: 'of 100', over: missed(result.lhr, name) })));
    }
  } finally {
    await browser.close();
    server.close();
    server.closeAllConnections();
  }
}

interface Report {
  readonly categories: Readonly<Record<string, { readonly auditRefs: readonly { readonly id: string; readonly weight: number }[] }>>;
  readonly audits: Readonly<Record<string, { readonly title: string; readonly score: number | null }>>;
}

/** What kept a category from 100. */
function missed({ categories: all, audits }: Report, name: string): string {
  const low = (all[name]?.auditRefs ?? []).filter(({ id, weight }) => weight > 0 && (audits[id]?.score ?? 1) < 0.9).map(({ id }) => audits[id]!.title);
  return low.length === 0 ? 'nothing missed' : low.join('; ');
}

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as AddressInfo;
      probe.close(() => resolve(port));
    });
  });
}
