import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from 'playwright-core';

const script = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
const TAGS = ['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa', 'best-practice'];

interface AxeResult { readonly violations: readonly { readonly id: string; readonly nodes: readonly { readonly html: string }[] }[] }

/**
 * What axe finds on the page as it stands: "id: the first elements".
 * @param exclude selector of what need not be looked at
 */
export async function violationsOf(page: Page, exclude: string | null = null): Promise<readonly string[]> {
  if (!(await page.evaluate(() => 'axe' in globalThis))) await page.evaluate(script);
  const { violations } = await page.evaluate(
    async ([tags, left]) => (globalThis as unknown as { axe: { run: (context: unknown, options: unknown) => Promise<AxeResult> } }).axe.run(
      left === null ? document : { include: [['html']], exclude: [[left]] }, { runOnly: { type: 'tag', values: tags }, resultTypes: ['violations'] },
    ), [TAGS, exclude] as const,
  );
  return violations.map(({ id, nodes }) => `${id}: ${nodes.slice(0, 3).map(({ html }) => html.slice(0, 160)).join(' | ')}`);
}

/** Rows beyond these are made by the same function as those before them. */
const moreRows = (looked: number): string => `tbody > tr:nth-child(n + ${looked + 1})`;

/** The same by day, by night and at 320 pixels, with the page loaded once. */
export async function violationsEverywhere(page: Page): Promise<readonly string[]> {
  const found: string[] = [];
  for (const [colorScheme, width] of [['light', 1280], ['dark', 1280], ['light', 320]] as const) {
    await page.emulateMedia({ colorScheme });
    await page.setViewportSize({ width, height: 900 });
    found.push(...(await violationsOf(page, moreRows(colorScheme === 'light' && width > 320 ? 40 : 10))).map((one) => `${colorScheme} ${width} ${one}`));
  }
  await page.emulateMedia({ colorScheme: 'light' });
  await page.setViewportSize({ width: 1280, height: 900 });
  return found;
}
