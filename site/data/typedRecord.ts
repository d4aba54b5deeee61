import { type TypedBand, type TypedComplex, type TypedMeasurement, parseRange } from '#engine';
import type { BandRow, ObservedRangeRow } from './rows.ts';
import type { MeasurementNode } from './tree.ts';

/**
 * One measurement with its complex as a record, from the database: what a reading depends on word for word where the database
 * keeps the typed text, the rest so that it is read back to the same numbers.
 */
export function typedRecord({ row, complex, bands, absent }: MeasurementNode): TypedComplex {
  const measurement: TypedMeasurement = {
    id: row.id, sample: row.sample, phase: row.phase, medium: row.medium, host: row.host, temperature: row.temperature_typed, technique: row.technique, scanned: row.scanned_typed,
    source: { notebook: row.notebook, by: row.measured_by, date: row.measured_on, cite: row.source, where: row.source_place },
    bands: [...bands.map(typedBand), ...absent.map((range) => ({ absent: rangeText(range) }))],
  };
  return {
    formula: complex.row.formula, name: complex.row.name, ion: complex.ion.name, geometry: complex.row.geometry, isomer: complex.row.isomer === 'none' ? null : complex.row.isomer,
    ligands: Object.fromEntries(complex.ligands.map(({ row: { ligand, count, bound }, ligand: { denticity } }) => [ligand, bound === denticity ? String(count) : { count: String(count), bound: String(bound) }])),
    spin: complex.row.spin_typed, nuclearity: row.nuclearity === 1 ? null : String(row.nuclearity), innocence: row.innocence_doubtful === 1 ? 'doubtful' : null,
    measurements: [measurement],
  };
}

function typedBand(band: BandRow): TypedBand {
  const terms = JSON.parse(band.terms) as string[];
  return {
    position: band.position_typed, kind: band.kind, side: band.side, width: band.width_typed, epsilon: band.epsilon === null ? null : String(band.epsilon), strength: band.strength,
    degeneracy: band.degeneracy === null ? null : String(band.degeneracy), deconvoluted: band.deconvoluted === 1 ? 'true' : null,
    term: band.role === 'transition' ? (terms.length === 0 ? null : terms.length === 1 ? terms[0] : terms) : band.role, 'left-out': band.left_out,
  };
}

/** A stored range as a person would type it: in cm-1, or in nm where it was clearly typed so; all digits where neither is whole. */
export function rangeText({ low, high }: Pick<ObservedRangeRow, 'low' | 'high'>): string {
  const rounded = (value: number, digits: number): string => String(Number(value.toFixed(digits)));
  const candidates = [
    `${rounded(low, 0)} - ${rounded(high, 0)} cm-1`, `${rounded(1e7 / high, 0)} - ${rounded(1e7 / low, 0)} nm`,
    `${rounded(1e7 / high, 1)} - ${rounded(1e7 / low, 1)} nm`, `${rounded(low, 1)} - ${rounded(high, 1)} cm-1`,
  ];
  const same = candidates.find((text) => {
    const read = parseRange(text);
    return read.ok && Math.abs(read.range.low - low) < 1e-6 && Math.abs(read.range.high - high) < 1e-6;
  });
  return same ?? `${rounded(low, 6)} - ${rounded(high, 6)} cm-1`;
}
