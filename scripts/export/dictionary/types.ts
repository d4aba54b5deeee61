/** What a cell of a column may hold. `json` is a text that holds a list or an object; a flag is 0 or 1. */
export type ColumnType = 'text' | 'integer' | 'real' | 'flag' | 'json';

/** Limits of a number; null where there is none. `above` excludes the limit itself. */
export interface Limits {
  readonly above: number | null;
  readonly least: number | null;
  readonly most: number | null;
}

/** One column of a table, of the `result` view or of results.csv. */
export interface ColumnEntry {
  readonly name: string;
  readonly type: ColumnType;
  /** true where a cell is never empty. */
  readonly required: boolean;
  readonly meaning: string;
  /** UCUM codes: none for text and flags, two where the row decides. */
  readonly units: readonly string[];
  readonly limits: Limits;
  /** Closed list of values, null where open. */
  readonly values: readonly string[] | null;
}

/** Columns of one table that name a row of another. */
export interface Reference {
  readonly columns: readonly string[];
  readonly table: string;
  readonly targets: readonly string[];
}

export interface TableEntry {
  readonly name: string;
  readonly meaning: string;
  readonly columns: readonly ColumnEntry[];
  readonly key: readonly string[];
  readonly references: readonly Reference[];
}

export const noLimits: Limits = { above: null, least: null, most: null };
