import type { Page } from 'playwright-core';

interface Shift { readonly value: number; readonly hadRecentInput: boolean; readonly sources?: readonly { readonly node?: Node | null }[] }

/** From now on every page opened in this tab notes what moves in it without the reader's doing. */
export async function watchShifts(page: Page): Promise<void> {
  await page.addInitScript(() => {
    const noted: string[] = [];
    (globalThis as unknown as { shifts: string[] }).shifts = noted;
    new PerformanceObserver((list) => {
      for (const entry of list.getEntries() as unknown as readonly Shift[]) {
        if (entry.hadRecentInput) continue;
        const moved = (entry.sources ?? []).map(({ node }) => (node instanceof Element ? node.outerHTML.slice(0, 80) : node?.textContent?.slice(0, 40) ?? 'something'));
        noted.push(`${entry.value.toFixed(4)}: ${moved.join(' | ')}`);
      }
    }).observe({ type: 'layout-shift', buffered: true });
  });
}

/** What moved on the page since it was opened: its score and the parts that moved. */
export const shiftsOf = (page: Page): Promise<readonly string[]> => page.evaluate(() => new Promise<readonly string[]>((done) => {
  requestAnimationFrame(() => requestAnimationFrame(() => done((globalThis as unknown as { shifts: string[] }).shifts)));
}));
