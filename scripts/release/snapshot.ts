// What a release freezes, taken from the rows of the database.

import { createHash } from 'node:crypto';
import type { ParameterName } from '#engine';
import type { Collection } from '../content/types.ts';
import type { Cell, Row, Tables } from '../database/rows/row.ts';
import { mainFiles } from '../export/files.ts';
import { complexPath, fixedPages, ionPath, ligandPath, measurementPath } from '../export/paths.ts';
import type { FrozenComplex, FrozenMeasurement, FrozenNumber, Snapshot } from './types.ts';

export const parameterNames: readonly ParameterName[] = ['Delta', 'B', 'C', 'beta'];

/** The snapshot of a collection, from what a release keeps of each of its complexes. */
export function snapshotOf(
  { group, ligands }: Pick<Collection, 'group' | 'ligands'>, complexes: readonly FrozenComplex[], { engine, software }: Pick<Snapshot, 'engine' | 'software'>,
): Snapshot {
  const ascending = sorted(complexes, ({ id }) => id);
  return { software, engine, licence: group.licence, doi: group.doi, complexes: ascending, addresses: addressesOf(ascending, ligands.map(({ id }) => id)) };
}

/** What a release keeps of complexes. `tables` hold every row of theirs and of their free ions. */
export function frozenComplexes(tables: Tables): readonly FrozenComplex[] {
  const find = finder(tables);
  return rowsOf(tables, 'complex').map((complex) => complexOf(complex, find));
}

/** Addresses that a collection publishes for good: pages of complexes, measurements, ligands and ions, the fixed pages, the files of data/. */
export function addressesOf(
  complexes: readonly { readonly id: string; readonly ion: string; readonly measurements: readonly { readonly id: string }[] }[], ligands: readonly string[],
): readonly string[] {
  return sorted([...new Set([
    ...fixedPages,
    ...mainFiles.map(({ name }) => `data/${name}`),
    ...complexes.flatMap(({ id, ion, measurements }) => [complexPath(id), ionPath(ion), ...measurements.map((measurement) => measurementPath(id, measurement.id))]),
    ...ligands.map(ligandPath),
  ])], (address) => address);
}

type Find = (table: string, key: string) => readonly Row[];

const keys: Readonly<Record<string, readonly string[]>> = {
  measurement: ['complex'], band: ['complex', 'measurement'], observed_range: ['complex', 'measurement'], reading: ['complex', 'measurement'],
  parameter: ['complex', 'measurement', 'reading'], free_ion: ['set_name', 'ion'],
};

function finder(tables: Tables): Find {
  const found = new Map<string, Row[]>();
  for (const [table, columns] of Object.entries(keys)) {
    for (const row of rowsOf(tables, table)) {
      const key = `${table} ${columns.map((column) => row[column]).join('/')}`;
      const group = found.get(key);
      if (group === undefined) found.set(key, [row]);
      else group.push(row);
    }
  }
  return (table, key) => found.get(`${table} ${key}`) ?? [];
}

function complexOf(complex: Row, find: Find): FrozenComplex {
  const id = String(complex['id']);
  const measurements = sorted(find('measurement', id), (row) => String(row['id']));
  return {
    id, formula: String(complex['formula']), ion: String(complex['ion']), geometry: String(complex['geometry']), isomer: String(complex['isomer']),
    measurements: measurements.map((measurement) => measurementOf(complex, measurement, find)),
  };
}

function measurementOf(complex: Row, measurement: Row, find: Find): FrozenMeasurement {
  const key = `${complex['id']}/${measurement['id']}`;
  const reading = find('reading', key).find(({ chosen }) => chosen === 1);
  if (reading === undefined) throw new Error(`${key} has no chosen reading`);
  const set = String(reading['free_ion_set']);
  const freeIon = find('free_ion', `${set}/${complex['ion']}`)[0];
  const parameters = find('parameter', `${key}/${reading['number']}`);
  return {
    id: String(measurement['id']),
    verdict: String(reading['verdict']),
    readings: inputHash(complex, measurement, find('band', key), find('observed_range', key)),
    policy: String(reading['policy']),
    free_ion: freeIon === undefined ? set : `${set} ${freeIon['B0']} ${freeIon['C0'] ?? 'none'}`,
    numbers: Object.fromEntries(parameterNames.map((name) => [name, numberOf(parameters.find((row) => row['name'] === name))])) as FrozenMeasurement['numbers'],
  };
}

function numberOf(row: Row | undefined): FrozenNumber {
  const number = (cell: Cell | undefined): number | null => (typeof cell === 'number' ? cell : null);
  return { value: number(row?.['value']), u: number(row?.['u']), u_total: number(row?.['u_total']), standing: String(row?.['standing'] ?? 'withheld') };
}

// Named here one by one, so that a new column of the database does not make old readings look changed.
const inputs = {
  complex: ['ion', 'geometry', 'spin_typed'],
  measurement: ['phase', 'medium', 'temperature_K', 'technique', 'innocence_doubtful', 'nuclearity'],
  band: [
    'position', 'u_minus', 'u_plus', 'half_digit', 'coverage_not_stated', 'kind', 'side', 'width', 'epsilon', 'strength', 'degeneracy', 'deconvoluted', 'role', 'terms', 'left_out',
  ],
  range: ['kind', 'low', 'high'],
} as const;

/** sha256, in hex, of what was typed and enters the fit of a measurement. */
function inputHash(complex: Row, measurement: Row, bands: readonly Row[], ranges: readonly Row[]): string {
  const cells = (row: Row, columns: readonly string[]): Cell[] => columns.map((column) => row[column] ?? null);
  const byNumber = (list: readonly Row[]): Row[] => [...list].sort((a, b) => Number(a['number']) - Number(b['number']));
  const ranked = sorted(byNumber(ranges), ({ kind }) => String(kind));
  return createHash('sha256').update(JSON.stringify([
    cells(complex, inputs.complex), cells(measurement, inputs.measurement), byNumber(bands).map((row) => cells(row, inputs.band)), ranked.map((row) => cells(row, inputs.range)),
  ])).digest('hex');
}

function rowsOf(tables: Tables, name: string): readonly Row[] {
  return tables[name] ?? [];
}

// Binary order, never the locale's.
function sorted<T>(list: readonly T[], key: (item: T) => string): T[] {
  return [...list].sort((a, b) => (key(a) < key(b) ? -1 : key(a) > key(b) ? 1 : 0));
}
