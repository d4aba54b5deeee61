// A collection rebuilt from the rows that hold what was typed: the way back from an export to the fits.

import { donorCount, parseIon } from '#engine';
import type { Band, FreeIonSetName, Policy, Range } from '#engine';
import { fittedGeometry, resolvedSpin } from '../content/spin.ts';
import type { ComplexRecord, Collection, Group, LigandRecord, MeasurementRecord, QuotedRecord, SourceRecord } from '../content/types.ts';
import type { SpinName } from '../content/vocabulary.ts';
import type { Row, TableRows } from './tableFiles.ts';

/**
 * The collection of a database's rows. Only rows of what was typed are read (meta, person, policy, ligand, source, complex,
 * complex_ligand, measurement, observed_range, band, quoted, hazard_override); nothing that was fitted enters.
 * @throws Error where no policy is in force, an ion cannot be read, or a row has no parent
 */
export function collectionFromRows(rows: TableRows): Collection {
  const of = (table: string): readonly Row[] => rows[table] ?? [];
  const policies = new Map(of('policy').map((row) => [text(row, 'id'), policyOf(row)]));
  const inForce = of('policy').find((row) => row['in_force'] === 1);
  if (inForce === undefined) throw new Error('policy.csv names no policy in force');
  const find = finder(rows);
  return {
    group: groupOf(of('meta'), of('person')),
    policy: policies.get(text(inForce, 'id'))!,
    policyId: text(inForce, 'id'),
    ligands: of('ligand').map(ligandOf),
    sources: of('source').map(sourceOf),
    complexes: of('complex').map((row) => complexOf(row, find, policies)),
  };
}

type Find = (table: string, complex: string, measurement?: string) => readonly Row[];

const byMeasurement: readonly string[] = ['band', 'observed_range', 'quoted'];
const byComplex: readonly string[] = ['complex_ligand', 'hazard_override', 'measurement'];

function finder(rows: TableRows): Find {
  const found = new Map<string, Row[]>();
  for (const table of [...byComplex, ...byMeasurement]) {
    for (const row of rows[table] ?? []) {
      const key = [table, row['complex'], ...(byMeasurement.includes(table) ? [row['measurement']] : [])].join('/');
      const group = found.get(key);
      if (group === undefined) found.set(key, [row]);
      else group.push(row);
    }
  }
  return (table, ...ids) => inOrder(found.get([table, ...ids].join('/')) ?? []);
}

function text(row: Row, column: string): string {
  return String(row[column]);
}

function orNull<T extends string = string>(row: Row, column: string): T | null {
  const cell = row[column];
  return cell === null || cell === undefined ? null : (String(cell) as T);
}

function number(row: Row, column: string): number {
  return Number(row[column]);
}

function numberOrNull(row: Row, column: string): number | null {
  const cell = row[column];
  return typeof cell === 'number' ? cell : null;
}

function list(row: Row, column: string): string[] {
  return JSON.parse(text(row, column)) as string[];
}

function inOrder(rows: readonly Row[]): Row[] {
  return [...rows].sort((a, b) => number(a, 'number') - number(b, 'number'));
}

function groupOf(meta: readonly Row[], people: readonly Row[]): Group {
  const facts = new Map(meta.map((row) => [text(row, 'key'), text(row, 'value')]));
  const fact = (name: string): string | null => facts.get(`group.${name}`) ?? null;
  return {
    title: fact('title') ?? '', name: fact('name') ?? '', description: fact('description'), contact: fact('contact'),
    people: inOrder(people).map((row) => ({ name: text(row, 'name'), orcid: orNull(row, 'orcid'), initials: orNull(row, 'initials') })),
    licence: fact('licence') ?? '', url: fact('url') ?? '', release: fact('release') ?? '', started: fact('started') ?? '', doi: fact('doi'),
    demonstration: fact('demonstration') === 'true',
  };
}

