import Database from 'better-sqlite3';
import { resultColumns } from './columns.ts';
import { csvText } from './csv.ts';
import type { Cell } from './tableFiles.ts';

/** What the result files say, read from a database file. */
export interface Results {
  readonly rows: readonly Readonly<Record<string, Cell>>[];
  readonly meta: Readonly<Record<string, string>>;
}

const correlation = (first: string, second: string): string => `(
    SELECT x.value FROM correlation x
    WHERE x.complex = r.complex AND x.measurement = r.measurement AND x.reading = d.number AND x.first = '${first}' AND x.second = '${second}'
  ) AS corr_${first}_${second}`;

const parameter = (column: string, name: string): string => `(
    SELECT p.${column} FROM parameter p
    WHERE p.complex = r.complex AND p.measurement = r.measurement AND p.reading = d.number AND p.name = '${name}'
  ) AS ${name}_${column}`;

const query = `
  SELECT r.*, c.formula AS formula, c.isomer AS isomer, c.charge AS charge, m.medium AS medium, m.technique AS technique, m.source AS source,
  d.reason AS reason,
  ${['Delta', 'B', 'C', 'beta'].map((name) => parameter('reason', name)).join(', ')},
  ${parameter('u', 'beta')}, ${correlation('Delta', 'C')}, ${correlation('B', 'C')},
  (SELECT group_concat(ligand || ':' || count, ' ') FROM (SELECT ligand, count FROM complex_ligand l WHERE l.complex = r.complex ORDER BY l.number)) AS ligands,
  coalesce((SELECT value FROM meta WHERE key = 'group.url'), '') || 'complexes/' || r.complex || '/#' || r.measurement AS address,
  coalesce((
    SELECT group_concat(text, ' ') FROM (
      SELECT text FROM caution WHERE caution.complex = r.complex AND subject = 'hazard' ORDER BY number
    )
  ), '') AS hazards
  FROM result r
  JOIN complex c ON c.id = r.complex
  JOIN measurement m ON m.complex = r.complex AND m.id = r.measurement
  JOIN reading d ON d.complex = r.complex AND d.measurement = r.measurement AND d.chosen = 1
  ORDER BY r.complex, r.measurement`;

/** Reads every row of the `result` view with what the wide file adds, in binary order of complex and measurement. */
export function readResults(databaseFile: string): Results {
  const database = new Database(databaseFile, { readonly: true, fileMustExist: true });
  try {
    const rows = database.prepare<[], Record<string, Cell>>(query).all();
    const meta = database.prepare<[], { key: string; value: string }>('SELECT key, value FROM meta ORDER BY key').all();
    return { rows, meta: Object.fromEntries(meta.map(({ key, value }) => [key, value])) };
  } finally {
    database.close();
  }
}

/** results.csv: one line for each measurement's chosen reading. */
export function resultsCsv({ rows }: Results): string {
  return csvText(resultColumns.map(({ name }) => name), rows.map((row) => resultColumns.map(({ name }) => row[name] ?? null)));
}

/** results.json: the same rows with what they mean, who made them and under which licence. */
export function resultsJson({ rows, meta }: Results): string {
  const document = {
    title: meta['group.title'],
    group: meta['group.name'],
    release: meta['group.release'],
    licence: meta['group.licence'],
    demonstration: meta['group.demonstration'] === 'true',
    note: 'Energies in cm-1; u is one standard uncertainty. null is withheld or not recorded, never zero. ' +
      'No hazard caution here does not mean no hazard.',
    columns: resultColumns.map(({ name, unit, meaning, type }) => ({ name, type, unit, meaning })),
    results: rows.map((row) => Object.fromEntries(resultColumns.map(({ name }) => [name, row[name] ?? null]))),
  };
  return `${JSON.stringify(document, null, 1)}\n`;
}
