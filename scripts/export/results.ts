import Database from 'better-sqlite3';
import { resultColumns } from './columns.ts';
import { csvText } from './csv.ts';

type Cell = string | number | null;

/** What the result files say, read from a database file. */
export interface Results {
  readonly rows: readonly Readonly<Record<string, Cell>>[];
  readonly meta: Readonly<Record<string, string>>;
}

const query = `
  SELECT result.*, complex.formula AS formula, coalesce((
    SELECT group_concat(text, ' ') FROM (
      SELECT text FROM caution WHERE caution.complex = result.complex AND subject = 'hazard' ORDER BY number
    )
  ), '') AS hazards
  FROM result JOIN complex ON complex.id = result.complex
  ORDER BY result.complex, result.measurement`;

/** Reads every row of the `result` view, in binary order of complex and measurement. */
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
    columns: resultColumns,
    results: rows.map((row) => Object.fromEntries(resultColumns.map(({ name }) => [name, row[name] ?? null]))),
  };
  return `${JSON.stringify(document, null, 1)}\n`;
}
