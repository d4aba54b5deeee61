// Reads the data dictionary out of the commented schema: meaning, unit and range stand behind each column, the rest is SQL.

import { readComment } from './comment.ts';
import { noLimits } from './types.ts';
import type { ColumnEntry, ColumnType, Limits, Reference, TableEntry } from './types.ts';

/**
 * The tables of schema.sql in its order, each column with meaning, unit, type and range. Expects one column a line, as the file
 * is written. A column without a comment takes meaning, unit and range of the column it refers to.
 * @throws Error where a column has neither a comment nor such a reference
 */
export function parseSchema(schema: string): readonly TableEntry[] {
  const drafts = tableTexts(schema).map(draftOf);
  const byName = new Map(drafts.map((draft) => [draft.name, draft]));
  return drafts.map((draft) => ({ ...draft, columns: draft.columns.map((column) => withMeaning(draft, column, byName)) }));
}

interface TableText {
  readonly name: string;
  readonly meaning: string;
  readonly lines: readonly string[];
}

function tableTexts(schema: string): TableText[] {
  const found: { name: string; meaning: string; lines: string[] }[] = [];
  let comment: string[] = [];
  let open: { name: string; meaning: string; lines: string[] } | null = null;
  for (const line of schema.split('\n')) {
    const start = /^CREATE TABLE (\w+) \($/.exec(line);
    if (start !== null) {
      open = { name: start[1]!, meaning: comment.join(' '), lines: [] };
      found.push(open);
    } else if (open !== null && line.startsWith(')')) open = null;
    else if (open !== null) open.lines.push(line);
    else comment = line.startsWith('--') ? [...comment, line.replace(/^--\s*/, '')] : [];
  }
  return found;
}

function draftOf({ name, meaning, lines }: TableText): TableEntry {
  const columns: ColumnEntry[] = [];
  const references: Reference[] = [];
  let key: readonly string[] = [];
  for (const line of lines) {
    const [code = '', comment = ''] = splitComment(line);
    const wholeKey = /^\s*PRIMARY KEY \(([^)]+)\)/.exec(code);
    const foreign = /^\s*FOREIGN KEY \(([^)]+)\) REFERENCES (\w+) \(([^)]+)\)/.exec(code);
    const column = /^ {2}(\w+) +(TEXT|INTEGER|REAL)\b(.*)$/.exec(code);
    if (wholeKey !== null) key = names(wholeKey[1]!);
    else if (foreign !== null) references.push({ columns: names(foreign[1]!), table: foreign[2]!, targets: names(foreign[3]!) });
    else if (column !== null) {
      const [, columnName = '', sqlType = '', rest = ''] = column;
      const single = /REFERENCES (\w+) \((\w+)\)/.exec(rest);
      if (single !== null) references.push({ columns: [columnName], table: single[1]!, targets: [single[2]!] });
      if (rest.includes('PRIMARY KEY')) key = [columnName];
      columns.push(columnOf(columnName, sqlType, rest, comment));
    }
  }
  return { name, meaning, columns, key, references };
}

function columnOf(name: string, sqlType: string, rest: string, comment: string): ColumnEntry {
  const { units, limits, meaning } = readComment(comment);
  const values = /CHECK \(\w+ IN \(('[^)]*')\)\)/.exec(rest)?.[1]?.split(/,\s*/).map((quoted) => quoted.slice(1, -1)) ?? null;
  const type = typeOf(sqlType, rest);
  const counted = type === 'integer' && units.length === 0 ? ['1'] : units;
  return { name, type, required: rest.includes('NOT NULL'), meaning, units: counted, limits: limitsOf(rest, limits), values };
}

function typeOf(sqlType: string, rest: string): ColumnType {
  if (sqlType === 'REAL') return 'real';
  if (sqlType === 'INTEGER') return rest.includes('IN (0, 1)') ? 'flag' : 'integer';
  return rest.includes('json_valid(') ? 'json' : 'text';
}

// A range that the database itself enforces wins over that of the comment.
function limitsOf(rest: string, commented: Limits): Limits {
  const between = /BETWEEN (-?\d+) AND (-?\d+)/.exec(rest);
  if (between !== null) return { above: null, least: Number(between[1]), most: Number(between[2]) };
  const above = /CHECK \(\w+ > (\d+)\)/.exec(rest);
  return above === null ? commented : { above: Number(above[1]), least: null, most: null };
}

function withMeaning(table: TableEntry, column: ColumnEntry, tables: ReadonlyMap<string, TableEntry>): ColumnEntry {
  if (column.meaning !== '') return column;
  for (const { columns, table: name, targets } of table.references) {
    const place = columns.indexOf(column.name);
    const target = tables.get(name);
    const origin = target?.columns.find(({ name: candidate }) => candidate === targets[place]);
    if (place < 0 || target === undefined || origin === undefined) continue;
    const { meaning, units, limits } = withMeaning(target, origin, tables);
    const limited = column.limits === noLimits ? limits : column.limits;
    return { ...column, meaning: origin.name === column.name || origin.name !== 'id' ? meaning : `${name}: ${meaning}`, units, limits: limited };
  }
  throw new Error(`schema.sql says nothing of the column ${table.name}.${column.name}`);
}

function splitComment(line: string): [string, string] {
  const at = line.indexOf('--');
  return at < 0 ? [line, ''] : [line.slice(0, at), line.slice(at + 2).trim()];
}

function names(list: string): string[] {
  return list.split(',').map((name) => name.trim());
}
