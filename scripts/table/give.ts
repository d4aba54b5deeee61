// Typed complexes as the rows of a table.

import type { TypedComplex } from '#engine';
import { cellFromTyped, withoutUncertainty } from './cells.ts';
import { hazardsCell, ligandsCell } from './compound.ts';
import { fieldNamed, notTaken, tableFields } from './fields.ts';
import type { Level, TableField } from './fields.ts';
import type { Column, Mapping } from './mapping.ts';

export interface NamedComplex {
  readonly id: string;
  readonly complex: TypedComplex;
}

/** A record's texts by level: what a table is made of. */
interface Spread {
  readonly complex: object;
  readonly measurement: object;
  readonly items: readonly object[];
  readonly quoted: readonly object[];
}

/** A text of a record as one cell would hold it, before numbers are dressed; null where the record says nothing. */
export function textAt(target: object, field: TableField): string | null {
  let value: unknown = target;
  for (const step of field.path) value = typeof value === 'object' && value !== null ? (value as Record<string, unknown>)[step] : undefined;
  if (value === null || value === undefined) return null;
  if (field.kind === 'ligands') return ligandsCell(value as Parameters<typeof ligandsCell>[0]);
  if (field.kind === 'hazards') return hazardsCell(value as Record<string, string>);
  if (Array.isArray(value)) return value.join(field.kind === 'term' ? ' or ' : '; ');
  return typeof value === 'string' ? value : null;
}

/** One entry for each spectrum; a complex without any has one with an empty measurement. */
function spreads({ id, complex }: NamedComplex): Spread[] {
  const measurements = complex.measurements ?? [];
  const top = { ...complex, id };
  if (measurements.length === 0) return [{ complex: top, measurement: {}, items: [], quoted: [] }];
  return measurements.map((measurement) => ({ complex: top, measurement, items: measurement.bands ?? [], quoted: measurement.quoted ?? [] }));
}

/** The rows of a table, its header last of the rows that the mapping passes over. */
export function tableRows(records: readonly NamedComplex[], mapping: Mapping): string[][] {
  const width = Math.max(...mapping.columns.map(({ index }) => index)) + 1;
  const header = Array.from({ length: width }, (_, index) => mapping.columns.find((column) => column.index === index)?.header ?? '');
  const above = Array.from({ length: mapping.header - 1 }, () => Array.from({ length: width }, () => ''));
  const rows = records.flatMap((record) => {
    const all = spreads(record).flatMap((spread): { readonly spread: Spread; readonly item: number | null }[] => {
      if (mapping.rows === 'complex') return [{ spread, item: null }];
      return Array.from({ length: Math.max(1, spread.items.length, spread.quoted.length) }, (_, item) => ({ spread, item }));
    });
    return all.map(({ spread, item }, index) => Array.from({ length: width }, (_, at) => {
      const column = mapping.columns.find((one) => one.index === at);
      if (column === undefined || column.field === notTaken) return '';
      const { level } = fieldNamed(column.field);
      if (mapping.continued === 'blank' && index > 0 && (level === 'complex' || (level === 'measurement' && all[index - 1]!.spread === spread))) return '';
      return cellOf(spread, item, column, mapping);
    }));
  });
  return [...above, header, ...rows];
}

function cellOf(spread: Spread, item: number | null, column: Column, mapping: Mapping): string {
  const field = fieldNamed(column.field);
  const target = targetOf(spread, field.level, item ?? (column.number ?? 1) - 1);
  if (target === null) return '';
  const separateU = mapping.columns.some((one) => one.field === 'position.u' && one.number === column.number);
  if (field.name === 'position.u') return dressed(withoutUncertainty(textAt(target, fieldNamed('position')) ?? '').u, field, column, mapping);
  if (field.name !== 'position') return dressed(textAt(target, field), field, column, mapping);
  const typed = textAt(target, field);
  if (typed === null) return '';
  const number = dressed(separateU ? withoutUncertainty(typed).position : typed, field, column, mapping);
  const has = (name: string): boolean => mapping.columns.some((one) => one.field === name && one.number === column.number);
  const shoulder = !has('kind') && textAt(target, fieldNamed('kind')) === 'shoulder' ? ' sh' : '';
  const epsilon = column.brackets === 'epsilon' ? dressed(textAt(target, fieldNamed('epsilon')), fieldNamed('epsilon'), { ...column, unit: null }, mapping) : '';
  return `${number}${shoulder}${epsilon === '' ? '' : ` (${epsilon})`}`;
}

function targetOf({ complex, measurement, items, quoted }: Spread, level: Level, index: number): object | null {
  if (level === 'complex') return complex;
  if (level === 'measurement') return measurement;
  return (level === 'band' ? items : quoted)[index] ?? null;
}

function dressed(text: string | null, field: TableField, { unit }: Column, mapping: Mapping): string {
  return text === null ? '' : cellFromTyped(text, field.kind, unit, mapping);
}

/** A mapping for a table with every field that the records use: headers are the fields' own names. */
export function wholeMapping(records: readonly NamedComplex[], settings: Pick<Mapping, 'rows' | 'separator' | 'decimal'>): Mapping {
  const all = records.flatMap(spreads);
  const most = { band: Math.max(1, ...all.map(({ items }) => items.length)), quoted: Math.max(1, ...all.map(({ quoted }) => quoted.length)) };
  const used = (field: TableField, index: number | null): boolean => all.some((spread) => {
    const targets = field.level === 'complex' ? [spread.complex] : field.level === 'measurement' ? [spread.measurement] : field.level === 'band' ? spread.items : spread.quoted;
    return (index === null ? targets : targets.slice(index, index + 1)).some((target) => textAt(target, field) !== null);
  });
  const columns: Omit<Column, 'index'>[] = [];
  const add = (field: TableField, number: number | null): void => {
    if (field.name === 'position.u' || !used(field, number === null ? null : number - 1)) return;
    columns.push({ header: number === null ? field.name : `${field.name} ${number}`, field: field.name, unit: null, number, term: null, brackets: 'uncertainty' });
  };
  for (const level of ['complex', 'measurement', 'band', 'quoted'] as const) {
    const fields = tableFields.filter((field) => field.level === level);
    if (settings.rows === 'band' || level === 'complex' || level === 'measurement') for (const field of fields) add(field, null);
    else for (let number = 1; number <= most[level]; number += 1) for (const field of fields) add(field, number);
  }
  return { ...settings, confirmed: true, encoding: 'utf-8', header: 1, continued: 'repeated', missing: [], everyRow: {}, columns: columns.map((column, index) => ({ index, ...column })) };
}
