import { type Corner, schematicFigure } from '../charts/schematic.ts';
import { type Donor, type Isomer, octahedralArrangement } from './arrangement.ts';
import type { LigandRow } from './rows.ts';
import { counted, listed } from './show.ts';
import type { CollectionTree, ComplexNode } from './tree.ts';
import { type Parts, formulaShown } from './typeset.ts';

/** Longer symbols of single ligands give way to their donor atom. */
const LONGEST = 8;

/**
 * The donors of a complex around its metal as SVG; null where the record does not say which donors bind or leaves more than one
 * arrangement open, for several metals, and for geometries other than octahedral and tetrahedral.
 */
export function complexSchematic(tree: CollectionTree, complex: ComplexNode): string | null {
  const { row, ion, measurements, formula } = complex;
  const wanted = row.geometry === 'octahedral' ? 6 : row.geometry === 'tetrahedral' ? 4 : null;
  if (wanted === null || measurements.some((measurement) => measurement.row.nuclearity > 1)) return null;
  const bound = boundDonors(tree, complex);
  if (bound === null || bound.length !== wanted) return null;
  const order = wanted === 4 ? tetrahedral(bound, row.isomer) : octahedral(bound, row.isomer as Isomer);
  if (order === null) return null;
  const corners = order.map((donor, corner): Corner => ({ parts: leftward(corner, wanted) ? turned(bound[donor]!.parts) : bound[donor]!.parts, chelate: bound[donor]!.chelate }));
  const isomer = row.isomer === 'none' ? '' : `${row.isomer} `;
  return schematicFigure(ion.metal, corners, {
    id: 'schematic', kind: 'schematic', title: `Donors of ${formula.text}`,
    description: `${isomer === '' ? '' : `${row.isomer}: `}${ion.metal} with ${counted(bound.length, 'donor')} in ${row.geometry === 'octahedral' ? 'an octahedron' : 'a tetrahedron'}: ${listed(summary(bound))}. A scheme, not to scale.`,
  });
}

/** Corners whose bond comes from the right: there the donor atom is written last. */
const leftward = (corner: number, corners: number): boolean => (corners === 6 ? corner === 4 || corner === 5 : corner === 1);

/** "NH3" as "H3N"; a symbol that is no formula stays. */
function turned(parts: Parts): Parts {
  const units = unitsOf(parts);
  return written(units.flat()) === written(parts) ? [...units].reverse().flat() : parts;
}

interface BoundDonor extends Donor {
  readonly element: string;
  readonly parts: Parts;
  readonly chelate: number | null;
}

/** One entry a donor atom, those of one ligand one after the other; null where it is not recorded which of a ligand's donors bind. */
function boundDonors(tree: CollectionTree, { ligands }: ComplexNode): readonly BoundDonor[] | null {
  const all: BoundDonor[] = [];
  let number = 0;
  for (const { row, ligand } of ligands) {
    const elements = JSON.parse(ligand.donors) as readonly string[];
    if (row.bound !== elements.length && new Set(elements).size > 1) return null;
    for (let copy = 0; copy < row.count; copy++, number++) for (const element of elements.slice(0, row.bound)) {
      all.push({ kind: `${ligand.id}:${element}`, ligand: number, element, chelate: row.bound > 1 ? number : null, parts: row.bound > 1 ? plain(element) : singleSymbol(ligand, element, tree.abbreviations) });
    }
  }
  return all;
}

const plain = (text: string): Parts => [{ text, style: 'plain' }];
const written = (parts: Parts): string => parts.map(({ text }) => text).join('');

/** "NH3", "py", "Cl": without the charge of the free ligand and without brackets; its donor atom where the symbol is long. */
function singleSymbol({ abbreviation, formula }: LigandRow, element: string, abbreviations: readonly string[]): Parts {
  const units = unitsOf(abbreviation === null ? formulaShown(formula, 'none', abbreviations).parts : plain(abbreviation));
  if (abbreviation !== null && written(units.flat()) !== abbreviation) return plain(abbreviation.length > LONGEST ? element : abbreviation);
  const { length } = written(units.flat());
  return length === 0 || length > LONGEST ? plain(element) : (units.at(-1)![0]!.text === element ? [...units].reverse() : units).flat();
}

/** Element symbols with their counts, one unit each: "NO2" as N and O2. */
function unitsOf(parts: Parts): readonly Parts[] {
  const units: Parts[] = [];
  for (const { text, style } of parts) {
    if (style === 'sub') units.push([...(units.pop() ?? []), { text, style }]);
    else if (style === 'plain') units.push(...(text.match(/[A-Z][a-z]?/g) ?? []).map(plain));
  }
  return units;
}

/** A tetrahedron has one arrangement, mirror images aside; rare donors stand above. */
function tetrahedral(donors: readonly BoundDonor[], isomer: string): readonly number[] | null {
  if (isomer !== 'none') return null;
  const alike = (index: number): number => donors.filter(({ kind }) => kind === donors[index]!.kind).length;
  const chelates = donors.some(({ chelate }) => chelate !== null);
  const order = donors.map((_, index) => index);
  return chelates ? order : order.sort((a, b) => alike(a) - alike(b) || a - b);
}

/** Arrangements hang on which donors are alike and joined, not on what they are: few patterns in a large collection. */
const known = new Map<string, readonly number[] | null>();

function octahedral(donors: readonly BoundDonor[], isomer: Isomer): readonly number[] | null {
  const kinds = [...new Set(donors.map(({ kind }) => kind))];
  const pattern = `${isomer} ${donors.map(({ kind, ligand }) => `${kinds.indexOf(kind)}-${ligand}`).join(' ')}`;
  if (!known.has(pattern)) known.set(pattern, octahedralArrangement(donors, isomer));
  return known.get(pattern) ?? null;
}

function summary(donors: readonly BoundDonor[]): readonly string[] {
  const counts = new Map<string, number>();
  for (const { element } of donors) counts.set(element, (counts.get(element) ?? 0) + 1);
  return [...counts].map(([element, count]) => `${count} ${element}`);
}
