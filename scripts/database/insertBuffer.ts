import type Database from 'better-sqlite3';
import type { Cell } from './rows/row.ts';
import type { PackedRows, PackedTables } from './rows/packed.ts';

/** Values that one statement takes: a call costs more than a row. */
const valuesTogether = 400;

/** Values that wait before all tables are written. */
const mostWaiting = 200_000;

interface Table {
  readonly name: string;
  readonly columns: readonly string[];
  /** As the rows give them; set by the first. */
  given: readonly string[] | null;
  waiting: Cell[];
  /** Statements by how many rows they take. */
  readonly statements: Map<number, Database.Statement>;
}

/**
 * Gathers rows and writes them many at a time, table by table in the order of the schema, in which a table comes after those it
 * refers to: foreign keys are then held as the rows come, at a look-up each.
 */
export function insertBuffer(database: Database.Database): { readonly add: (tables: PackedTables) => void; readonly flush: () => void } {
  const tables = tablesOf(database);
  let count = 0;
  const write = database.transaction(() => {
    for (const table of tables.values()) writeRows(database, table);
  });
  const flush = (): void => {
    database.pragma('foreign_keys = ON');
    write();
    database.pragma('foreign_keys = OFF');
    count = 0;
  };
  return {
    add: (rows) => {
      for (const [name, packed] of Object.entries(rows)) {
        const table = tables.get(name);
        if (table === undefined) throw new Error(`the database has no table "${name}"`);
        if (packed.cells.length === 0) continue;
        checkColumns(table, packed);
        for (const cell of packed.cells) table.waiting.push(cell);
        count += packed.cells.length;
      }
      if (count >= mostWaiting) flush();
    },
    flush,
  };
}

function tablesOf(database: Database.Database): ReadonlyMap<string, Table> {
  const names = database.prepare<[], { name: string }>("SELECT name FROM sqlite_schema WHERE type = 'table' ORDER BY rowid").all();
  const info = database.prepare<[string], { name: string }>('SELECT name FROM pragma_table_info(?)');
  return new Map(names.map(({ name }) => [name, { name, columns: info.all(name).map((column) => column.name), given: null, waiting: [], statements: new Map() }]));
}

function checkColumns(table: Table, { columns }: PackedRows): void {
  if (table.given !== null && columns.length === table.given.length && columns.every((name, i) => name === table.given![i])) return;
  for (const name of table.columns) if (!columns.includes(name)) throw new Error(`a row of table "${table.name}" has no value for "${name}"`);
  const unknown = columns.filter((name) => !table.columns.includes(name));
  if (unknown.length > 0) throw new Error(`a row of table "${table.name}" has unknown columns: ${unknown.join(', ')}`);
  if (table.given !== null) throw new Error(`rows of table "${table.name}" come with their columns in different orders`);
  table.given = columns;
}

function writeRows(database: Database.Database, table: Table): void {
  if (table.given === null) return;
  const width = table.given.length;
  const rows = table.waiting.length / width;
  const together = Math.max(1, Math.floor(valuesTogether / width));
  for (let start = 0; start < rows; start += together) {
    const count = Math.min(together, rows - start);
    statementOf(database, table, count).run(table.waiting.slice(start * width, (start + count) * width));
  }
  table.waiting = [];
}

function statementOf(database: Database.Database, { name, given, statements }: Table, count: number): Database.Statement {
  const known = statements.get(count);
  if (known !== undefined) return known;
  const one = `(${given!.map(() => '?').join(', ')})`;
  const made = database.prepare(`INSERT INTO "${name}" (${given!.map((column) => `"${column}"`).join(', ')}) VALUES ${Array.from({ length: count }, () => one).join(', ')}`);
  statements.set(count, made);
  return made;
}
