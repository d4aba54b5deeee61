import { existsSync } from 'node:fs';
import Database from 'better-sqlite3';
import { aquaLigand, comparisonCautions, parametersByName, policyId, usedTransitions } from '#engine';
import type { ComparedCollection, ComplexIdentity, Ion, Policy, SeriesNumber, SeriesResult } from '#engine';
import type { LigandRecord } from '../content/types.ts';
import { engineHash } from '../database/fingerprint.ts';
import { UsageError } from '../runCommand.ts';

/** A collection's database as `compare` needs it. */
export interface StoredCollection {
  readonly compared: ComparedCollection;
  readonly policy: Policy;
  readonly ligands: readonly LigandRecord[];
  readonly sources: readonly string[];
  readonly complexes: number;
  /** true where the results were fitted by another version of the engine than this one. */
  readonly otherEngine: boolean;
}

/** Reads the database file. Throws UsageError where there is none. */
export function readStoredCollection(file: string): StoredCollection {
  if (!existsSync(file)) throw new UsageError(`There is no database ${file}. Run "npm run refit" first.`);
  const database = new Database(file, { readonly: true, fileMustExist: true });
  try {
    return storedCollection(database);
  } finally {
    database.close();
  }
}

type Rows<T> = readonly T[];

function storedCollection(database: Database.Database): StoredCollection {
  const all = <T>(sql: string): Rows<T> => database.prepare(sql).all() as T[];
  const policy = policyInForce(all<PolicyRow>('SELECT * FROM policy WHERE in_force = 1'));
  const ligands = all<LigandRow>('SELECT * FROM ligand').map((row): LigandRecord => ({
    ...row, synonyms: JSON.parse(row.synonyms) as string[], donors: JSON.parse(row.donors) as string[],
  }));
  const results = seriesResults(all);
  const engine = all<{ value: string }>("SELECT value FROM meta WHERE key = 'engine'")[0]?.value;
  return {
    compared: { policy: { id: policyId(policy), differentialFloor: policy.differentialFloor }, aqua: aquaLigand(ligands), results },
    policy, ligands, sources: all<{ id: string }>('SELECT id FROM source').map(({ id }) => id),
    complexes: new Set(results.map(({ complex }) => complex.id)).size, otherEngine: engine !== engineHash(),
  };
}

/** The chosen reading of every measurement of the database, in the order of their keys. */
function seriesResults(all: <T>(sql: string) => Rows<T>): readonly SeriesResult[] {
  const ions = new Map(all<IonRow>('SELECT * FROM ion').map(({ shell, ...ion }): [string, Ion] => [ion.name, { ...ion, row: shell }]));
  const ligands = grouped(all<ComplexLigandRow>('SELECT complex, ligand, count, bound FROM complex_ligand ORDER BY complex, number'), ({ complex }) => complex);
  const complexes = new Map(all<ComplexRow>('SELECT id, formula, ion, geometry, fitted, multiplicity, isomer FROM complex').map((row): [string, ComplexIdentity] => [row.id, {
    id: row.id, formula: row.formula, ion: ions.get(row.ion)!, geometry: row.fitted === 1 ? (row.geometry as ComplexIdentity['geometry']) : null, geometryName: row.geometry,
    multiplicity: row.multiplicity, isomer: row.isomer, ligands: (ligands.get(row.id) ?? []).map(({ ligand, count, bound }) => ({ ligand, count, bound })),
  }]));
  const key = ({ complex, measurement }: { readonly complex: string; readonly measurement: string }): string => `${complex}/${measurement}`;
  const chosen = 'JOIN reading r ON r.complex = t.complex AND r.measurement = t.measurement AND r.number = t.reading WHERE r.chosen = 1';
  const numbers = grouped(all<ParameterRow>(`SELECT t.* FROM parameter t ${chosen}`), key);
  const bands = grouped(all<BandRow>(`SELECT t.complex, t.measurement, t.label, t.used FROM reading_band t ${chosen}`), key);
  const correlations = new Map(all<CorrelationRow>(`SELECT t.* FROM correlation t ${chosen} AND t.first = 'Delta' AND t.second = 'B'`).map((row) => [key(row), row.value]));
  const cautions = grouped(all<CautionRow>(`SELECT t.complex, t.measurement, t.code FROM caution t ${chosen} AND t.subject = 'spectral' ORDER BY t.complex, t.number`), key);
  const measurements = all<MeasurementRow>(`
    SELECT m.complex, m.id, m.phase, m.temperature_K, r.policy, r.verdict FROM measurement m
    JOIN reading r ON r.complex = m.complex AND r.measurement = m.id WHERE r.chosen = 1 ORDER BY m.complex, m.number`);
  return measurements.map((row) => {
    const id = key({ complex: row.complex, measurement: row.id });
    return {
      complex: complexes.get(row.complex)!, measurement: row.id, phase: row.phase, temperature: row.temperature_K, policy: row.policy, verdict: row.verdict,
      parameters: parametersByName((numbers.get(id) ?? []).map(({ name, value, u, u_total, standing, reason }) => ({ name, value, u, uTotal: u_total, standing, reason }))),
      correlation: correlations.get(id) ?? null,
      transitions: usedTransitions((bands.get(id) ?? []).map(({ label, used }) => ({ label, used: used === 1 }))),
      cautions: comparisonCautions((cautions.get(id) ?? []).map(({ code }) => code)),
    };
  });
}

