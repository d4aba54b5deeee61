// Rows of a table gathered into typed complexes, each text with the cell it came from.

import { slug, suggestedId, suggestedMeasurementId } from '#engine';
import type { TypedBand, TypedComplex, TypedMeasurement, TypedQuoted } from '#engine';
import type { LigandRecord } from '../content/types.ts';
import { hazardsFromCell, ligandsFromCell, termsFromCell } from './compound.ts';
import { fieldNamed } from './fields.ts';
import type { TableField } from './fields.ts';
import { partsOfFormula } from './formulaParts.ts';
import type { Mapping } from './mapping.ts';
import type { TableFinding, TablePlace } from './places.ts';
import type { ReadRow, Value } from './readRows.ts';

export interface Assembled {
  readonly id: string;
  readonly complex: TypedComplex;
  /** Cells by field of the record, "measurements[0].bands[1].position"; "" is the first row. */
  readonly origin: ReadonlyMap<string, TablePlace>;
  /** Rows it was read from, in order. */
  readonly rows: readonly number[];
  /** true where ion or ligands were taken from the formula. */
  readonly fromFormula: boolean;
  readonly findings: readonly { readonly place: TablePlace; readonly finding: TableFinding }[];
}

interface Draft {
  readonly key: string;
  readonly values: Map<string, Value>;
  readonly measurements: MeasurementDraft[];
  readonly rows: number[];
  readonly findings: { readonly place: TablePlace; readonly finding: TableFinding }[];
}

interface MeasurementDraft {
  readonly key: string;
  readonly values: Map<string, Value>;
  readonly items: ReadonlyMap<string, Value>[];
  readonly quoted: ReadonlyMap<string, Value>[];
}

/** Gathers rows into complexes in the order in which they first appear. */
export function assemble(rows: readonly ReadRow[], mapping: Mapping, ligands: readonly LigandRecord[]): Assembled[] {
  const drafts: Draft[] = [];
  for (const row of rows) {
    const complexValues = row.values.get('complex') ?? new Map<string, Value>();
    const key = keyOf(complexValues);
    const known = drafts.find((draft) => draft.key === key);
    const draft = known ?? { key, values: new Map<string, Value>(), measurements: [], rows: [], findings: [] };
    if (known === undefined) drafts.push(draft);
    draft.rows.push(row.number);
    merge(draft.values, complexValues, draft);
    addMeasurement(draft, row, mapping);
  }
  const taken = new Set<string>();
  return drafts.map((draft) => finished(draft, ligands, taken));
}

/** The id where there is one, else what tells complexes apart. */
function keyOf(values: ReadonlyMap<string, Value>): string {
  const id = values.get('id')?.text;
  return id === undefined ? ['formula', 'isomer', 'spin', 'geometry', 'ion'].map((field) => values.get(field)?.text ?? '').join('|') : `id ${id}`;
}

function addMeasurement(draft: Draft, row: ReadRow, mapping: Mapping): void {
  const values = row.values.get('measurement') ?? new Map<string, Value>();
  const id = values.get('measurement')?.text;
  const key = id === undefined ? JSON.stringify([...values].map(([field, { text }]) => [field, text])) : `id ${id}`;
  const known = mapping.rows === 'complex' ? undefined : draft.measurements.find((one) => one.key === key);
  const measurement = known ?? { key, values: new Map<string, Value>(), items: [], quoted: [] };
  if (known === undefined) draft.measurements.push(measurement);
  merge(measurement.values, values, draft);
  for (const item of row.bands) measurement.items.push(item);
  for (const quoted of row.quoted) {
    // Spreadsheets repeat the printed values in the row of each band.
    if (!measurement.quoted.some((other) => sameTexts(other, quoted))) measurement.quoted.push(quoted);
  }
}

function sameTexts(one: ReadonlyMap<string, Value>, other: ReadonlyMap<string, Value>): boolean {
  return one.size === other.size && [...one].every(([field, { text }]) => other.get(field)?.text === text);
}

function merge(into: Map<string, Value>, values: ReadonlyMap<string, Value>, draft: Draft): void {
  for (const [field, value] of values) {
    const earlier = into.get(field);
    if (earlier === undefined) into.set(field, value);
    else if (earlier.text !== value.text) {
      const where = 'row' in earlier.place ? `row ${earlier.place.row}` : 'every-row';
      draft.findings.push({ place: value.place, finding: {
        code: 'TABLE_CONFLICT', found: `"${value.text}"`, expected: `"${earlier.text}", as in ${where}: one ${fieldNamed(field).level} has one ${field}`,
        mend: 'correct one of the two rows, or give the rows ids that tell them apart',
      } });
    }
  }
}

