// Rows held against the Table Schemas of a data package, by what the descriptor says alone.

export interface TableResource {
  readonly name: string;
  readonly path: string;
  readonly schema: {
    readonly fields: readonly Field[];
    readonly primaryKey: readonly string[];
    readonly foreignKeys?: readonly { readonly fields: readonly string[]; readonly reference: { readonly resource: string; readonly fields: readonly string[] } }[];
  };
}

interface Field {
  readonly name: string;
  readonly type: 'string' | 'integer' | 'number' | 'any';
  readonly constraints?: { readonly required?: boolean; readonly enum?: readonly (string | number)[]; readonly minimum?: number; readonly maximum?: number; readonly exclusiveMinimum?: number };
}

/** A table as its CSV file holds it: the header, then the rows; null is an empty cell. */
type Lines = readonly (readonly (string | null)[])[];

/** Problems of the rows of a package: header, types, constraints, primary keys, foreign keys. */
export function rowProblems(resources: readonly TableResource[], tables: ReadonlyMap<string, Lines>): readonly string[] {
  return resources.flatMap((resource) => {
    const { name, schema } = resource;
    const [header = [], ...rows] = tables.get(name)!;
    if (header.join() !== schema.fields.map((field) => field.name).join()) return [`${name}: the header differs`];
    return [
      ...rows.flatMap((row, index) => schema.fields.flatMap((field, place) => cellProblem(field, row[place] ?? null).map((what) => `${name}, row ${index + 1}, ${field.name}: ${what}`))),
      ...twice(keysOf(header, rows, schema.primaryKey)).map(({ index, key }) => `${name}, row ${index + 1}: the key ${key} stands twice`),
      ...(schema.foreignKeys ?? []).flatMap(({ fields, reference }) => {
        const [otherHeader = [], ...others] = tables.get(reference.resource)!;
        const there = new Set(keysOf(otherHeader, others, reference.fields));
        return keysOf(header, rows, fields).flatMap((key, index) => key === null || there.has(key) ? [] : [`${name}, row ${index + 1}: ${fields.join()} ${key} is not in ${reference.resource}`]);
      }),
    ];
  });
}

function cellProblem({ type, constraints: { required = false, enum: list, minimum, maximum, exclusiveMinimum } = {} }: Field, cell: string | null): string[] {
  if (cell === null) return required ? ['empty'] : [];
  if (list !== undefined && !list.map(String).includes(cell)) return [`"${cell}" is not in the list`];
  if (type === 'string' || type === 'any') return [];
  if (!(type === 'integer' ? /^-?\d+$/ : /^-?\d+(\.\d+)?([eE][-+]?\d+)?$/).test(cell)) return [`"${cell}" is no ${type === 'integer' ? 'whole number' : 'number'}`];
  const value = Number(cell);
  if (minimum !== undefined && value < minimum) return [`${cell} is below ${minimum}`];
  if (maximum !== undefined && value > maximum) return [`${cell} is above ${maximum}`];
  return exclusiveMinimum !== undefined && value <= exclusiveMinimum ? [`${cell} is not above ${exclusiveMinimum}`] : [];
}

/** The cells of a key as one text; null where one is empty, which names nothing. */
function keysOf(header: readonly (string | null)[], rows: Lines, fields: readonly string[]): (string | null)[] {
  const places = fields.map((field) => header.indexOf(field));
  return rows.map((row) => places.some((place) => (row[place] ?? null) === null) ? null : places.map((place) => row[place]).join(' / '));
}

function twice(keys: readonly (string | null)[]): { readonly index: number; readonly key: string | null }[] {
  const seen = new Set<string | null>();
  return keys.flatMap((key, index) => {
    if (seen.has(key)) return [{ index, key }];
    seen.add(key);
    return [];
  });
}
