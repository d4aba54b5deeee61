// A complex record turned from what was typed into what the rest of the project reads.

import { donorCount, toWavenumber } from '#engine';
import type { Policy, Quantity } from '#engine';
import type { z } from 'zod';
import type { OpenedFile } from '../files.ts';
import type { complexSchema } from '../schema/complex.ts';
import { fittedGeometry, resolvedSpin } from '../spin.ts';
import type { ComplexRecord, LigandRecord, MeasurementRecord, QuotedRecord } from '../types.ts';
import { engineMeasurement } from './measurement.ts';
import { overriddenPolicy } from './policy.ts';

export type ComplexFile = z.output<typeof complexSchema>;
export type MeasurementFile = NonNullable<ComplexFile['measurements']>[number];

/**
 * The record of a complex. Expects what the checks have passed: known ligands, a spin that fits.
 * @param ligands the collection's ligand records by id
 */
export function complexRecord({ id, file, hash }: OpenedFile, typed: ComplexFile, ligands: ReadonlyMap<string, LigandRecord>, policy: Policy): ComplexRecord {
  const bound = Object.entries(typed.ligands).map(([ligand, count]) => ({
    ligand,
    count: typeof count === 'number' ? count : count.count,
    bound: (typeof count === 'number' ? undefined : count.bound) ?? ligands.get(ligand)?.denticity ?? 1,
  }));
  const spin = resolvedSpin(typed.ion.electrons, typed.geometry, typed.spin ?? null);
  return {
    id, file, hash,
    formula: typed.formula,
    name: typed.name ?? null,
    charge: bound.reduce((sum, { ligand, count }) => sum + count * (ligands.get(ligand)?.charge ?? 0), typed.ion.oxidation * (typed.nuclearity ?? 1)),
    chargeNote: typed['charge-note'] ?? null,
    ion: typed.ion,
    geometryName: typed.geometry,
    geometry: fittedGeometry(typed.geometry),
    isomer: typed.isomer ?? 'none',
    ligands: bound,
    spinTyped: typed.spin ?? null,
    multiplicity: spin.multiplicity,
    spinAssumed: spin.assumed,
    notes: typed.notes ?? null,
    hazardOverrides: typed.hazards ?? {},
    measurements: (typed.measurements ?? []).map((measurement) => measurementRecord(typed, measurement, donorCount(bound), policy)),
  };
}

function measurementRecord(complex: ComplexFile, typed: MeasurementFile, donors: number, policy: Policy): MeasurementRecord {
  return {
    id: typed.id,
    engine: engineMeasurement(complex, typed, donors),
    bands: typed.bands.flatMap((band) => ('position' in band
      ? [{ positionTyped: band.position.typed, widthTyped: band.width?.typed ?? null, notes: band.notes ?? null }]
      : [])),
    absentNotes: typed.bands.flatMap((band) => ('absent' in band ? band.absent.ranges.map(() => band.notes ?? null) : [])),
    sample: typed.sample ?? null,
    medium: typed.medium ?? null,
    temperatureTyped: typed.temperature?.typed ?? null,
    temperatureU: typed.temperature?.u ?? null,
    temperatureAssumed: typed.temperature?.assumed ?? false,
    scannedTyped: typed.scanned === undefined ? null : [typed.scanned].flat().map((range) => range.typed).join('; '),
    host: typed.host ?? null,
    notebook: typed.source.notebook ?? null,
    by: typed.source.by ?? null,
    date: typed.source.date ?? null,
    cite: typed.source.cite ?? null,
    where: typed.source.where ?? null,
    concentration: typed.concentration ?? null,
    pathLength: typed['path-length'] ?? null,
    batch: typed.batch ?? null,
    rawFile: typed.raw?.file ?? null,
    rawHash: typed.raw?.sha256 ?? null,
    magneticMoment: typed['magnetic-moment'] ?? null,
    eprG: typed['epr-g'] ?? null,
    notes: typed.notes ?? null,
    quoted: (typed.quoted ?? []).map(quotedRecord),
    policy: typed.policy === undefined ? policy : overriddenPolicy(policy, typed.policy),
    policyReason: typed.policy?.because ?? null,
  };
}

function quotedRecord(typed: NonNullable<MeasurementFile['quoted']>[number]): QuotedRecord {
  const energy = (quantity: Quantity | undefined): number | null => (quantity === undefined ? null : toWavenumber(quantity).position);
  const values = { Delta: typed.Delta, Dq: typed.Dq, B: typed.B, C: typed.C, beta: typed.beta };
  return {
    Delta: energy(typed.Delta),
    Dq: energy(typed.Dq),
    B: energy(typed.B),
    C: energy(typed.C),
    beta: typed.beta?.value ?? null,
    cite: typed.cite,
    where: typed.where ?? null,
    typed: Object.fromEntries(Object.entries(values).flatMap(([name, value]) => (value === undefined ? [] : [[name, value.typed]]))),
  };
}