function policyInForce([row]: Rows<PolicyRow>): Policy {
  if (row === undefined) throw new Error('the database names no policy in force');
  const policy: Policy = {
    name: row.name,
    cOverB: { general: { value: row.C_over_B, u: row.C_over_B_u }, perIon: JSON.parse(row.C_over_B_per_ion) as Policy['cOverB']['perIon'] },
    cFitted: row.C_fitted === 1,
    floors: { general: row.floor_general, spinFlip: row.floor_spin_flip, twoElectron: row.floor_two_electron },
    ceilings: { delta: row.ceiling_Delta, racahB: row.ceiling_B, racahC: row.ceiling_C },
    differentialFloor: { delta: row.differential_Delta, racahB: row.differential_B },
    freeIons: row.free_ion_set, rivalMargin: row.rival_margin,
    defaultUncertainties: { maximum: row.default_u_maximum, line: row.default_u_line },
  };
  if (policyId(policy) !== row.id) throw new Error(`the database's policy ${row.id} cannot be read by this version; run "npm run refit"`);
  return policy;
}

function grouped<T>(rows: Rows<T>, key: (row: T) => string): ReadonlyMap<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const row of rows) {
    const group = groups.get(key(row));
    if (group) group.push(row);
    else groups.set(key(row), [row]);
  }
  return groups;
}

interface IonRow extends Omit<Ion, 'row'> { readonly shell: Ion['row'] }
interface LigandRow extends Omit<LigandRecord, 'synonyms' | 'donors'> { readonly synonyms: string; readonly donors: string }
interface ComplexLigandRow { readonly complex: string; readonly ligand: string; readonly count: number; readonly bound: number }
interface ComplexRow {
  readonly id: string; readonly formula: string; readonly ion: string; readonly geometry: string; readonly fitted: 0 | 1;
  readonly multiplicity: number | null; readonly isomer: string;
}
interface OfMeasurement { readonly complex: string; readonly measurement: string }
interface ParameterRow extends OfMeasurement {
  readonly name: 'Delta' | 'B' | 'C' | 'beta'; readonly value: number | null; readonly u: number | null; readonly u_total: number | null;
  readonly standing: SeriesNumber['standing']; readonly reason: string | null;
}
interface BandRow extends OfMeasurement { readonly label: string; readonly used: 0 | 1 }
interface CorrelationRow extends OfMeasurement { readonly value: number }
interface CautionRow extends OfMeasurement { readonly code: string }
interface MeasurementRow {
  readonly complex: string; readonly id: string; readonly phase: SeriesResult['phase']; readonly temperature_K: number | null;
  readonly policy: string; readonly verdict: SeriesResult['verdict'];
}
interface PolicyRow {
  readonly id: string; readonly name: string; readonly C_over_B: number; readonly C_over_B_u: number; readonly C_over_B_per_ion: string; readonly C_fitted: 0 | 1;
  readonly floor_general: number; readonly floor_spin_flip: number; readonly floor_two_electron: number;
  readonly ceiling_Delta: number; readonly ceiling_B: number; readonly ceiling_C: number;
  readonly differential_Delta: number; readonly differential_B: number; readonly free_ion_set: Policy['freeIons']; readonly rival_margin: number;
  readonly default_u_maximum: number; readonly default_u_line: number;
}
