// What a table would not bring back: the records read again from their own rows, compared.

import type { LigandRecord } from '../content/types.ts';
import { assemble } from './assemble.ts';
import { tableFields } from './fields.ts';
import { textAt } from './give.ts';
import type { NamedComplex } from './give.ts';
import type { Mapping } from './mapping.ts';
import { readRows } from './readRows.ts';

/** Counts, by field, of the texts of the records that reading the table would not give back, in the order of the fields. */
export function lostTexts(records: readonly NamedComplex[], rows: readonly (readonly string[])[], mapping: Mapping, ligands: readonly LigandRecord[]): ReadonlyMap<string, number> {
  const read = readRows(rows, mapping, (field) => ({ line: 1, column: 1, field }));
  const back = assemble(read.rows, mapping, ligands).map(({ id, complex }) => ({ id, complex }));
  const given = textsOf(records);
  const found = textsOf(back);
  const lost = new Map<string, number>();
  for (const { name } of tableFields) {
    const [before, after] = [given.get(name) ?? [], new Map<string, number>()];
    for (const text of found.get(name) ?? []) after.set(text, (after.get(text) ?? 0) + 1);
    const missing = before.filter((text) => {
      const left = after.get(text) ?? 0;
      after.set(text, left - 1);
      return left <= 0;
    }).length;
    if (missing > 0) lost.set(name, missing);
  }
  return lost;
}

/** Every text of the records by field, each behind the formula of its complex. */
function textsOf(records: readonly NamedComplex[]): ReadonlyMap<string, string[]> {
  const texts = new Map<string, string[]>();
  const add = (level: string, target: object, about: string): void => {
    for (const field of tableFields) {
      if (field.level !== level || field.name === 'position.u') continue;
      const text = textAt(target, field);
      if (text === null) continue;
      const list = texts.get(field.name);
      if (list === undefined) texts.set(field.name, [`${about} ${text}`]);
      else list.push(`${about} ${text}`);
    }
  };
  for (const { id, complex } of records) {
    const about = complex.formula;
    add('complex', { ...complex, id }, about);
    complex.measurements?.forEach((measurement) => {
      add('measurement', measurement, about);
      measurement.bands?.forEach((band) => add('band', band, about));
      measurement.quoted?.forEach((quoted) => add('quoted', quoted, about));
    });
  }
  return texts;
}
