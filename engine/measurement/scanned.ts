import type { Range } from '../quantity/range.ts';

/** How far beyond the typed end of a scan a band may be read: ends are round numbers, and the foot of a band shows its middle. */
const beyondScan = 0.05;

/**
 * Whether a band can have been read from what was scanned: its position, or where it falls to half its height, lies inside or within
 * 5 % of an end. A scan of nothing holds no band.
 *
 * @param width full width at half height, cm-1; null: not recorded
 */
export function couldBeSeen(position: number, width: number | null, scanned: readonly Range[]): boolean {
  const half = (width ?? 0) / 2;
  return scanned.some(({ low, high }) => position + half > low * (1 - beyondScan) && position - half < high * (1 + beyondScan));
}
