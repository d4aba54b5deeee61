// Where the atoms and bonds of a ligand lie on paper.

import { Molecule } from 'openchemlib';
import { keptBytes } from '../keptBytes.ts';
import { readSmiles } from './readSmiles.ts';

/** An atom of a structure; places in bond lengths, y down the page. */
export interface StructureAtom {
  readonly symbol: string;
  readonly x: number;
  readonly y: number;
  readonly charge: number;
  readonly hydrogens: number;
  /** Mass number where an isotope was typed. */
  readonly mass: number | null;
}

export interface StructureBond {
  readonly from: number;
  readonly to: number;
  /** 0 for a bond to a metal or of no whole order. */
  readonly order: 0 | 1 | 2 | 3;
  /** Which side of `from` to `to` the second line of a double bond lies on, seen down the bond; 0: both lines beside the middle. */
  readonly side: -1 | 0 | 1;
  /** Towards the reader or away, the narrow end at `from`. */
  readonly wedge: 'up' | 'down' | null;
}

export interface Structure {
  readonly atoms: readonly StructureAtom[];
  readonly bonds: readonly StructureBond[];
}

export type StructureRead = { readonly ok: true; readonly structure: Structure } | { readonly ok: false; readonly reason: string };

/** Changes whenever a layout may come out otherwise: part of the key under which layouts are kept. */
const VERSION = 'openchemlib 9.25.0, layout 2';

/** The structure of a SMILES, laid out once and kept, or why it cannot be read, a half sentence. The same SMILES has the same layout on every machine. */
export function readStructure(smiles: string): StructureRead {
  const kept = keptBytes('json', `${VERSION}\n${smiles}`, () => {
    const read = readSmiles(smiles);
    const result: StructureRead = read.ok ? { ok: true, structure: laidOut(read.molecule) } : read;
    return Buffer.from(JSON.stringify(result));
  });
  return JSON.parse(Buffer.from(kept).toString('utf8')) as StructureRead;
}

/** How many atoms of each element but hydrogen a structure has, by symbol. */
export function heavyAtoms({ atoms }: Structure): ReadonlyMap<string, number> {
  const counts = new Map<string, number>();
  for (const { symbol } of atoms) if (symbol !== 'H' && symbol !== 'D') counts.set(symbol, (counts.get(symbol) ?? 0) + 1);
  return counts;
}

function laidOut(molecule: Molecule): Structure {
  molecule.inventCoordinates();
  molecule.ensureHelperArrays(Molecule.cHelperCIP);
  const atoms = lengthsOfBonds(molecule);
  return { atoms, bonds: Array.from({ length: molecule.getAllBonds() }, (_, bond) => drawnBond(molecule, bond, atoms)) };
}

/** A thousandth of a bond length is finer than a printer's dot. */
const round = (value: number): number => Math.round(value * 1000) / 1000 + 0;

function lengthsOfBonds(molecule: Molecule): StructureAtom[] {
  const length = molecule.getAllBonds() === 0 ? 1 : molecule.getAverageBondLength(true);
  const all = Array.from({ length: molecule.getAllAtoms() }, (_, atom) => atom);
  const places = levelled(all.map((atom) => ({ x: molecule.getAtomX(atom) / length, y: molecule.getAtomY(atom) / length })));
  const [left, top] = [Math.min(...places.map(({ x }) => x)), Math.min(...places.map(({ y }) => y))];
  return all.map((atom) => ({
    symbol: molecule.getAtomLabel(atom), x: round(places[atom]!.x - left), y: round(places[atom]!.y - top),
    charge: molecule.getAtomCharge(atom), hydrogens: molecule.getImplicitHydrogens(atom),
    mass: molecule.getAtomMass(atom) === 0 ? null : molecule.getAtomMass(atom),
  }));
}

interface Place { readonly x: number; readonly y: number }

/** Atoms that lie on one line are set level. */
function levelled(places: readonly Place[]): readonly Place[] {
  const [first, second] = places;
  if (first === undefined || second === undefined) return places;
  const angle = Math.atan2(second.y - first.y, second.x - first.x);
  const turned = places.map(({ x, y }) => ({ x: (x - first.x) * Math.cos(angle) + (y - first.y) * Math.sin(angle), y: (y - first.y) * Math.cos(angle) - (x - first.x) * Math.sin(angle) }));
  return turned.every(({ y }) => Math.abs(y) < 0.05) ? turned : places;
}

function drawnBond(molecule: Molecule, bond: number, atoms: readonly StructureAtom[]): StructureBond {
  const [from, to] = [molecule.getBondAtom(0, bond), molecule.getBondAtom(1, bond)];
  const order = molecule.getBondOrder(bond);
  const type = molecule.getBondType(bond);
  const wedge = type === Molecule.cBondTypeUp ? 'up' : type === Molecule.cBondTypeDown ? 'down' : null;
  return { from, to, order: (order >= 0 && order <= 3 ? order : 0) as StructureBond['order'], side: order === 2 ? secondLine(molecule, bond, atoms) : 0, wedge };
}

/** Towards the middle of the smallest ring, else to the side with more neighbours; both beside the middle at the end of a chain. */
function secondLine(molecule: Molecule, bond: number, atoms: readonly StructureAtom[]): -1 | 0 | 1 {
  const [a, b] = [molecule.getBondAtom(0, bond), molecule.getBondAtom(1, bond)];
  const sideOf = (x: number, y: number): number => (atoms[b]!.x - atoms[a]!.x) * (y - atoms[a]!.y) - (atoms[b]!.y - atoms[a]!.y) * (x - atoms[a]!.x);
  const rings = molecule.getRingSet();
  // Of fused rings the aromatic one, then the smallest, holds the line.
  const around = Array.from({ length: rings.getSize() }, (_, ring) => ring).filter((ring) => rings.isBondMember(ring, bond))
    .sort((left, right) => Number(rings.isAromatic(right)) - Number(rings.isAromatic(left)) || rings.getRingSize(left) - rings.getRingSize(right) || left - right)[0];
  if (around !== undefined) {
    const members = rings.getRingAtoms(around);
    const middle = (pick: (atom: StructureAtom) => number): number => [...members].reduce((sum, atom) => sum + pick(atoms[atom]!), 0) / members.length;
    return sideOf(middle(({ x }) => x), middle(({ y }) => y)) > 0 ? 1 : -1;
  }
  const neighbours = [a, b].map((atom) => Array.from({ length: molecule.getConnAtoms(atom) }, (_, index) => molecule.getConnAtom(atom, index)).filter((other) => other !== a && other !== b));
  if (neighbours.some((list) => list.length === 0)) return 0;
  const balance = neighbours.flat().reduce((sum, atom) => sum + Math.sign(Math.round(1000 * sideOf(atoms[atom]!.x, atoms[atom]!.y))), 0);
  return balance === 0 ? 1 : balance > 0 ? 1 : -1;
}
