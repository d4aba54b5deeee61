import type { Geometry } from '../ions/types.ts';
import { shellBlocks } from '../shell/blocks.ts';
import type { Block } from '../shell/blocks.ts';
import { fieldSign, irrepName, levelLabel } from './levels.ts';
import { blockParents } from './parents.ts';
import { solveBlock } from './solve.ts';

/** What labels are read against: the ion in its field, the declared ground multiplicity, and C0/B0 for parents. */
export interface LabelContext {
  readonly electrons: number;
  readonly geometry: Geometry;
  /** Declared multiplicity of the ground state; null: not declared, the highest is meant. */
  readonly multiplicity: number | null;
  /** C0/B0 of the free ion, by which parents in parentheses are resolved. */
  readonly ratio: number;
}

export type LabelFaultCode = 'TERM_UNREADABLE' | 'TERM_UNKNOWN' | 'TERM_IS_GROUND' | 'TERM_AMBIGUOUS';

/** Levels that a typed label may mean, in letter form and ascending; or why it means none. */
export type LabelReading =
  | { readonly ok: true; readonly labels: readonly string[] }
  | { readonly ok: false; readonly code: LabelFaultCode; readonly expected: string; readonly mend: string };

const labelPattern = /^([a-j])?([1-6])(A1|A2|E|T1|T2)(g)?(?:\(([SPDFGHI]'{0,2})\))?$/;

/** Parents closer than this many B are not told apart by a letter in parentheses. */
const parentCloseness = 0.05;

/** Delta/B at which the ground level of a spin below the highest is named: well in the strong field. */
const strongField = 40;

function blockOf(context: LabelContext, multiplicity: number, irrep: string): Block | undefined {
  return shellBlocks(context.electrons).find((block) => block.multiplicity === multiplicity && block.irrep === irrep);
}

/** The accidentally degenerate pair of d5, 10B + 5C above 6A1: one level under two names. */
export function degeneratePair(electrons: number, geometry: Geometry): { readonly label: string; readonly members: readonly [string, string] } | null {
  if (electrons !== 5) return null;
  const members = [`a4${irrepName('A1', geometry)}`, `a4${irrepName('E', geometry)}`] as const;
  return { label: members.join('/'), members };
}

/** Every level of the ion in letter form, block by block, highest spin first; the d5 pair under its two names. */
export function levelNames(electrons: number, geometry: Geometry): readonly string[] {
  return shellBlocks(electrons).flatMap((block) => Array.from({ length: block.size }, (_, i) => levelLabel(block, i + 1, geometry)));
}

/** Letter form of the lowest level of the declared multiplicity (strong field for spins below the highest); null where the ion has none. */
export function groundLabel(electrons: number, geometry: Geometry, multiplicity: number | null): string | null {
  const key = `${electrons} ${geometry} ${multiplicity}`;
  let label = groundsHeld.get(key);
  if (label === undefined) {
    label = findGround(electrons, geometry, multiplicity);
    groundsHeld.set(key, label);
  }
  return label;
}

const groundsHeld = new Map<string, string | null>();

function findGround(electrons: number, geometry: Geometry, multiplicity: number | null): string | null {
  const blocks = shellBlocks(electrons);
  const spin = multiplicity ?? blocks[0]!.multiplicity;
  let lowest: { label: string; energy: number } | null = null;
  for (const block of blocks) {
    if (block.multiplicity !== spin) continue;
    const energy = solveBlock(block, fieldSign(geometry), strongField, 1, 4.5).energy[0]!;
    if (!lowest || energy < lowest.energy) lowest = { label: levelLabel(block, 1, geometry), energy };
  }
  return lowest?.label ?? null;
}

/** A label as chemists print it: the letter only where the block holds more than one level. */
export function shownLabel(label: string, electrons: number): string {
  return label
    .split('/')
    .map((one) => {
      const found = labelPattern.exec(one);
      if (!found) return one;
      const block = shellBlocks(electrons).find((b) => b.multiplicity === Number(found[2]) && b.irrep === found[3]);
      // In the pair both letters are always "a" and say nothing.
      return label.includes('/') || block?.size === 1 ? one.slice(1) : one;
    })
    .join('/');
}

/** Free-ion parents of a level given in letter form, "F" or "P, H" where they are not told apart; null for an unknown label. */
export function parentOf(label: string, electrons: number, ratio: number): string | null {
  const found = labelPattern.exec(label.split('/')[0]!);
  if (!found?.[1]) return null;
  const block = shellBlocks(electrons).find((b) => b.multiplicity === Number(found[2]) && b.irrep === found[3]);
  const letters = block && blockParents(block, 1, ratio, parentCloseness)[found[1].charCodeAt(0) - 97]?.letters;
  return letters?.length ? letters.join(', ') : null;
}

function unknown(context: LabelContext, name: string): LabelReading {
  const spins = [...new Set(shellBlocks(context.electrons).map((block) => block.multiplicity))];
  const terms = shellBlocks(context.electrons)
    .filter((block) => block.multiplicity === (context.multiplicity ?? spins[0]))
    .map((block) => `${block.multiplicity}${irrepName(block.irrep, context.geometry)}`);
  return {
    ok: false, code: 'TERM_UNKNOWN',
    expected: `a level of d${context.electrons}: multiplicities ${spins.join(', ')}; of the ground multiplicity ${terms.join(', ')}`,
    mend: `${name} is no level of this ion; check the ion's oxidation state and spin, or choose one of those`,
  };
}

/**
 * Reads a term label as chemists write it: "4T2g", "4T1g(P)", "b4T1g", "4A1g/4Eg". A "g" is neither required nor
 * held against a tetrahedral ion: the geometry is typed beside it.
 *
 * Letters count from the lowest level of the block, the ground level included; a bare name means every
 * level of that name but the ground level; a parent is resolved at the ion's C0/B0.
 *
 * @returns the levels it may mean in letter form, or a fault with what was expected and how to mend it
 */
export function readLabel(typed: string, context: LabelContext): LabelReading {
  const text = typed.replaceAll(/\s+/g, '');
  const pair = degeneratePair(context.electrons, context.geometry);
  const parts = text.split('/');
  if (parts.length === 2) return readPair(parts, context, typed);
  const found = labelPattern.exec(text);
  if (!found)
    return {
      ok: false, code: 'TERM_UNREADABLE',
      expected: 'a term label such as 4T2g, 4T1g(P), b4T1g or 4A1g/4Eg, or one of CT, ligand, vibration, impurity',
      mend: 'write multiplicity, irreducible representation and, for octahedral ions, g',
    };
  const [, letter, spin, irrep, , parent] = found;
  const multiplicity = Number(spin);
  const name = `${multiplicity}${irrepName(irrep!, context.geometry)}`;
  const block = blockOf(context, multiplicity, irrep!);
  if (!block) return unknown(context, name);
  const ground = groundLabel(context.electrons, context.geometry, context.multiplicity);
  const every = Array.from({ length: block.size }, (_, i) => levelLabel(block, i + 1, context.geometry));
  let meant = every;
  if (letter) {
    const label = every[letter.charCodeAt(0) - 97];
    if (!label)
      return {
        ok: false, code: 'TERM_UNKNOWN', expected: `one of ${every.join(', ')}`,
        mend: `the ion has ${block.size} level${block.size === 1 ? '' : 's'} of the name ${name}`,
      };
    meant = [label];
  }
  if (parent) {
    const parents = blockParents(block, 1, context.ratio, parentCloseness);
    const bare = (l: string): string => l.replaceAll("'", '');
    // A prime may be left out where the letter alone leaves one level.
    const exact = meant.filter((label) => parents[every.indexOf(label)]!.letters.includes(parent));
    const loose = meant.filter((label) => parents[every.indexOf(label)]!.letters.map(bare).includes(parent));
    meant = exact.length > 0 ? exact : loose;
    if (meant.length === 0)
      return {
        ok: false, code: 'TERM_UNKNOWN',
        expected: `one of ${every.map((label, i) => `${label} (from ${parents[i]!.letters.join(', ')})`).join('; ')}`,
        mend: `no level ${name} of this ion comes from ${parent}`,
      };
    const shared = meant.find((label) => parents[every.indexOf(label)]!.letters.length > 1);
    if (shared && meant.length > 1)
      return {
        ok: false, code: 'TERM_AMBIGUOUS',
        expected: `the letter form: one of ${meant.join(', ')}`,
        mend: `the free-ion terms ${parents[every.indexOf(shared)]!.letters.join(' and ')} lie together, so (${parent}) names no single level`,
      };
  }
  const excited = meant.filter((label) => label !== ground);
  if (excited.length === 0) {
    const others = every.filter((label) => label !== ground);
    const parents = blockParents(block, 1, context.ratio, parentCloseness);
    const advice = others.map((label) => {
      const { letters } = parents[every.indexOf(label)]!;
      // Parents that lie together name no single level, so only the letter form is offered.
      return letters.length === 1 ? `${name}(${letters[0]}) or ${label}` : label;
    });
    return {
      ok: false, code: 'TERM_IS_GROUND', expected: `an excited level; ${ground} is the ground level`,
      mend: others.length > 0 ? `this is the ground level; for the transition write ${advice.join(', ')}` : 'this is the ground level: no transition ends on it',
    };
  }
  if (pair) {
    const joined = excited.map((label) => (pair.members.includes(label) ? pair.label : label));
    return { ok: true, labels: [...new Set(joined)] };
  }
  return { ok: true, labels: excited };
}

function readPair(parts: readonly string[], context: LabelContext, typed: string): LabelReading {
  const pair = degeneratePair(context.electrons, context.geometry);
  const readings = parts.map((part) => readLabel(part, context));
  const labels = readings.map((reading) => (reading.ok ? reading.labels : []));
  if (pair && labels.every((list) => list.includes(pair.label))) return { ok: true, labels: [pair.label] };
  const failed = readings.find((reading) => !reading.ok);
  return (
    failed ?? {
      ok: false, code: 'TERM_AMBIGUOUS', expected: 'one label, or a list of candidates in brackets',
      mend: `only the pair 4A1g/4Eg of d5 is one level under two names; write term: [${typed.split('/').join(', ')}]`,
    }
  );
}
