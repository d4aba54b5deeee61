import { auditQuoted, complexCautions, concise, disagreesFrom, freeIon, plain } from '#engine';
import type { AuditRow, Caution, Reading } from '#engine';
import type { ComplexRecord, LigandRecord, MeasurementRecord } from '../../content/types.ts';
import type { Row } from './row.ts';

/** One measurement with its chosen reading and the audit of its quoted values. */
export interface ReadRecord {
  readonly measurement: MeasurementRecord;
  readonly chosen: Reading;
  /** By quoted entry, in the order typed. */
  readonly audits: readonly (readonly AuditRow[])[];
}

export function readRecord(measurement: MeasurementRecord, chosen: Reading): ReadRecord {
  const { engine, policy } = measurement;
  const audits = measurement.quoted.map((quoted) => auditQuoted(engine, policy, freeIon(policy.freeIons, engine.ion), chosen, quoted));
  return { measurement, chosen, audits };
}

export function auditRows(complex: string, { measurement, audits }: ReadRecord): Row[] {
  return audits.flatMap((rows, index) => rows.map(({ parameter, quoted, refitted, uTotal, difference, z, cause }) => ({
    complex, measurement: measurement.id, number: index + 1, parameter, quoted, refitted, u_total: uTotal, difference, z, cause,
  })));
}

/** Quoted numbers that disagree, in words: "Delta 21600 against 22130(170)". */
export function disagreements({ audits }: ReadRecord): readonly string[] {
  return audits.flat().filter(({ z }) => z !== null && Math.abs(z) > disagreesFrom).map(({ parameter, quoted, refitted, uTotal, cause }) => {
    const digits = parameter === 'beta' ? 3 : 0;
    return `${parameter} ${plain(quoted, digits, 'page')} against ${concise(refitted!, uTotal, 'page')}${cause === null ? '' : ` (${cause.replace(/\.$/, '')})`}`;
  });
}

/** Cautions that need all measurements of a complex, or its ligands, by measurement id. */
export function cautionsOfComplex(complex: ComplexRecord, ligands: readonly LigandRecord[], records: readonly ReadRecord[]): ReadonlyMap<string, readonly Caution[]> {
  const bound = complex.ligands.map(({ ligand, count, bound: donors }) => ({ chelate: donors === 2 && ligands.some(({ id }) => id === ligand), count }));
  const number = (reading: Reading, name: 'Delta' | 'B') => {
    const found = reading.parameters.find((parameter) => parameter.name === name);
    return found?.value == null || found.u === null ? null : { value: found.value, u: found.u };
  };
  return complexCautions({
    trisChelate: complex.geometry === 'octahedral' && bound.reduce((sum, { chelate, count }) => sum + (chelate ? count : 0), 0) === 3,
    measurements: records.map((record) => ({
      id: record.measurement.id, phase: record.measurement.engine.phase, temperature: record.measurement.engine.temperature,
      delta: number(record.chosen, 'Delta'), racahB: number(record.chosen, 'B'), quotedDisagrees: disagreements(record),
    })),
  });
}