function finished(draft: Draft, ligands: readonly LigandRecord[], taken: Set<string>): Assembled {
  const origin = new Map<string, TablePlace>([['', { row: draft.rows[0]!, column: null, header: '' }]]);
  const findings = [...draft.findings];
  const put = (target: Record<string, unknown>, field: TableField, value: Value, prefix: string): void => {
    const read = compoundOf(field, value.text);
    if (read === null) findings.push({ place: value.place, finding: unreadable(field, value.text) });
    else setAt(target, field.path, read);
    origin.set(`${prefix}${prefix === '' ? '' : '.'}${field.path.join('.')}`, value.place);
  };
  const setRow = (prefix: string, values: Iterable<Value>): void => {
    const place = rowOf(values);
    if (place !== null) origin.set(prefix, place);
  };
  const complex: Record<string, unknown> = {};
  for (const [name, value] of draft.values) if (name !== 'id') put(complex, fieldNamed(name), value, '');
  const fromFormula = addPartsOfFormula(complex, origin, ligands);

  const measurementIds = new Set<string>();
  complex['measurements'] = draft.measurements.map((one, index): TypedMeasurement => {
    const prefix = `measurements[${index}]`;
    const measurement: Record<string, unknown> = {};
    for (const [name, value] of one.values) if (name !== 'measurement') put(measurement, fieldNamed(name), value, prefix);
    setRow(prefix, [...one.values.values(), ...one.items.flatMap((item) => [...item.values()])]);
    one.items.forEach((item, number) => setRow(`${prefix}.bands[${number}]`, item.values()));
    one.quoted.forEach((item, number) => setRow(`${prefix}.quoted[${number}]`, item.values()));
    const typedId = one.values.get('measurement');
    if (typedId !== undefined) origin.set(`${prefix}.id`, typedId.place);
    const id = typedId?.text ?? free(suggestedMeasurementId(measurement as Omit<TypedMeasurement, 'id'>), measurementIds);
    measurementIds.add(id);
    const bands = one.items.map((item, number) => typedItem(item, `${prefix}.bands[${number}]`, put) as TypedBand);
    const quoted = one.quoted.map((item, number) => typedItem(item, `${prefix}.quoted[${number}]`, put) as TypedQuoted);
    return { id, ...measurement, ...(bands.length === 0 ? {} : { bands }), ...(quoted.length === 0 ? {} : { quoted }) };
  });
  if (draft.measurements.length === 1 && draft.measurements[0]!.values.size === 0 && draft.measurements[0]!.items.length === 0 && draft.measurements[0]!.quoted.length === 0) delete complex['measurements'];

  const typedId = draft.values.get('id');
  if (typedId !== undefined) origin.set('id', typedId.place);
  const typed = { formula: '', ...complex } as TypedComplex;
  const id = typedId?.text ?? free(suggestedId(typed), taken);
  taken.add(id);
  return { id, complex: typed, origin, rows: draft.rows, fromFormula, findings };
}

type Put = (target: Record<string, unknown>, field: TableField, value: Value, prefix: string) => void;

function typedItem(item: ReadonlyMap<string, Value>, prefix: string, put: Put): Record<string, unknown> {
  const target: Record<string, unknown> = {};
  for (const [name, value] of item) put(target, fieldNamed(name), value, prefix);
  return target;
}

/** The row that the first of some values comes from. */
function rowOf(values: Iterable<Value>): TablePlace | null {
  for (const { place } of values) if ('row' in place) return { ...place, column: null, header: '' };
  return null;
}

function compoundOf(field: TableField, text: string): unknown {
  if (field.kind === 'ligands') return ligandsFromCell(text);
  if (field.kind === 'hazards') return hazardsFromCell(text);
  return field.kind === 'term' ? termsFromCell(text) : text;
}

function unreadable(field: TableField, text: string): TableFinding {
  if (field.kind === 'ligands') return { code: 'TABLE_CELL', found: `"${text}"`, expected: 'ids of ligand records and how many of each, e.g. 5 ammine + 1 chlorido', mend: 'write it so, or leave the cell empty where the formula says it' };
  return { code: 'TABLE_CELL', found: `"${text}"`, expected: 'codes of hazard cautions with reasons, e.g. PERCHLORATE: never dry', mend: 'write it so, with a semicolon between two' };
}

function setAt(target: Record<string, unknown>, path: readonly string[], value: unknown): void {
  const last = path.at(-1);
  if (last === undefined) return;
  let inner = target;
  for (const step of path.slice(0, -1)) {
    inner[step] ??= {};
    inner = inner[step] as Record<string, unknown>;
  }
  inner[last] = value;
}

function addPartsOfFormula(complex: Record<string, unknown>, origin: Map<string, TablePlace>, ligands: readonly LigandRecord[]): boolean {
  if (typeof complex['formula'] !== 'string' || (complex['ion'] !== undefined && complex['ligands'] !== undefined)) return false;
  const parts = partsOfFormula(complex['formula'], ligands);
  const place = origin.get('formula');
  for (const field of ['ion', 'ligands'] as const) {
    if (complex[field] !== undefined) continue;
    if (parts !== null) complex[field] = parts[field];
    if (place !== undefined) origin.set(field, place);
  }
  return parts !== null;
}

/** The id, or with a number behind it where it is taken. */
function free(id: string, taken: ReadonlySet<string>): string {
  let candidate = id;
  for (let number = 2; taken.has(candidate); number += 1) candidate = slug(`${id.slice(0, 37)}-${number}`, id);
  return candidate;
}
