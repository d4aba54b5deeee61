// The dictionary in words and as a file.

import { unitOf } from './units.ts';
import type { ColumnEntry, TableEntry } from './types.ts';

/** "cm⁻¹", "cm⁻¹ or 1" where the row decides, null for what has no unit. */
export function unitShown({ units }: ColumnEntry): string | null {
  return units.length === 0 ? null : units.map((code) => unitOf(code).shown).join(' or ');
}

/** What may stand in a cell: "above 0", "0 to 1", "1 or more", "octahedral, tetrahedral", "0 or 1"; null where nothing is said. */
export function rangeShown({ type, limits: { above, least, most }, values }: ColumnEntry): string | null {
  if (values !== null) return values.join(', ');
  if (type === 'flag') return '0 or 1';
  if (least !== null && most !== null) return `${signed(least)} to ${signed(most)}`;
  if (above !== null) return `above ${signed(above)}`;
  return least === null ? null : `${signed(least)} or more`;
}

const typeWords = { text: 'text', integer: 'whole number', real: 'number', flag: 'flag', json: 'JSON' } as const;

/** "number", "whole number", "text", "flag", "JSON"; with ", may be empty" where it may. */
export function typeShown({ type, required }: ColumnEntry): string {
  return required ? typeWords[type] : `${typeWords[type]}, may be empty`;
}

function signed(value: number): string {
  return String(value).replace('-', '−');
}

/** dictionary.json: every column of every table and of results.csv. */
export function dictionaryJson(tables: readonly TableEntry[]): string {
  const document = {
    note: 'Every table of the database, each with a CSV file of its name, and the columns of results.csv. Units are UCUM codes; two where the row decides. ' +
      'An empty cell is not recorded or withheld, never zero.',
    tables: tables.map(({ name, meaning, key, references, columns }) => ({
      name, meaning, key,
      references: references.map(({ columns: own, table, targets }) => ({ columns: own, table, targets })),
      columns: columns.map((column) => ({
        name: column.name, type: column.type, required: column.required, meaning: column.meaning, units: column.units,
        above: column.limits.above, least: column.limits.least, most: column.limits.most, values: column.values,
      })),
    })),
  };
  return `${JSON.stringify(document, null, 1)}\n`;
}