function policyOf(row: Row): Policy {
  return {
    name: text(row, 'name'),
    cOverB: {
      general: { value: number(row, 'C_over_B'), u: number(row, 'C_over_B_u') },
      perIon: JSON.parse(text(row, 'C_over_B_per_ion')) as Policy['cOverB']['perIon'],
    },
    cFitted: row['C_fitted'] === 1,
    floors: { general: number(row, 'floor_general'), spinFlip: number(row, 'floor_spin_flip'), twoElectron: number(row, 'floor_two_electron') },
    ceilings: { delta: number(row, 'ceiling_Delta'), racahB: number(row, 'ceiling_B'), racahC: number(row, 'ceiling_C') },
    differentialFloor: { delta: number(row, 'differential_Delta'), racahB: number(row, 'differential_B') },
    freeIons: text(row, 'free_ion_set') as FreeIonSetName,
    rivalMargin: number(row, 'rival_margin'),
    defaultUncertainties: { maximum: number(row, 'default_u_maximum'), line: number(row, 'default_u_line') },
  };
}

function ligandOf(row: Row): LigandRecord {
  return {
    id: text(row, 'id'), file: text(row, 'file'), name: text(row, 'name'), formula: text(row, 'formula'), abbreviation: orNull(row, 'abbreviation'),
    synonyms: list(row, 'synonyms'), charge: number(row, 'charge'), denticity: number(row, 'denticity'), donors: list(row, 'donors'),
    smiles: orNull(row, 'smiles'), notes: orNull(row, 'notes'),
  };
}

function sourceOf(row: Row): SourceRecord {
  return {
    id: text(row, 'id'), file: text(row, 'file'), reference: text(row, 'reference'), authors: list(row, 'authors'), title: orNull(row, 'title'), journal: orNull(row, 'journal'),
    year: orNull(row, 'year'), volume: orNull(row, 'volume'), pages: orNull(row, 'pages'), doi: orNull(row, 'doi'), url: orNull(row, 'url'),
  };
}

function complexOf(row: Row, find: Find, policies: ReadonlyMap<string, Policy>): ComplexRecord {
  const id = text(row, 'id');
  const parsed = parseIon(text(row, 'ion'));
  if (parsed.ion === null) throw new Error(`complex.csv, ${id}: ${parsed.reason}`);
  const geometryName = text(row, 'geometry');
  const spinTyped = orNull<SpinName>(row, 'spin_typed');
  // The column `multiplicity` may come from a reading; what was typed, or what ion and geometry leave, is found as the record reader finds it.
  const spin = resolvedSpin(parsed.ion.electrons, geometryName, spinTyped);
  const complex = { ion: parsed.ion, geometryName, geometry: fittedGeometry(geometryName), multiplicity: spinTyped === null ? null : spin.multiplicity };
  const ligands = find('complex_ligand', id).map((link) => ({ ligand: text(link, 'ligand'), count: number(link, 'count'), bound: number(link, 'bound') }));
  return {
    id, file: text(row, 'file'), hash: text(row, 'hash'), formula: text(row, 'formula'), name: orNull(row, 'name'), charge: number(row, 'charge'),
    chargeNote: orNull(row, 'charge_note'), ion: complex.ion, geometryName, geometry: complex.geometry, isomer: text(row, 'isomer'),
    ligands,
    spinTyped, multiplicity: spin.multiplicity, spinAssumed: row['spin_assumed'] === 1, notes: orNull(row, 'notes'),
    hazardOverrides: Object.fromEntries(find('hazard_override', id).map((override) => [text(override, 'code'), text(override, 'reason')])),
    measurements: find('measurement', id).map((measurement) => measurementOf(measurement, complex, donorCount(ligands), find, policies)),
  };
}

