import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { chromium } from 'playwright-core';
import { createSiteServer } from '../publish/staticServer.ts';
import { findChromium } from '../test/chromium.ts';
import { median } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

const strokes = 40;
const typed = 'compare/?ion=Cr(III)&band=13740(10) cm-1|line|2Eg&band=22140(100) cm-1||4T2g&band=28950(90) cm-1||4T1g(F)';

/**
 * From a keystroke in the compare page of a built site to the refreshed reading on it, in Chromium: what the page does for the event, and
 * the same with the layout of what it wrote. Nothing where there is no Chromium.
 *
 * @param base path under which the site was built
 */
export async function measureKeystroke(folder: string, base: string): Promise<Measured[]> {
  const executablePath = findChromium();
  if (executablePath === null) return [];
  const server = createSiteServer(join(folder, 'site'), base);
  await new Promise<void>((done) => { server.listen(0, '127.0.0.1', done); });
  const browser = await chromium.launch({ executablePath, args: ['--headless', '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'] });
  try {
    const page = await browser.newPage();
    await page.goto(`http://127.0.0.1:${(server.address() as AddressInfo).port}${base}${typed}`);
    await page.locator('[data-place=reading] table').first().waitFor();
    const times = await page.getByLabel('Band 3: position', { exact: true }).evaluate((input, count) => Array.from({ length: count }, (_, step) => {
      (input as HTMLInputElement).value = `${28950 + step}(90) cm-1`;
      const start = performance.now();
      input.dispatchEvent(new Event('input', { bubbles: true }));
      const written = performance.now();
      void document.body.offsetHeight;
      return [written - start, performance.now() - start] as const;
    }), strokes);
    // The first strokes run code that has not been compiled.
    const settled = times.slice(strokes / 4);
    const over = `three bands in the compare page, the middle of ${settled.length}, Chromium`;
    return [
      { name: 'keystroke to reading', value: median(settled.map(([written]) => written)), unit: 'ms', over },
      { name: 'keystroke, laid out', value: median(settled.map(([, laidOut]) => laidOut)), unit: 'ms', over },
    ];
  } finally {
    await browser.close();
    server.close();
    server.closeAllConnections();
  }
}
