import type { FoundCollection, FoundComplex, FoundRow } from './packed.ts';

/** A property by which rows are filtered. */
export interface Facet {
  /** Its name in the address. */
  readonly name: string;
  readonly title: string;
  readonly values: readonly string[];
  /** Places of the values that a row has, by row. */
  readonly ofRow: readonly (readonly number[])[];
}

/** What is chosen, by facet; a facet without choice lets all rows pass. */
export type Chosen = ReadonlyMap<string, ReadonlySet<string>>;

type Describe = (row: FoundRow, complex: FoundComplex) => readonly string[];

const inOrder = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
const VERDICTS = ['tested', 'untested', 'assumed', 'strained', 'not determinable', 'refused'];
const worth = (a: string, b: string): number => VERDICTS.indexOf(a) - VERDICTS.indexOf(b);

/** The facets of a collection with the values that occur. */
export function facetsOf(collection: FoundCollection): readonly Facet[] {
  const { sets, ligands, ions } = collection.packed;
  const donors = sets.map((set) => donorSet(set, ligands));
  const held = sets.map((set) => set.filter((_, place) => place % 2 === 0).map((place) => ligands[place]!.name));
  const byPlace = new Map(ions.map(({ name }, place) => [name, place]));
  const make = (name: string, title: string, of: Describe, order: (a: string, b: string) => number = inOrder): Facet => facet(collection, name, title, of, order);
  return [
    make('ion', 'Ion', (_, { ion }) => [ion.name], (a, b) => byPlace.get(a)! - byPlace.get(b)!),
    make('d', 'd count', (_, { ion }) => [`d${ion.electrons}`], (a, b) => Number(a.slice(1)) - Number(b.slice(1))),
    make('geometry', 'Geometry', (_, { geometry }) => [geometry]),
    make('spin', 'Spin', (_, { spin }) => [spin === '' ? 'not declared' : spin]),
    make('donors', 'Donor set', (_, { set }) => [donors[set]!]),
    make('ligand', 'Ligand', (_, { set }) => held[set]!),
    make('phase', 'Phase', ({ phase }) => [phase]),
    make('verdict', 'Verdict', ({ verdict }) => [verdict], worth),
    make('term', 'Term observed', ({ terms }) => terms),
    make('C', 'C', ({ cFitted }) => [cFitted ? 'measured' : 'not measured']),
  ].filter(({ values }) => values.length > 1);
}

function facet({ rows, complexes }: FoundCollection, name: string, title: string, of: Describe, order: (a: string, b: string) => number): Facet {
  const described = rows.map((row) => of(row, complexes[row.complex]!));
  const values = [...new Set(described.flat())].sort(order);
  const place = new Map(values.map((value, index) => [value, index]));
  return { name, title, values, ofRow: described.map((own) => own.map((value) => place.get(value)!)) };
}

/** Donor atoms with their numbers, "Cl2N4". */
function donorSet(set: readonly number[], ligands: FoundCollection['packed']['ligands']): string {
  const counts = new Map<string, number>();
  for (let place = 0; place < set.length; place += 2) for (const donor of ligands[set[place]!]!.donors) counts.set(donor, (counts.get(donor) ?? 0) + set[place + 1]!);
  return [...counts].sort(([a], [b]) => inOrder(a, b)).map(([donor, count]) => donor + (count === 1 ? '' : String(count))).join('');
}

export interface Filtered {
  /** Rows that pass, in the order given. */
  readonly rows: readonly number[];
  /** How many rows each value would leave, all other facets kept: by facet and value. */
  readonly counts: readonly (readonly number[])[];
}

/** Rows that pass every facet; within a facet one of the chosen values is enough. */
export function filtered(facets: readonly Facet[], chosen: Chosen, rows: readonly number[]): Filtered {
  const wanted = facets.map(({ name, values }) => {
    const own = chosen.get(name);
    return own === undefined || own.size === 0 ? null : new Set(values.flatMap((value, place) => own.has(value) ? [place] : []));
  });
  const counts = facets.map(({ values }) => values.map(() => 0));
  const passing: number[] = [];
  for (const row of rows) {
    let failing = -1;
    let failures = 0;
    for (let place = 0; place < facets.length && failures < 2; place += 1) {
      const own = wanted[place];
      if (own === null || own === undefined || facets[place]!.ofRow[row]!.some((value) => own.has(value))) continue;
      failures += 1;
      failing = place;
    }
    if (failures === 0) passing.push(row);
    // A row that fails one facet alone is what another choice there would bring in.
    if (failures < 2) for (let place = 0; place < facets.length; place += 1) if (failures === 0 || place === failing) for (const value of facets[place]!.ofRow[row]!) counts[place]![value]! += 1;
  }
  return { rows: passing, counts };
}
