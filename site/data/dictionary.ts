import { resultTable } from '../../scripts/export/columns.ts';
import { parseSchema } from '../../scripts/export/dictionary/parseSchema.ts';
import { rangeShown, typeShown, unitShown } from '../../scripts/export/dictionary/show.ts';
import type { TableEntry } from '../../scripts/export/dictionary/types.ts';
import schema from '../../scripts/database/schema.sql?raw';
import { type Table, column, longColumn, rowColumn, soft } from './table.ts';

/** The tables of the database, read from its commented schema as the exports read them. */
export const databaseTables: readonly TableEntry[] = parseSchema(schema);

export interface DictionaryTable {
  /** Place on the page. */
  readonly id: string;
  readonly name: string;
  /** File that holds the table. */
  readonly file: string;
  readonly meaning: string;
  readonly columns: Table;
  readonly key: string;
  readonly references: readonly { readonly columns: string; readonly table: string; readonly id: string }[];
}

/** The data dictionary: every table and column of the exports, the one wide file first. */
export function dictionaryPage(): readonly DictionaryTable[] {
  return [resultTable, ...databaseTables].map((table) => ({
    id: tableId(table.name), name: table.name, file: table === resultTable ? 'data/results.csv' : `data/csv/${table.name}.csv`, meaning: table.meaning,
    columns: {
      caption: `Columns of ${table.name}`, columns: [rowColumn('Column'), longColumn('Meaning'), column('Unit'), column('UCUM'), column('Type'), column('Range or values')],
      rows: table.columns.map((one) => [one.name, one.meaning, unitShown(one) ?? soft('none'), one.units.length === 0 ? soft('none') : one.units.join(' or '), typeShown(one), rangeShown(one) ?? soft('any')]),
    },
    key: table.key.join(', '), references: table.references.map(({ columns, table: other }) => ({ columns: columns.join(', '), table: other, id: tableId(other) })),
  }));
}

const tableId = (name: string): string => `table-${name.replaceAll('_', '-')}`;