function measurementOf(
  row: Row, complex: Pick<ComplexRecord, 'ion' | 'geometryName' | 'geometry' | 'multiplicity'>, donors: number, find: Find, policies: ReadonlyMap<string, Policy>,
): MeasurementRecord {
  const [owner, id] = [text(row, 'complex'), text(row, 'id')];
  const bands = find('band', owner, id);
  const ranges = find('observed_range', owner, id);
  const rangesOf = (kind: string): readonly Row[] => ranges.filter((range) => range['kind'] === kind);
  const policy = policies.get(text(row, 'policy'));
  if (policy === undefined) throw new Error(`measurement.csv, ${owner}/${id}: policy.csv has no policy "${text(row, 'policy')}"`);
  return {
    id,
    engine: {
      ...complex,
      phase: text(row, 'phase') as MeasurementRecord['engine']['phase'], medium: orNull(row, 'medium'), temperature: numberOrNull(row, 'temperature_K'),
      technique: orNull<NonNullable<MeasurementRecord['engine']['technique']>>(row, 'technique'),
      bands: bands.map(bandOf), absent: rangesOf('absent').map(rangeOf), scanned: rangesOf('scanned').map(rangeOf),
      innocenceDoubtful: row['innocence_doubtful'] === 1, nuclearity: number(row, 'nuclearity'),
      donors: number(row, 'nuclearity') === 1 ? donors : null,
    },
    bands: bands.map((band) => ({ positionTyped: text(band, 'position_typed'), widthTyped: orNull(band, 'width_typed'), notes: orNull(band, 'notes') })),
    absentNotes: rangesOf('absent').map((range) => orNull(range, 'notes')),
    sample: orNull(row, 'sample'), medium: orNull(row, 'medium'), temperatureTyped: orNull(row, 'temperature_typed'), temperatureU: numberOrNull(row, 'temperature_u_K'),
    temperatureAssumed: row['temperature_assumed'] === 1, scannedTyped: orNull(row, 'scanned_typed'), host: orNull(row, 'host'), notebook: orNull(row, 'notebook'),
    by: orNull(row, 'measured_by'), date: orNull(row, 'measured_on'), cite: orNull(row, 'source'), where: orNull(row, 'source_place'),
    concentration: orNull(row, 'concentration'), pathLength: orNull(row, 'path_length'), batch: orNull(row, 'batch'), rawFile: orNull(row, 'raw_file'),
    rawHash: orNull(row, 'raw_hash'), magneticMoment: orNull(row, 'magnetic_moment'), eprG: orNull(row, 'epr_g'), notes: orNull(row, 'notes'),
    quoted: quotedOf(find('quoted', owner, id)), policy, policyReason: orNull(row, 'policy_reason'),
  };
}

function rangeOf(row: Row): Range {
  return { low: number(row, 'low'), high: number(row, 'high') };
}

function bandOf(row: Row): Band {
  return {
    position: number(row, 'position'), uMinus: numberOrNull(row, 'u_minus'), uPlus: numberOrNull(row, 'u_plus'), halfDigit: number(row, 'half_digit'),
    coverageNotStated: row['coverage_not_stated'] === 1, kind: text(row, 'kind') as Band['kind'], side: orNull<'higher' | 'lower'>(row, 'side'), width: numberOrNull(row, 'width'),
    epsilon: numberOrNull(row, 'epsilon'), strength: orNull<'strong' | 'medium' | 'weak'>(row, 'strength'), degeneracy: numberOrNull(row, 'degeneracy'),
    deconvoluted: row['deconvoluted'] === 1, role: text(row, 'role') as Band['role'], terms: list(row, 'terms'), leftOut: orNull(row, 'left_out'),
  };
}

/** One entry for each number of the record; its parameters are rows. */
function quotedOf(rows: readonly Row[]): QuotedRecord[] {
  const numbers = [...new Set(rows.map((row) => number(row, 'number')))];
  return numbers.map((entry) => {
    const own = rows.filter((row) => row['number'] === entry);
    const value = (parameter: string): number | null => own.find((row) => row['parameter'] === parameter)?.['value'] as number | undefined ?? null;
    return {
      Delta: value('Delta'), Dq: value('Dq'), B: value('B'), C: value('C'), beta: value('beta'), cite: text(own[0]!, 'source'), where: orNull(own[0]!, 'source_place'),
      typed: Object.fromEntries(own.map((row) => [text(row, 'parameter'), text(row, 'typed')])),
    };
  });
}
