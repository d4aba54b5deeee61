// The rows of a table read cell by cell, by a mapping.

import { contentOf, pointFound, positionParts, typedFromCell, withUncertainty } from './cells.ts';
import { fieldNamed, notTaken } from './fields.ts';
import type { Level } from './fields.ts';
import type { Column, Mapping } from './mapping.ts';
import type { TableFinding, TablePlace } from './places.ts';

/** A text for a record and where it stands. */
export interface Value {
  readonly text: string;
  readonly place: TablePlace;
}

export interface ReadRow {
  /** Number of the row as a spreadsheet shows it. */
  readonly number: number;
  /** Values of the complex and of the measurement, by field. */
  readonly values: ReadonlyMap<Level, ReadonlyMap<string, Value>>;
  /** Bands and ranges without a band, by field. */
  readonly bands: readonly ReadonlyMap<string, Value>[];
  readonly quoted: readonly ReadonlyMap<string, Value>[];
}

export interface ReadRows {
  readonly rows: readonly ReadRow[];
  readonly findings: readonly { readonly place: TablePlace; readonly finding: TableFinding }[];
}

/** Reads every row below the header that holds anything. `everyRowPlace` gives the place of a value of every-row. */
export function readRows(table: readonly (readonly string[])[], mapping: Mapping, everyRowPlace: (field: string) => TablePlace): ReadRows {
  const findings: { readonly place: TablePlace; readonly finding: TableFinding }[] = [];
  const rows: ReadRow[] = [];
  let above: ReadRow | null = null;
  table.slice(mapping.header).forEach((cells, index) => {
    if (cells.every((cell) => cell.trim() === '')) return;
    const number = mapping.header + index + 1;
    const cellValues = (level: Level, only: number | null): Map<string, Value> => {
      const found = new Map<string, Value>();
      for (const column of mapping.columns) {
        if (column.field === notTaken || (only !== null && column.number !== only)) continue;
        const field = fieldNamed(column.field);
        const content = contentOf(cells[column.index] ?? '', mapping);
        if (field.level !== level || content === null) continue;
        const place: TablePlace = { row: number, column: column.index + 1, header: column.header };
        const point = pointFound(content, field.kind, mapping);
        if (point !== null) {
          findings.push({ place, finding: { code: 'TABLE_POINT', found: `"${point.found}"`, expected: 'no point in a number: the mapping declares decimal commas', mend: `write ${point.mended}, or declare  decimal: point  in the mapping` } });
          continue;
        }
        if (column.field === 'position') addPosition(found, content, column, place, mapping);
        else found.set(column.field, { text: typedFromCell(content, field.kind, column.unit, mapping), place });
      }
      return found;
    };
    const everyRow = (level: Level, values: Map<string, Value>): Map<string, Value> => {
      for (const [name, text] of Object.entries(mapping.everyRow)) {
        if (fieldNamed(name).level === level && !values.has(name)) values.set(name, { text, place: everyRowPlace(name) });
      }
      return values;
    };
    let complex = cellValues('complex', null);
    let measurement = cellValues('measurement', null);
    const goesOn = mapping.continued === 'blank' && above !== null && !complex.has('id') && !complex.has('formula');
    if (goesOn && above !== null) {
      complex = new Map([...(above.values.get('complex') ?? []), ...complex]);
      if (measurement.size === 0) measurement = new Map(above.values.get('measurement') ?? []);
    }
    const bands = itemNumbers(mapping, 'band').flatMap((one) => items(everyRowForBand(cellValues('band', one), everyRow)));
    const quoted = itemNumbers(mapping, 'quoted').flatMap((one) => {
      const values = cellValues('quoted', one);
      return [...values.keys()].some((field) => field !== 'quoted.cite' && field !== 'quoted.where') ? [everyRow('quoted', values)] : [];
    });
    const row: ReadRow = { number, values: new Map([['complex', everyRow('complex', complex)], ['measurement', everyRow('measurement', measurement)]]), bands, quoted };
    rows.push(row);
    above = row;
  });
  return { rows, findings };
}

/** The numbers that tell apart the bands of one row; null for a row of one. */
function itemNumbers({ columns }: Mapping, level: Level): (number | null)[] {
  const numbers = columns.filter(({ field }) => field !== notTaken && fieldNamed(field).level === level).map(({ number }) => number);
  return [...new Set(numbers)].sort((a, b) => (a ?? 0) - (b ?? 0));
}

function addPosition(found: Map<string, Value>, content: string, column: Column, place: TablePlace, mapping: Mapping): void {
  const parts = positionParts(content, column.brackets);
  if (parts.number !== '') found.set('position', { text: typedFromCell(parts.number, 'energy', column.unit, mapping), place });
  if (parts.shoulder && !found.has('kind')) found.set('kind', { text: 'shoulder', place });
  if (parts.epsilon !== null) found.set('epsilon', { text: typedFromCell(parts.epsilon, 'coefficient', null, mapping), place });
  if (column.term !== null && !found.has('term')) found.set('term', { text: column.term, place });
}

function everyRowForBand(values: Map<string, Value>, everyRow: (level: Level, values: Map<string, Value>) => Map<string, Value>): Map<string, Value> {
  return values.has('position') ? everyRow('band', values) : values;
}

/** What a row's cells about bands hold: a band, a range without a band, or both. */
function items(values: Map<string, Value>): ReadonlyMap<string, Value>[] {
  const position = values.get('position');
  const absent = values.get('absent');
  const u = values.get('position.u');
  if (position !== undefined && u !== undefined) values.set('position', { ...position, text: withUncertainty(position.text, u.text) });
  values.delete('position.u');
  if (position === undefined && absent === undefined) return values.size === 0 ? [] : [values];
  if (position === undefined || absent === undefined) return [values];
  values.delete('absent');
  return [values, new Map([['absent', absent]])];
}
