import { policyId, spinName } from '#engine';
import type { Band, HazardCaution, Range } from '#engine';
import type { BandRecord, ComplexRecord, MeasurementRecord, QuotedRecord } from '../../content/types.ts';
import { flag, list, mergeTables } from './row.ts';
import type { Row, Tables } from './row.ts';

const quotedParameters = ['Delta', 'Dq', 'B', 'C', 'beta'] as const;

/**
 * Rows of what was typed for one complex: complex, ligands, hazards, measurements, ranges, bands, quoted values.
 * `multiplicity` is the one that was typed or that the ion and geometry leave; null where neither says.
 */
export function complexRows(complex: ComplexRecord, multiplicity: number | null, hazards: readonly HazardCaution[]): Tables {
  return mergeTables([
    {
      complex: [complexRow(complex, multiplicity)],
      complex_ligand: complex.ligands.map((entry, index) => ({
        complex: complex.id, ligand: entry.ligand, number: index + 1, count: entry.count, bound: entry.bound,
      })),
      caution: hazards.map((hazard, index) => ({
        complex: complex.id, number: index + 1, subject: 'hazard', measurement: null, reading: null,
        code: hazard.code, found_in: hazard.foundIn, text: hazard.text,
      })),
      hazard_override: Object.entries(complex.hazardOverrides).map(([code, reason]) => ({ complex: complex.id, code, reason })),
    },
    ...complex.measurements.map((measurement, index) => measurementRows(complex.id, measurement, index + 1)),
  ]);
}

function complexRow(complex: ComplexRecord, multiplicity: number | null): Row {
  return {
    id: complex.id, file: complex.file, hash: complex.hash, formula: complex.formula, name: complex.name,
    charge: complex.charge, charge_note: complex.chargeNote,
    ion: complex.ion.name, geometry: complex.geometryName, fitted: flag(complex.geometry !== null),
    isomer: complex.isomer, spin: multiplicity === null ? null : spinName(multiplicity), multiplicity, spin_typed: complex.spinTyped,
    spin_assumed: flag(complex.spinAssumed), notes: complex.notes,
  };
}

function measurementRows(complex: string, record: MeasurementRecord, number: number): Tables {
  const measurement = record.id;
  return {
    measurement: [measurementRow(complex, record, number)],
    observed_range: [
      ...rangeRows(complex, measurement, 'scanned', record.engine.scanned, []),
      ...rangeRows(complex, measurement, 'absent', record.engine.absent, record.absentNotes),
    ],
    band: record.engine.bands.map((band, index) => bandRow(complex, measurement, index, band, record.bands)),
    quoted: record.quoted.flatMap((quoted, index) => quotedRows(complex, measurement, index + 1, quoted)),
  };
}

function measurementRow(complex: string, record: MeasurementRecord, number: number): Row {
  const { engine } = record;
  return {
    complex, id: record.id, number, sample: record.sample, phase: engine.phase, medium: record.medium, host: record.host,
    temperature_K: engine.temperature, temperature_u_K: record.temperatureU, temperature_typed: record.temperatureTyped,
    temperature_assumed: flag(record.temperatureAssumed), technique: engine.technique, scanned_typed: record.scannedTyped,
    notebook: record.notebook, measured_by: record.by, measured_on: record.date, source: record.cite, source_place: record.where,
    concentration: record.concentration, path_length: record.pathLength, batch: record.batch,
    raw_file: record.rawFile, raw_hash: record.rawHash, magnetic_moment: record.magneticMoment, epr_g: record.eprG,
    innocence_doubtful: flag(engine.innocenceDoubtful), nuclearity: engine.nuclearity,
    policy: policyId(record.policy), policy_reason: record.policyReason, notes: record.notes,
  };
}

function rangeRows(
  complex: string, measurement: string, kind: 'scanned' | 'absent', ranges: readonly Range[], notes: readonly (string | null)[],
): Row[] {
  return ranges.map(({ low, high }, index) => ({ complex, measurement, kind, number: index + 1, low, high, notes: notes[index] ?? null }));
}

function bandRow(complex: string, measurement: string, index: number, band: Band, typed: readonly BandRecord[]): Row {
  const record = typed[index];
  if (record === undefined) throw new RangeError(`${complex}/${measurement}: ${typed.length} typed bands for band ${index + 1}`);
  return {
    complex, measurement, number: index + 1, position_typed: record.positionTyped, position: band.position,
    u_minus: band.uMinus, u_plus: band.uPlus, half_digit: band.halfDigit, coverage_not_stated: flag(band.coverageNotStated),
    kind: band.kind, side: band.side, width_typed: record.widthTyped, width: band.width, epsilon: band.epsilon,
    strength: band.strength, degeneracy: band.degeneracy, deconvoluted: flag(band.deconvoluted), role: band.role,
    terms: list(band.terms), left_out: band.leftOut, notes: record.notes,
  };
}

function quotedRows(complex: string, measurement: string, number: number, quoted: QuotedRecord): Row[] {
  return quotedParameters.flatMap((parameter) => {
    const value = quoted[parameter];
    if (value === null) return [];
    return [{
      complex, measurement, number, parameter, value, typed: quoted.typed[parameter] ?? String(value),
      source: quoted.cite, source_place: quoted.where,
    }];
  });
}
