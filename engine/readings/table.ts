import type { Geometry } from '../ions/types.ts';
import type { Gradient } from '../levels/levels.ts';
import { degeneratePair } from '../levels/labels.ts';
import { fieldSign, levelLabel } from '../levels/levels.ts';
import { diagonalise, levelSlopes, solveBlock } from '../levels/solve.ts';
import type { LevelSlopes } from '../levels/solve.ts';
import { shellBlocks } from '../shell/blocks.ts';
import type { Block } from '../shell/blocks.ts';

/**
 * Levels of one ion at one C/B along the curve Delta = 20 rho sin t, B = rho cos t, C = (C/B) B, for rho = 1
 * and 0 <= t <= 90 degrees.
 *
 * Energies are homogeneous of degree one, so this curve holds every ratio Delta/B and rho is a common scale.
 * The factor 20 puts Delta/B = 20 at 45 degrees: unscaled, all of chemistry sits in the last degrees.
 */

/** Delta/B at t = 45 degrees. */
export const angleScale = 20;

/** Grid points over the quarter circle: a quarter of a degree apart where a curve is solved, a degree where only starts are looked for. */
export const finePoints = 361;
export const coarsePoints = 91;

export interface FieldCase {
  readonly electrons: number;
  readonly geometry: Geometry;
}

/** A level or a transition on the grid: energy and its derivatives by t and by C/B, for rho = 1. */
export interface GridLevel {
  readonly energy: Float64Array;
  readonly slope: Float64Array;
  readonly byRatio: Float64Array;
}

/** A level at one t: absolute energy, derivative by t, and exact derivatives by Delta, B and C. */
export interface ExactLevel {
  readonly energy: number;
  readonly slope: number;
  readonly gradient: Gradient;
}

export interface LevelTable {
  readonly ion: FieldCase;
  /** C/B. */
  readonly ratio: number;
  /** Grid points and their distance; the first is at 0, the last at 90 degrees. */
  readonly points: number;
  readonly step: number;
  /** A level by its letter form on the grid, absolute; computed with its block on first use. */
  grid(label: string): GridLevel;
  /** The transition between two levels on the grid. */
  transition(ground: string, label: string): GridLevel;
  /** The named levels at angle t, in the order asked for. */
  exact(labels: readonly string[], t: number): ExactLevel[];
}

interface LevelPlace {
  readonly block: Block;
  readonly index: number;
}

/** By geometry and number of electrons, so that no key has to be built on the hot path. */
const places: Record<Geometry, Map<string, LevelPlace>[]> = { octahedral: [], tetrahedral: [] };

/** Where each level label of an ion sits among the blocks. A joined label ("a4A1g/a4Eg") goes by its first name. */
function placesOf(ion: FieldCase): Map<string, LevelPlace> {
  const held = places[ion.geometry];
  let found = held[ion.electrons];
  if (!found) {
    found = new Map(
      shellBlocks(ion.electrons).flatMap((block) =>
        Array.from({ length: block.size }, (_, index) => [levelLabel(block, index + 1, ion.geometry), { block, index }] as const),
      ),
    );
    const pair = degeneratePair(ion.electrons, ion.geometry);
    if (pair) found.set(pair.label, found.get(pair.members[0])!);
    held[ion.electrons] = found;
  }
  return found;
}

/** @throws RangeError for a label that is no level of the ion */
export function levelPlace(ion: FieldCase, label: string): LevelPlace {
  const place = placesOf(ion).get(label);
  if (!place) throw new RangeError(`label: "${label}" is no level of d${ion.electrons} ${ion.geometry}`);
  return place;
}

/** Delta, B and C on the curve at rho = 1. */
export function pointOnCurve(t: number, ratio: number): { delta: number; racahB: number; racahC: number } {
  const racahB = Math.cos(t);
  return { delta: angleScale * Math.sin(t), racahB, racahC: ratio * racahB };
}

