/** What a cell of the database may hold. */
export type Cell = string | number | null;

/** One row by column name. */
export type Row = Readonly<Record<string, Cell>>;

/** Rows by table name. */
export type Tables = Readonly<Record<string, readonly Row[]>>;

/** A flag as the database stores it. */
export function flag(value: boolean): 0 | 1 {
  return value ? 1 : 0;
}

/** A list as the database stores it: a JSON array in the order typed. */
export function list(values: readonly (string | number)[]): string {
  return JSON.stringify(values);
}

/** Adds the rows of `more` to those of `tables`, table by table. */
export function mergeTables(parts: readonly Tables[]): Tables {
  const merged: Record<string, Row[]> = {};
  for (const part of parts) {
    for (const [table, rows] of Object.entries(part)) {
      const into = merged[table] ?? [];
      for (const row of rows) into.push(row);
      merged[table] = into;
    }
  }
  return merged;
}
