import { plain, significant } from '../quantity/print.ts';
import type { PrintForm } from '../quantity/print.ts';

/** One transition of a fit under stress; null where there is no such number. */
export interface StressedBand {
  readonly label: string;
  readonly leverage: number | null;
  /** Derivatives of the transition by Delta, B and C at the fit. */
  readonly by: readonly [delta: number | null, racahB: number | null, racahC: number | null];
  /** What the other bands give without it, where that puts it, and how many u from where it was read. */
  readonly without: { readonly delta: number | null; readonly racahB: number | null; readonly predicted: number | null; readonly z: number | null } | null;
}

/** What a column of the table holds; page and terminal set its head in their own type. */
export type StressColumn = 'leverage' | 'by Delta' | 'by B' | 'by C' | 'Delta without' | 'B without' | 'put at' | 'z';

/** The table of bands under stress as it is printed. */
export interface StressTable {
  readonly caption: string;
  readonly columns: readonly StressColumn[];
  readonly rows: readonly { readonly label: string; readonly cells: readonly string[] }[];
}

/** Stands where there is no number. */
export const noStress = 'none';

/** A transition that moves by less than this with C is said not to move with it. */
const feltC = 5e-4;

/** Each band of a fit: how much hangs on it, what it moves with, and, where bands were left out, what the others give without it. Null: no band has a weight. */
export function stressTable(bands: readonly StressedBand[], form: PrintForm): StressTable | null {
  const weighed = bands.filter(({ leverage }) => leverage !== null);
  if (weighed.length === 0) return null;
  const tried = weighed.some(({ without }) => without !== null);
  const withC = weighed.some(({ by: [, , racahC] }) => racahC !== null && Math.abs(racahC) > feltC);
  const number = (value: number | null | undefined, decimals: number): string => (value === null || value === undefined ? noStress : plain(value, decimals, form));
  const columns: readonly (readonly [StressColumn, (band: StressedBand) => string])[] = [
    ['leverage', ({ leverage }) => number(leverage, 2)],
    ['by Delta', ({ by: [delta] }) => number(delta, 2)],
    ['by B', ({ by: [, racahB] }) => number(racahB, 1)],
    ...(withC ? [['by C', ({ by: [, , racahC] }: StressedBand) => number(racahC, 1)] as const] : []),
    ...(tried ? [
      ['Delta without', ({ without }: StressedBand) => number(without?.delta, 0)] as const,
      ['B without', ({ without }: StressedBand) => number(without?.racahB, 0)] as const,
      ['put at', ({ without }: StressedBand) => number(without?.predicted, 0)] as const,
      ['z', ({ without }: StressedBand) => number(without?.z, 1)] as const,
    ] : []),
  ];
  return {
    caption: tried ? 'Each band under stress: its weight in the fit, then the fit without it and where that puts it' : 'Each band’s weight in the fit',
    columns: columns.map(([name]) => name),
    rows: weighed.map((band) => ({ label: band.label, cells: columns.map(([, cell]) => cell(band)) })),
  };
}

/** What the table of pairs shows. */
export const pairsCaption = 'Each pair alone: Δ; B, in cm⁻¹';

/** Delta and B of one pair alone, as its place in the table holds them; null: the pair has no solution. */
export function pairAlone(at: { readonly delta: number; readonly racahB: number } | null, form: PrintForm): string {
  return at === null ? noStress : `${plain(at.delta, 0, form)}; ${significant(at.racahB, 3, form)}`;
}