/** d energy / dt on the curve, from the derivatives by Delta, B and C. */
export function slopeAt(t: number, ratio: number, field: number, racahB: number, racahC: number): number {
  return field * angleScale * Math.cos(t) - (racahB + ratio * racahC) * Math.sin(t);
}

const emptyLevel = (points: number): GridLevel => ({ energy: new Float64Array(points), slope: new Float64Array(points), byRatio: new Float64Array(points) });

function difference(upper: GridLevel, lower: GridLevel): GridLevel {
  const minus = (a: Float64Array, b: Float64Array): Float64Array => a.map((value, i) => value - b[i]!);
  return { energy: minus(upper.energy, lower.energy), slope: minus(upper.slope, lower.slope), byRatio: minus(upper.byRatio, lower.byRatio) };
}

function makeTable(ion: FieldCase, ratio: number, points: number): LevelTable {
  const step = Math.PI / 2 / (points - 1);
  const sign = fieldSign(ion.geometry);
  const solved = new Map<Block, GridLevel[]>();
  const known = new Map<string, GridLevel>();
  const transitions = new Map<string, Map<string, GridLevel>>();

  function solveOnGrid(block: Block): GridLevel[] {
    const levels = Array.from({ length: block.size }, () => emptyLevel(points));
    for (let i = 0; i < points; i++) {
      const t = i * step;
      const { delta, racahB, racahC } = pointOnCurve(t, ratio);
      const solution = solveBlock(block, sign, delta, racahB, racahC);
      for (let k = 0; k < block.size; k++) {
        levels[k]!.energy[i] = solution.energy[k]!;
        levels[k]!.slope[i] = slopeAt(t, ratio, solution.field[k]!, solution.racahB[k]!, solution.racahC[k]!);
        levels[k]!.byRatio[i] = solution.racahC[k]! * racahB;
      }
    }
    return levels;
  }

  function grid(label: string): GridLevel {
    let level = known.get(label);
    if (!level) {
      const { block, index } = levelPlace(ion, label);
      let levels = solved.get(block);
      if (!levels) {
        levels = solveOnGrid(block);
        solved.set(block, levels);
      }
      level = levels[index]!;
      known.set(label, level);
    }
    return level;
  }

  return {
    ion,
    ratio,
    points,
    step,
    grid,
    transition(ground, label) {
      let fromGround = transitions.get(ground);
      if (!fromGround) {
        fromGround = new Map();
        transitions.set(ground, fromGround);
      }
      let found = fromGround.get(label);
      if (!found) {
        found = difference(grid(label), grid(ground));
        fromGround.set(label, found);
      }
      return found;
    },
    exact(labels, t) {
      const { delta, racahB, racahC } = pointOnCurve(t, ratio);
      const slopes: LevelSlopes = { field: 0, racahB: 0, racahC: 0 };
      return labels.map((label) => {
        const { block, index } = levelPlace(ion, label);
        levelSlopes(block, sign, diagonalise(block, sign, delta, racahB, racahC), index, slopes);
        return {
          energy: delta * slopes.field + racahB * slopes.racahB + racahC * slopes.racahC,
          slope: slopeAt(t, ratio, slopes.field, slopes.racahB, slopes.racahC),
          gradient: { delta: slopes.field, racahB: slopes.racahB, racahC: slopes.racahC },
        };
      });
    },
  };
}

/**
 * Tables are pure functions of ion, geometry and C/B. A collection uses few policies and so few fine ones; coarse ones go with
 * the fifteen C/B of a fit with C free, for every ion.
 */
const held = new Map<string, LevelTable>();
const heldAtMost = 600;

/** The level table of an ion at one C/B; computed once and shared. */
export function levelTable(ion: FieldCase, ratio: number, points = finePoints): LevelTable {
  const key = `${ion.electrons} ${ion.geometry} ${ratio} ${points}`;
  let table = held.get(key);
  if (!table) {
    table = makeTable({ electrons: ion.electrons, geometry: ion.geometry }, ratio, points);
    if (held.size >= heldAtMost) held.delete(held.keys().next().value!);
    held.set(key, table);
  }
  return table;
}
