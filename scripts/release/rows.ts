// Releases, gone addresses and changes as rows of the database, and back from rows.

import { mergeTables } from '../database/rows/row.ts';
import type { Row, Tables } from '../database/rows/row.ts';
import { changesBetween } from './changes.ts';
import { parameterNames } from './snapshot.ts';
import type { Change, FrozenComplex, FrozenMeasurement, FrozenNumber, FrozenRelease, Gone, GoneKind, History, Snapshot } from './types.ts';

/** Rows of the history of a collection; `current` is what a release would freeze now. */
export function historyRows({ releases, gone }: History, current: Snapshot): Tables {
  const changes = allChanges(releases, current);
  return mergeTables([
    ...releases.map(releaseRows),
    {
      published_address: [...firstReleases(releases)].map(([address, release]) => ({ address, release })),
      gone: gone.map(({ address, kind, target, reason }) => ({ address, kind, target, reason })),
      change: changes.map(({ release, change }, index) => changeRow(index + 1, release, change)),
    },
  ]);
}

/** Each published address with the first release that had it. */
export function firstReleases(releases: readonly FrozenRelease[]): ReadonlyMap<string, string> {
  const first = new Map<string, string>();
  for (const { release, addresses } of releases) for (const address of addresses) if (!first.has(address)) first.set(address, release);
  return first;
}

function allChanges(releases: readonly FrozenRelease[], current: Snapshot): { readonly release: string | null; readonly change: Change }[] {
  const last = releases.at(-1);
  if (last === undefined) return [];
  const steps = releases.slice(1).flatMap((after, index) => changesBetween(releases[index]!, after).map((change) => ({ release: after.release, change })));
  return [...steps, ...changesBetween(last, current).map((change) => ({ release: null, change }))];
}

function releaseRows(release: FrozenRelease): Tables {
  const { release: id, complexes } = release;
  const measurements = complexes.flatMap((complex) => complex.measurements.map((measurement) => ({ complex: complex.id, measurement })));
  return {
    frozen_release: [{
      id, number: release.number, date: release.date, who: release.who, cause: release.cause, code_version: release.code_version, software: release.software,
      engine: release.engine, licence: release.licence, doi: release.doi, complexes: complexes.length, measurements: measurements.length,
    }],
    frozen_complex: complexes.map(({ id: complex, formula, ion, geometry, isomer }) => ({ release: id, complex, formula, ion, geometry, isomer })),
    frozen_measurement: measurements.map(({ complex, measurement: { id: measurement, verdict, readings, policy, free_ion } }) => ({
      release: id, complex, measurement, verdict, readings, policy, free_ion,
    })),
    frozen_value: measurements.flatMap(({ complex, measurement }) => parameterNames.map((parameter) => ({
      release: id, complex, measurement: measurement.id, parameter, ...measurement.numbers[parameter],
    }))),
  };
}

function changeRow(number: number, release: string | null, change: Change): Row {
  const { kind, complex, measurement, parameter, before, beforeU, after, afterU, cause, text } = change;
  return { number, release, kind, complex, measurement, parameter, before, before_u: beforeU, after, after_u: afterU, cause, text };
}

/** The history that rows tell. Addresses of a release are those that it was the first to have: the union over all is whole. */
export function historyFromRows(tables: Tables): History {
  const rows = (name: string): readonly Row[] => tables[name] ?? [];
  const text = (row: Row, column: string): string => String(row[column]);
  const orNull = (row: Row, column: string): string | null => (row[column] === null ? null : text(row, column));
  const values = groups(rows('frozen_value'), ['release', 'complex', 'measurement']);
  const measurements = groups(rows('frozen_measurement'), ['release', 'complex']);
  const complexes = groups(rows('frozen_complex'), ['release']);

  const measurementOf = (release: string, complex: string, row: Row): FrozenMeasurement => {
    const own = values(`${release}/${complex}/${text(row, 'measurement')}`);
    return {
      id: text(row, 'measurement'), verdict: text(row, 'verdict'), readings: text(row, 'readings'), policy: text(row, 'policy'), free_ion: text(row, 'free_ion'),
      numbers: Object.fromEntries(own.map((value) => [text(value, 'parameter'), numberFrom(value)])) as FrozenMeasurement['numbers'],
    };
  };
  const complexOf = (release: string, row: Row): FrozenComplex => ({
    id: text(row, 'complex'), formula: text(row, 'formula'), ion: text(row, 'ion'), geometry: text(row, 'geometry'), isomer: text(row, 'isomer'),
    measurements: measurements(`${release}/${text(row, 'complex')}`).map((measurement) => measurementOf(release, text(row, 'complex'), measurement)),
  });
  const releases = [...rows('frozen_release')].sort((a, b) => Number(a['number']) - Number(b['number'])).map((row): FrozenRelease => ({
    release: text(row, 'id'), number: Number(row['number']), date: text(row, 'date'), who: text(row, 'who'), cause: text(row, 'cause'), code_version: orNull(row, 'code_version'),
    software: text(row, 'software'), engine: text(row, 'engine'), licence: text(row, 'licence'), doi: orNull(row, 'doi'),
    complexes: complexes(text(row, 'id')).map((complex) => complexOf(text(row, 'id'), complex)),
    addresses: rows('published_address').filter(({ release }) => release === row['id']).map((address) => text(address, 'address')),
  }));
  const gone = rows('gone').map((row): Gone => ({ address: text(row, 'address'), kind: text(row, 'kind') as GoneKind, target: orNull(row, 'target'), reason: orNull(row, 'reason') }));
  return { releases, gone };
}

function groups(rows: readonly Row[], columns: readonly string[]): (key: string) => readonly Row[] {
  const found = new Map<string, Row[]>();
  for (const row of rows) {
    const key = columns.map((column) => row[column]).join('/');
    const group = found.get(key);
    if (group === undefined) found.set(key, [row]);
    else group.push(row);
  }
  return (key) => found.get(key) ?? [];
}

function numberFrom(row: Row): FrozenNumber {
  return { value: row['value'] as number | null, u: row['u'] as number | null, u_total: row['u_total'] as number | null, standing: String(row['standing']) };
}
