import type { BandKind } from '#engine';
import type { ResultRow } from '../../components/resultRow.ts';
import { listed, ratio } from '../../data/show.ts';
import type { FormulaShown } from '../../data/typeset.ts';
import type { StripBand } from '../../charts/strip.ts';

/** So many rows stand in one file of rows, and on one built page. */
export const SLICE_ROWS = 200;

/** What a row shows beside what search knows of it: conditions, Delta, B and beta as printed (0: withheld), scanned, absent, bands. */
export type PackedRow = readonly [
  conditions: string, delta: string | 0, racahB: string | 0, beta: string | 0,
  scanned: readonly PackedRange[], absent: readonly PackedRange[], bands: readonly PackedBand[],
];
type PackedRange = readonly [low: number, high: number];

/** Position, kind's place, side (-1, 0, 1), fitted, width or 0. */
type PackedBand = readonly [position: number, kind: number, side: -1 | 0 | 1, fitted: 0 | 1, width: number];

const KINDS: readonly BandKind[] = ['maximum', 'shoulder', 'line', 'zero-phonon', 'dip', 'centroid', 'component', 'envelope'];

/** Positions are whole wavenumbers: the strip is not drawn finer. */
export function packRow({ conditions, delta, racahB, beta, strip }: ResultRow): PackedRow {
  const whole = (ranges: readonly { readonly low: number; readonly high: number }[]): PackedRange[] => ranges.map(({ low, high }) => [Math.round(low), Math.round(high)]);
  return [
    conditions, delta ?? 0, racahB ?? 0, beta ?? 0, whole(strip.scanned), whole(strip.absent),
    strip.bands.map(({ position, kind, side, fitted, width }): PackedBand => [Math.round(position), KINDS.indexOf(kind), side === 'higher' ? 1 : side === 'lower' ? -1 : 0, fitted ? 1 : 0, Math.round(width ?? 0)]),
  ];
}

/** What search knows of a row. */
export type KnownOfRow = Pick<ResultRow, 'complex' | 'measurement' | 'ion' | 'verdict'> & { readonly formula: FormulaShown };

export function unpackRow([conditions, delta, racahB, beta, scanned, absent, bands]: PackedRow, known: KnownOfRow): ResultRow {
  const range = ([low, high]: PackedRange) => ({ low, high });
  const drawn = bands.map(([position, kind, side, fitted, width]): StripBand => ({
    position, kind: KINDS[kind]!, side: side === 0 ? null : side > 0 ? 'higher' : 'lower', fitted: fitted === 1, width: width || null,
  }));
  return {
    ...known, conditions, delta: delta || null, racahB: racahB || null, beta: beta || null, stripTitle: stripTitleOf(drawn),
    strip: { bands: drawn, scanned: scanned.map(range), absent: absent.map(range) },
  };
}

/** The strip in words. */
export function stripTitleOf(bands: readonly { readonly position: number; readonly kind: string }[]): string {
  if (bands.length === 0) return 'No band recorded';
  return `Bands at ${listed(bands.map(({ position, kind }) => `${ratio(position, 0)}${kind === 'maximum' ? '' : ` (${kind})`}`))} cm⁻¹`;
}
